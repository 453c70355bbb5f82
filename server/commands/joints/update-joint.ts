import type { updateJoint as contract } from '../../../shared/contracts/joints.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { Joint } from '../../entities/joint.ts';
import { NotFound } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { presentJoint } from '../../presenters/joint.ts';
import { loadJoint, type JointRecord } from '../../queries/joints/load-joints.ts';
import { given, guardRevision } from '../revision.ts';
import { checkJoint } from './check-joint.ts';

export const updateJoint = (
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<JointRecord> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, jointId } = params;
    await uow.manager.findOne(Joint, { where: { id: jointId, commissionId }, lock: { mode: 'pessimistic_write' } });
    const row = await loadJoint(uow.manager, commissionId, jointId);
    authorize(ctx.ability, 'update', 'Joint', row);
    const { revision, ...rest } = body;
    guardRevision(row, revision, () => presentJoint(row));
    const changes = given(rest);
    await checkJoint(uow.manager, commissionId, { ...row, ...changes });
    await uow.manager.update(Joint, { id: jointId }, { ...changes, revision: row.revision + 1 });
    const saved = await loadJoint(uow.manager, commissionId, jointId);
    if (!saved) throw new NotFound();
    // Those who answered for it until now hear of the change too.
    const partyIds = [...new Set([row.holePartyId, row.shaftPartyId, saved.holePartyId, saved.shaftPartyId])];
    uow.record({
      commissionId,
      accountId: ctx.actor.accountId,
      subject: 'joint',
      subjectId: jointId,
      words: `Changed the joint ${saved.name}`,
      partyIds,
    });
    uow.announce('joint.changed', { commissionId, jointId }, { to: 'parties', commissionId, partyIds });
    return saved;
  });
