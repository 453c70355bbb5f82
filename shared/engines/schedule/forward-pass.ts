import { EngineInputError } from '../engine-input-error.ts';
import { findLoop } from './find-loop.ts';

/** One activity of a network, in any unit of time. */
export interface Activity {
  readonly id: string;
  readonly duration: number;
  /** Activities it waits for, with the time between their end and its start. */
  readonly after: readonly { readonly id: string; readonly lag: number }[];
  /** It starts no earlier than this. */
  readonly notBefore?: number;
  /** It ends no earlier than this. */
  readonly endNotBefore?: number;
}

export interface Timing {
  readonly id: string;
  readonly start: number;
  readonly finish: number;
  /** The activity that its start waited for; null when it waited for none. */
  readonly drivenBy: string | null;
}

/** Activities wait for each other in a circle; `path` names them in order, the first again at the end. */
export class ScheduleLoopError extends EngineInputError {
  readonly path: readonly string[];

  constructor(path: readonly string[]) {
    super('after', `These wait for each other in a circle: ${path.join(' → ')}`);
    this.path = path;
  }
}

/**
 * Earliest start and finish of each activity (the forward pass of the critical path method; Kelley and Walker 1959):
 * start = max(notBefore, finish of each predecessor + lag), finish = max(start + duration, endNotBefore).
 *
 * @returns timings by id
 * @throws ScheduleLoopError for a loop, EngineInputError for a negative duration or an unknown predecessor
 */
export function forwardPass(activities: readonly Activity[]): Map<string, Timing> {
  const byId = new Map(activities.map((activity) => [activity.id, activity]));
  const loop = findLoop(
    new Map(activities.map((activity) => [activity.id, activity.after.map((before) => before.id)])),
  );
  if (loop) throw new ScheduleLoopError(loop);
  const timings = new Map<string, Timing>();

  const time = (activity: Activity): Timing => {
    const known = timings.get(activity.id);
    if (known) return known;
    if (!(activity.duration >= 0)) throw new EngineInputError('duration', `${activity.id} has a negative duration`);
    let start = activity.notBefore ?? 0;
    let drivenBy: string | null = null;
    for (const { id, lag } of activity.after) {
      const before = byId.get(id);
      if (!before) throw new EngineInputError('after', `${activity.id} waits for ${id}, which is not in the network`);
      const ready = time(before).finish + lag;
      if (ready > start || (drivenBy === null && ready === start)) {
        start = ready;
        drivenBy = id;
      }
    }
    const finish = Math.max(start + activity.duration, activity.endNotBefore ?? -Infinity);
    const timing = { id: activity.id, start, finish, drivenBy };
    timings.set(activity.id, timing);
    return timing;
  };
  for (const activity of activities) time(activity);
  return timings;
}

/** The chain of activities that drives the latest finish, first to last. */
export function drivingPath(timings: ReadonlyMap<string, Timing>): string[] {
  let last: Timing | undefined;
  for (const timing of timings.values()) if (!last || timing.finish > last.finish) last = timing;
  const path: string[] = [];
  while (last) {
    path.unshift(last.id);
    last = last.drivenBy === null ? undefined : timings.get(last.drivenBy);
  }
  return path;
}
