import type { IsoDay } from '../../units/calendar-day.ts';
import { drivingPath, forwardPass, type Activity, type Timing } from './forward-pass.ts';
import { pertMean, pertVariance, Z_90, type ThreePoint } from './three-point.ts';
import { WorkingDays, type WorkingDay } from './working-days.ts';

export interface PlanLeg {
  readonly id: string;
  readonly afterLegIds: readonly string[];
  readonly state: 'planned' | 'under-way' | 'finished' | 'dropped';
  readonly hopefulDays: number;
  readonly likelyDays: number;
  readonly badDays: number;
  readonly plannedStartOn: IsoDay | null;
  readonly startedOn: IsoDay | null;
  readonly finishedOn: IsoDay | null;
  /** Day from which an open blocking report holds it. */
  readonly heldSince: IsoDay | null;
}

export interface PlanHandoff {
  readonly id: string;
  readonly fromLegId: string | null;
  /** Null for the last one, to the client. */
  readonly toLegId: string | null;
  /** Working days on the way. */
  readonly transitDays: number;
  readonly agreedOn: IsoDay | null;
  readonly doneOn: IsoDay | null;
}

export interface PlanInput {
  readonly legs: readonly PlanLeg[];
  readonly handoffs: readonly PlanHandoff[];
  readonly todayIso: IsoDay;
  readonly isWorkingDay: WorkingDay;
}

export interface Plan {
  /** By likely estimates: first and last working day of each leg. */
  readonly legs: ReadonlyMap<string, { startOn: IsoDay; finishOn: IsoDay }>;
  /** Working numbers: mean and standard deviation in working days along the driving path. */
  readonly path: readonly string[];
  readonly meanDays: number;
  readonly sigmaDays: number;
  /**
   * Delivery between the 10th and the 90th percentile, by the normal sum along the driving path. Parallel paths that
   * merge make the true day later than this says (merge bias).
   */
  readonly expected: { fromDay: IsoDay; toDay: IsoDay } | null;
}

const points = (leg: PlanLeg): ThreePoint => ({ hopeful: leg.hopefulDays, likely: leg.likelyDays, bad: leg.badDays });
const deliveryId = (handoffId: string): string => `delivery:${handoffId}`;

/** The network of a plan with each leg's duration given by `durationOf`, in working-day numbers. */
function networkOf(input: PlanInput, days: WorkingDays, durationOf: (leg: PlanLeg) => number): Activity[] {
  const today = days.numberOf(input.todayIso);
  const live = input.legs.filter((leg) => leg.state !== 'dropped');
  const liveIds = new Set(live.map((leg) => leg.id));
  const byId = new Map(input.legs.map((leg) => [leg.id, leg]));
  // What waited for a dropped leg waits for what that one waited for: the part still comes from there.
  const waitsFor = (leg: PlanLeg): ReadonlySet<string> => {
    const found = new Set<string>();
    const passed = new Set<string>();
    const ahead = [...leg.afterLegIds];
    for (let id = ahead.pop(); id !== undefined; id = ahead.pop()) {
      if (liveIds.has(id)) found.add(id);
      else if (!passed.has(id)) ahead.push(...(byId.get(id)?.afterLegIds ?? []));
      passed.add(id);
    }
    return found;
  };
  const dayAfter = (day: IsoDay): number => days.numberOf(day) + 1;

  const legs = live.map((leg): Activity => {
    const arrivals = input.handoffs.filter((handoff) => handoff.toLegId === leg.id);
    const lags = new Map([...waitsFor(leg)].map((id) => [id, 0]));
    for (const { fromLegId, transitDays, doneOn } of arrivals)
      if (fromLegId && liveIds.has(fromLegId) && !doneOn)
        lags.set(fromLegId, Math.max(lags.get(fromLegId) ?? 0, transitDays));
    if (leg.startedOn) {
      const start = days.numberOf(leg.startedOn);
      if (leg.finishedOn)
        return { id: leg.id, duration: Math.max(0, dayAfter(leg.finishedOn) - start), after: [], notBefore: start };
      // What a hold leaves undone begins again today at the earliest.
      const done = leg.heldSince ? Math.max(0, days.numberOf(leg.heldSince) - start) : 0;
      const left = leg.heldSince ? today + Math.max(1, durationOf(leg) - done) : today + 1;
      return { id: leg.id, duration: durationOf(leg), after: [], notBefore: start, endNotBefore: left };
    }
    const given = arrivals.flatMap(({ agreedOn, doneOn }) =>
      (doneOn ?? agreedOn) ? [days.numberOf((doneOn ?? agreedOn) as IsoDay)] : [],
    );
    const notBefore = Math.max(today, leg.plannedStartOn ? days.numberOf(leg.plannedStartOn) : 0, ...given);
    return { id: leg.id, duration: durationOf(leg), after: [...lags].map(([id, lag]) => ({ id, lag })), notBefore };
  });
  const deliveries = input.handoffs
    .filter((handoff) => handoff.toLegId === null && handoff.fromLegId && liveIds.has(handoff.fromLegId))
    .map((handoff): Activity => ({
      id: deliveryId(handoff.id),
      duration: 0,
      after: handoff.doneOn ? [] : [{ id: handoff.fromLegId ?? '', lag: handoff.transitDays }],
      ...((handoff.doneOn ?? handoff.agreedOn)
        ? { notBefore: dayAfter((handoff.doneOn ?? handoff.agreedOn) as IsoDay) }
        : {}),
    }));
  return [...legs, ...deliveries];
}

