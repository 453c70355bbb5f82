import type { JointView, ReadingView } from '../../../shared/contracts/joints.ts';
import { assessClearance, type ClearanceResult } from '../../../shared/engines/fit/clearance.ts';
import { limitsFor } from '../../../shared/engines/fit/limits.ts';
import { removalFor, type Removal } from '../../../shared/engines/fit/removal.ts';

export interface SideOfJoint {
  readings: readonly ReadingView[];
  readingsUm: number[];
  agreed: { label: string; lowerUm: number; upperUm: number } | null;
}

export interface FitOfJoint {
  hole: SideOfJoint;
  shaft: SideOfJoint;
  /** Null until both sides are measured. */
  result: ClearanceResult | null;
  removal: Removal | null;
}

/** The newest set of one side: a verdict is about the parts as they are now. */
export function newestSet(readings: readonly ReadingView[], side: ReadingView['side']): ReadingView[] {
  const ofSide = readings.filter((reading) => reading.side === side);
  const newest = Math.max(0, ...ofSide.map((reading) => reading.setNumber));
  return ofSide.filter((reading) => reading.setNumber === newest);
}

function agreedOf(toleranceClass: string | null, nominalMm: number): SideOfJoint['agreed'] {
  if (!toleranceClass) return null;
  try {
    const { upperUm, lowerUm } = limitsFor(toleranceClass, nominalMm);
    return { label: toleranceClass, lowerUm, upperUm };
  } catch {
    return null; // the server takes no class outside the tables; an older one is then not drawn
  }
}

/** Everything the page shows of a joint's fit, from its readings and what was agreed. */
export function fitOfJoint(joint: JointView, readings: readonly ReadingView[]): FitOfJoint {
  const sideOf = (side: ReadingView['side'], toleranceClass: string | null): SideOfJoint => {
    const newest = newestSet(readings, side);
    return {
      readings: newest,
      readingsUm: newest.map((reading) => (reading.valueMm - joint.nominalMm) * 1000),
      agreed: agreedOf(toleranceClass, joint.nominalMm),
    };
  };
  const hole = sideOf('hole', joint.holeClass);
  const shaft = sideOf('shaft', joint.shaftClass);
  const range = { clearanceMinUm: joint.clearanceMinUm, clearanceMaxUm: joint.clearanceMaxUm };
  const result =
    hole.readings.length > 0 && shaft.readings.length > 0
      ? assessClearance({ hole: hole.readings, shaft: shaft.readings, ...range })
      : null;
  return { hole, shaft, result, removal: result && removalFor(result, range) };
}
