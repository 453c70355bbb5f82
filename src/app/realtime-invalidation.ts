import { hashKey, type QueryClient, type QueryKey } from '@tanstack/react-query';
import { REALTIME_EVENTS, type RealtimeEvents, type RealtimeName } from '../../shared/realtime/events.ts';
import { keys } from '../lib/query-keys.ts';
import { onConnected, onRealtime, onSessionEnded } from '../lib/socket.ts';

/** An act that leaves a line in what happened also moves something on the bench. */
const moved = (commissionId: string): readonly QueryKey[] => [keys.history.list(commissionId), keys.bench()];

type Invalidations = { [N in RealtimeName]: (event: RealtimeEvents[N]) => readonly QueryKey[] };

/** Which queries each event makes stale. An event without a line here does not compile. */
export const INVALIDATIONS: Invalidations = {
  'commission.changed': ({ commissionId }) => [
    keys.commissions.detail(commissionId),
    keys.commissions.lists(),
    ...moved(commissionId),
  ],
  'parties.changed': ({ commissionId }) => [
    keys.parties.list(commissionId),
    keys.commissions.detail(commissionId),
    keys.commissions.lists(),
    ...moved(commissionId),
  ],
  'parts.changed': ({ commissionId }) => [keys.parts.list(commissionId), ...moved(commissionId)],
  // What an offered day does to the client's day is computed from the legs: such previews lie below the handoffs.
  'legs.changed': ({ commissionId }) => [
    keys.legs.list(commissionId),
    keys.handoffs.details(commissionId),
    ...moved(commissionId),
  ],
  'joint.changed': ({ commissionId, jointId }) => [
    keys.joints.lists(commissionId),
    keys.joints.detail(commissionId, jointId),
    ...moved(commissionId),
  ],
  'fit-report.changed': ({ commissionId, reportId, jointId }) => [
    keys.fitReports.lists(commissionId),
    keys.fitReports.detail(commissionId, reportId),
    keys.joints.lists(commissionId),
    keys.joints.detail(commissionId, jointId),
    ...moved(commissionId),
  ],
  'consent.changed': ({ commissionId }) => [keys.consents.list(commissionId), ...moved(commissionId)],
  'handoff.changed': ({ commissionId, handoffId }) => [
    keys.handoffs.lists(commissionId),
    keys.handoffs.detail(commissionId, handoffId),
    ...moved(commissionId),
  ],
  'standing.changed': ({ commissionId }) => [keys.standing.detail(commissionId), keys.commissions.lists()],
  'thread.opened': ({ commissionId }) => [keys.threads.lists(commissionId)],
  // Messages themselves come through the thread's follower, by sequence.
  'thread.message-added': ({ commissionId }) => [keys.threads.lists(commissionId), keys.bench()],
  'files.changed': ({ commissionId }) => [keys.files.all(commissionId)],
  'membership.changed': ({ commissionId }) => [
    keys.me(),
    keys.commission(commissionId),
    keys.commissions.lists(),
    keys.bench(),
  ],
};

/** Events of one act come close together: they are gathered this long and each key goes stale once. */
const WINDOW_MS = 250;

/** Gathers keys and makes each stale once per window. */
export function createBatch(
  queryClient: Pick<QueryClient, 'invalidateQueries'>,
  windowMs = WINDOW_MS,
): (queryKeys: readonly QueryKey[]) => void {
  const waiting = new Map<string, QueryKey>();
  let timer: ReturnType<typeof setTimeout> | undefined;
  return (queryKeys) => {
    for (const key of queryKeys) waiting.set(hashKey(key), key);
    timer ??= setTimeout(() => {
      timer = undefined;
      const batch = [...waiting.values()];
      waiting.clear();
      for (const queryKey of batch) void queryClient.invalidateQueries({ queryKey });
    }, windowMs);
  };
}

const LIVE = new Set<unknown>(['me', 'bench', 'commission', 'commissions']);

/** What events speak of: the reader's own rights, the bench, and commissions but for their messages. */
const isLive = (queryKey: QueryKey): boolean => LIVE.has(queryKey[0]) && !queryKey.includes('messages');

/** Ties the server's events to the query cache for as long as the page lives. */
export function followRealtime(queryClient: QueryClient): void {
  const add = createBatch(queryClient);
  const follow = <N extends RealtimeName>(name: N): void => {
    onRealtime(name, (event) => add(INVALIDATIONS[name](event)));
  };
  for (const name of Object.keys(REALTIME_EVENTS) as RealtimeName[]) follow(name);
  // Whoever lost sight must not go on reading what was fetched while they had it.
  onRealtime('membership.changed', ({ commissionId }) => {
    void queryClient.resetQueries({ queryKey: keys.commission(commissionId) });
  });
  // Events are sent at most once, and none comes before the connection stands: at each connect, the first one too, what
  // the page shows is asked for again. Threads ask by sequence.
  onConnected(() => {
    void queryClient.invalidateQueries({ predicate: (query) => isLive(query.queryKey) });
  });
  // Asked who we are, the API answers that nobody is signed in, and the page goes where that leads.
  onSessionEnded(() => void queryClient.invalidateQueries({ queryKey: keys.me() }));
}
