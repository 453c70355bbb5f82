import type { EntityManager } from 'typeorm';
import { limitsFor } from '../../../shared/engines/fit/limits.ts';
import type { ProblemError } from '../../../shared/problems/problems.ts';
import { InputInvalid } from '../../errors.ts';
import { requireShops } from '../../queries/parties/load-party.ts';
import { requireParts } from '../../queries/parts/load-part.ts';

interface JointFacts {
  holePartId: string;
  shaftPartId: string;
  holePartyId: string;
  shaftPartyId: string;
  nominalMm: number;
  clearanceMinUm: number;
  clearanceMaxUm: number;
  holeClass: string | null;
  shaftClass: string | null;
}

const unreadable = (classText: string, nominalMm: number): boolean => {
  try {
    limitsFor(classText, nominalMm);
    return false;
  } catch {
    return true;
  }
};

/** ISO 286-1 writes classes of holes with capitals and those of shafts with small letters: h8 is no class of a hole. */
function classErrors(joint: JointFacts, field: 'holeClass' | 'shaftClass'): ProblemError[] {
  const classText = joint[field];
  if (!classText) return [];
  const pointer = `/body/${field}`;
  if (field === 'holeClass' && classText !== classText.toUpperCase())
    return [{ pointer, message: 'The outer part takes a class in capitals, such as H8' }];
  if (field === 'shaftClass' && classText !== classText.toLowerCase())
    return [{ pointer, message: 'The inner part takes a class in small letters, such as f7' }];
  return unreadable(classText, joint.nominalMm)
    ? [{ pointer, message: `ISO 286 has no ${classText} at ${joint.nominalMm} mm in the tables carried here` }]
    : [];
}

/** What no schema can see of a joint: its parts and parties are here, the range is in order, and the classes exist. */
export async function checkJoint(manager: EntityManager, commissionId: string, joint: JointFacts): Promise<void> {
  await requireParts(manager, commissionId, [
    ['/body/holePartId', joint.holePartId],
    ['/body/shaftPartId', joint.shaftPartId],
  ]);
  await requireShops(manager, commissionId, [
    ['/body/holePartyId', joint.holePartyId],
    ['/body/shaftPartyId', joint.shaftPartyId],
  ]);
  const errors = [...classErrors(joint, 'holeClass'), ...classErrors(joint, 'shaftClass')];
  if (joint.holePartId === joint.shaftPartId)
    errors.push({ pointer: '/body/shaftPartId', message: 'A joint is between two parts' });
  if (joint.clearanceMinUm > joint.clearanceMaxUm)
    errors.push({ pointer: '/body/clearanceMinUm', message: 'The least clearance cannot be above the greatest' });
  if (errors.length > 0) throw new InputInvalid(errors);
}
