import type { BandModel, BandStep, BandTube, RingState } from '../../../shared/engines/band/band-types.ts';

/**
 * What one lane (one part) shows beside one step. `before` and `after`: whether the lane goes on above and below.
 * `joins`: lanes to cross towards the part that this one goes into; 0 when it does not end here.
 */
export type LaneCell =
  | { kind: 'none' }
  | { kind: 'rod' }
  | { kind: 'fade' }
  | { kind: 'ring'; state: RingState; before: boolean; after: boolean; joins: number }
  | {
      kind: 'tube';
      state: BandTube['state'];
      held: boolean;
      here: boolean;
      before: boolean;
      after: boolean;
      joins: number;
    };

export interface LaneStep {
  step: BandStep;
  /** A tube's length by the days of its work: it orders, it does not measure. */
  size: 'ring' | 'short' | 'middle' | 'long';
  cells: LaneCell[];
}

const MS_PER_DAY = 86_400_000;

/** Sorts the steps of the band into one lane per part. Pure. */
export function lanesOf(model: BandModel): LaneStep[] {
  const spanDays = (Date.parse(model.lastDay) - Date.parse(model.firstDay)) / MS_PER_DAY;
  const tubes = new Map(
    model.rows.flatMap((row, lane) => row.tubes.map((tube) => [tube.legId, { tube, lane }] as const)),
  );
  const ringLanes = new Map(
    model.rows.flatMap((row, lane) => row.rings.map((ring) => [ring.handoffId, lane] as const)),
  );
  const fadeLane = Math.max(
    0,
    model.rows.findIndex((row) => row.labels.some((label) => label.tone === 'expected')),
  );
  const laneOf = (step: BandStep): number =>
    (step.kind === 'leg' ? tubes.get(step.id)?.lane : step.kind === 'handoff' ? ringLanes.get(step.id) : fadeLane) ?? 0;

  const lanes = model.steps.map(laneOf);
  const first = model.rows.map((_, lane) => lanes.indexOf(lane));
  const last = model.rows.map((_, lane) => lanes.lastIndexOf(lane));
  return model.steps.map((step, at) => {
    const own = lanes[at] ?? 0;
    const before = at > (first[own] ?? 0);
    const after = at < (last[own] ?? 0);
    const tube = step.kind === 'leg' ? tubes.get(step.id)?.tube : undefined;
    const target = model.collars.find((collar) => collar.fromRow === own)?.toRow ?? own;
    const joins = after ? 0 : Math.max(0, own - target);
    const cells = model.rows.map((_, lane): LaneCell => {
      if (lane !== own) return at > (first[lane] ?? 0) && at < (last[lane] ?? 0) ? { kind: 'rod' } : { kind: 'none' };
      if (tube)
        return {
          kind: 'tube',
          state: tube.state,
          held: step.state === 'held',
          here: step.here,
          before,
          after,
          joins,
        };
      if (step.kind === 'handoff') return { kind: 'ring', state: step.ring ?? 'open', before, after, joins };
      return { kind: 'fade' };
    });
    return {
      step,
      size: tube ? sizeOf((tube.x1 - tube.x0) * spanDays) : step.kind === 'handoff' ? 'ring' : 'short',
      cells,
    };
  });
}

const sizeOf = (days: number): LaneStep['size'] => (days < 8 ? 'short' : days < 18 ? 'middle' : 'long');