const earliest = (input: PlanInput): IsoDay => {
  const known = [
    input.todayIso,
    ...input.legs.flatMap((leg) => [leg.plannedStartOn, leg.startedOn]),
    ...input.handoffs.flatMap((handoff) => [handoff.agreedOn, handoff.doneOn]),
  ].filter((day) => day !== null);
  return known.reduce((first, day) => (day < first ? day : first));
};

/**
 * The plan as things stand: actual days replace estimates, a leg under way ends today at the earliest, an agreed handoff
 * day holds back the leg it feeds, and a hold pushes all that hangs on it.
 *
 * @throws ScheduleLoopError when legs wait for each other in a circle
 */
export function planOf(input: PlanInput): Plan {
  const days = new WorkingDays(earliest(input), input.isWorkingDay);
  const likely = forwardPass(networkOf(input, days, (leg) => leg.likelyDays));
  const means = forwardPass(networkOf(input, days, (leg) => pertMean(points(leg))));
  const path = drivingPath(means);
  const legsById = new Map(input.legs.map((leg) => [leg.id, leg]));
  const open = path.map((id) => legsById.get(id)).filter((leg) => leg !== undefined && leg.finishedOn === null);
  const sigmaDays = Math.sqrt(open.reduce((sum, leg) => sum + (leg ? pertVariance(points(leg)) : 0), 0));
  const end = Math.max(...[...means.values()].map((timing) => timing.finish));
  const lastDay = (finish: number): IsoDay => days.dayOf(Math.ceil(finish) - 1);
  const legDays = (timing: Timing): { startOn: IsoDay; finishOn: IsoDay } => ({
    startOn: days.dayOf(timing.start),
    finishOn: lastDay(Math.max(timing.finish, timing.start + 1)),
  });
  const soonest = days.numberOf(input.todayIso) + 1;
  const within = (finish: number): IsoDay => lastDay(open.length > 0 ? Math.max(finish, soonest) : finish);
  return {
    legs: new Map(
      [...likely.values()].filter((timing) => legsById.has(timing.id)).map((timing) => [timing.id, legDays(timing)]),
    ),
    path: path.filter((id) => legsById.has(id)),
    meanDays: end,
    sigmaDays,
    expected:
      means.size === 0 ? null : { fromDay: within(end - Z_90 * sigmaDays), toDay: within(end + Z_90 * sigmaDays) },
  };
}

/** The plan as it would be if a handoff were agreed for a day. */
export const planWithDay = (input: PlanInput, handoffId: string, onDay: IsoDay): Plan =>
  planOf({
    ...input,
    handoffs: input.handoffs.map((handoff) => (handoff.id === handoffId ? { ...handoff, agreedOn: onDay } : handoff)),
  });
