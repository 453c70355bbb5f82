import type { FilePlace } from '../../shared/contracts/vocabulary.ts';

const commission = (commissionId: string) => ['commission', commissionId] as const;

/** The key of every query. Lists and single records lie apart, so that one goes stale without the others. */
export const keys = {
  me: () => ['me'] as const,
  bench: () => ['bench'] as const,
  /** Everything of one commission. */
  commission,
  commissions: {
    lists: () => ['commissions', 'list'] as const,
    detail: (commissionId: string) => [...commission(commissionId), 'detail'] as const,
  },
  parties: { list: (commissionId: string) => [...commission(commissionId), 'parties'] as const },
  parts: { list: (commissionId: string) => [...commission(commissionId), 'parts'] as const },
  legs: { list: (commissionId: string) => [...commission(commissionId), 'legs'] as const },
  joints: {
    lists: (commissionId: string) => [...commission(commissionId), 'joints', 'list'] as const,
    detail: (commissionId: string, jointId: string) =>
      [...commission(commissionId), 'joints', 'detail', jointId] as const,
  },
  fitReports: {
    lists: (commissionId: string) => [...commission(commissionId), 'fit-reports', 'list'] as const,
    detail: (commissionId: string, reportId: string) =>
      [...commission(commissionId), 'fit-reports', 'detail', reportId] as const,
  },
  consents: { list: (commissionId: string) => [...commission(commissionId), 'consents'] as const },
  handoffs: {
    lists: (commissionId: string) => [...commission(commissionId), 'handoffs', 'list'] as const,
    detail: (commissionId: string, handoffId: string) =>
      [...commission(commissionId), 'handoffs', 'detail', handoffId] as const,
    details: (commissionId: string) => [...commission(commissionId), 'handoffs', 'detail'] as const,
  },
  threads: {
    lists: (commissionId: string) => [...commission(commissionId), 'threads', 'list'] as const,
    messages: (commissionId: string, threadId: string) =>
      [...commission(commissionId), 'threads', 'messages', threadId] as const,
  },
  files: {
    all: (commissionId: string) => [...commission(commissionId), 'files'] as const,
    list: (commissionId: string, place: FilePlace, placeId: string) =>
      [...commission(commissionId), 'files', place, placeId] as const,
  },
  standing: { detail: (commissionId: string) => [...commission(commissionId), 'standing'] as const },
  history: { list: (commissionId: string) => [...commission(commissionId), 'history'] as const },
  shops: {
    lists: () => ['shops', 'list'] as const,
    detail: (shopId: string) => ['shops', 'detail', shopId] as const,
    members: (shopId: string) => ['shops', 'members', shopId] as const,
  },
};
