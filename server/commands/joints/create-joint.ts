import type { createJoint as contract } from '../../../shared/contracts/joints.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Joint } from '../../entities/joint.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorizeCreate } from '../../policies/authorize.ts';
import type { JointRecord } from '../../queries/joints/load-joints.ts';
import { checkJoint } from './check-joint.ts';

export const createJoint = (
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<JointRecord> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId } = params;
    authorizeCreate(ctx.ability, 'Joint', {
      commissionId,
      holePartyId: body.holePartyId,
      shaftPartyId: body.shaftPartyId,
    });
    await checkJoint(uow.manager, commissionId, body);
    const row = await uow.manager.save(uow.manager.create(Joint, { ...body, commissionId }));
    const partyIds = [row.holePartyId, row.shaftPartyId];
    uow.record({
      commissionId,
      accountId: ctx.actor.accountId,
      subject: 'joint',
      subjectId: row.id,
      words: `Added the joint ${row.name}`,
      partyIds,
    });
    uow.announce('joint.changed', { commissionId, jointId: row.id }, { to: 'parties', commissionId, partyIds });
    return Object.assign(row, { openReportId: null });
  });
