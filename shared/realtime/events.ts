import { z } from 'zod';
import { uuid } from '../contracts/common.ts';
import { THREAD_SUBJECTS } from '../contracts/vocabulary.ts';

const inCommission = z.object({ commissionId: uuid });

/**
 * What the server tells browsers. Events name records and carry nothing of them: the browser asks again through the API,
 * so each reader gets what their own rights give.
 */
export const REALTIME_EVENTS = {
  'commission.changed': inCommission,
  'parties.changed': inCommission,
  'parts.changed': inCommission,
  'legs.changed': inCommission,
  'joint.changed': inCommission.extend({ jointId: uuid }),
  'fit-report.changed': inCommission.extend({ reportId: uuid, jointId: uuid }),
  'consent.changed': inCommission,
  'handoff.changed': inCommission.extend({ handoffId: uuid }),
  'standing.changed': inCommission,
  'thread.opened': inCommission.extend({ threadId: uuid, subject: z.enum(THREAD_SUBJECTS), subjectId: uuid }),
  'thread.message-added': inCommission.extend({ threadId: uuid, sequence: z.int() }),
  'files.changed': inCommission.extend({ place: z.string(), placeId: uuid }),
  /** Your own rights in a commission changed; what you may no longer see is gone already. */
  'membership.changed': inCommission,
} as const;

export type RealtimeName = keyof typeof REALTIME_EVENTS;
export type RealtimeEvents = { [N in RealtimeName]: z.infer<(typeof REALTIME_EVENTS)[N]> };

/** What browsers tell the server; each is answered by an acknowledgement. */
export const CLIENT_EVENTS = {
  /** Be present in a thread: who is here, who is typing. Needs the right to read it. */
  'thread.enter': inCommission.extend({ threadId: uuid }),
  'thread.leave': z.object({ threadId: uuid }),
  'thread.typing': z.object({ threadId: uuid, typing: z.boolean() }),
} as const;
export type ClientEventName = keyof typeof CLIENT_EVENTS;
export type ClientEvents = { [N in ClientEventName]: z.infer<(typeof CLIENT_EVENTS)[N]> };

export const acknowledgement = z.object({ ok: z.boolean(), code: z.string().optional() });
export type Acknowledgement = z.infer<typeof acknowledgement>;

/** Who is in a thread just now; sent to those in it and stored nowhere. */
export const threadPresence = z.object({
  threadId: uuid,
  people: z.array(z.object({ accountId: uuid, displayName: z.string(), typing: z.boolean() })),
});
export type ThreadPresence = z.infer<typeof threadPresence>;
export const PRESENCE_EVENT = 'thread.presence';
