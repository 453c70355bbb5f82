import { useParams } from 'react-router-dom';

/** A parameter that the route's path guarantees. */
export function usePathId(name: 'commissionId' | 'jointId' | 'reportId' | 'handoffId' | 'threadId' | 'shopId'): string {
  const value = useParams()[name];
  if (!value) throw new Error(`The address has no ${name}`);
  return value;
}
