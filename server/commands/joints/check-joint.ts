import type { EntityManager } from 'typeorm';
import { limitsFor } from '../../../shared/engines/fit/limits.ts';
import { InputInvalid } from '../../errors.ts';
import { requireParties } from '../../queries/parties/load-party.ts';
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

/** What no schema can see of a joint: its parts and parties are here, the range is in order, and the classes exist. */
export async function checkJoint(manager: EntityManager, commissionId: string, joint: JointFacts): Promise<void> {
  await requireParts(manager, commissionId, [
    ['/body/holePartId', joint.holePartId],
    ['/body/shaftPartId', joint.shaftPartId],
  ]);
  await requireParties(manager, commissionId, [
    ['/body/holePartyId', joint.holePartyId],
    ['/body/shaftPartyId', joint.shaftPartyId],
  ]);
  const errors = (['holeClass', 'shaftClass'] as const).flatMap((field) => {
    const classText = joint[field];
    return classText && unreadable(classText, joint.nominalMm)
      ? [
          {
            pointer: `/body/${field}`,
            message: `ISO 286 has no ${classText} at ${joint.nominalMm} mm in the tables carried here`,
          },
        ]
      : [];
  });
  if (joint.holePartId === joint.shaftPartId)
    errors.push({ pointer: '/body/shaftPartId', message: 'A joint is between two parts' });
  if (joint.clearanceMinUm > joint.clearanceMaxUm)
    errors.push({ pointer: '/body/clearanceMinUm', message: 'The least clearance can not be above the greatest' });
  if (errors.length > 0) throw new InputInvalid(errors);
}
