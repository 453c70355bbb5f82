import type { JointView } from '../../../shared/contracts/joints.ts';
import type { JointSide } from '../../../shared/contracts/vocabulary.ts';

/** The side of a joint that the reader's parties answer for, where it is one. */
export function ownSideOf(
  joint: Pick<JointView, 'holePartyId' | 'shaftPartyId'>,
  mine: ReadonlySet<string>,
): JointSide | null {
  const [hole, shaft] = [mine.has(joint.holePartyId), mine.has(joint.shaftPartyId)];
  return hole === shaft ? null : hole ? 'hole' : 'shaft';
}
