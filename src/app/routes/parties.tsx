import { PartiesSheet } from '../../features/parties/components/parties-sheet.tsx';
import { todayIn } from '../../lib/today.ts';
import { usePathId } from '../use-path-id.ts';

export const Component = () => <PartiesSheet commissionId={usePathId('commissionId')} today={todayIn()} />;
