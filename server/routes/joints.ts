import * as contracts from '../../shared/contracts/joints.ts';
import { addReadings } from '../commands/joints/add-readings.ts';
import { createJoint } from '../commands/joints/create-joint.ts';
import { updateJoint } from '../commands/joints/update-joint.ts';
import type { Api } from '../http/api.ts';
import { authorize, authorizeCommissionSight } from '../policies/authorize.ts';
import { presentJoint, presentReading } from '../presenters/joint.ts';
import { loadJoint, loadReadings, loadVisibleJoints } from '../queries/joints/load-joints.ts';

export function mountJoints(api: Api): void {
  api.signedIn(contracts.listJoints, async (ctx, { params: { commissionId } }) => {
    authorizeCommissionSight(ctx.ability, commissionId);
    return (await loadVisibleJoints(ctx.manager, ctx.ability, commissionId)).map(presentJoint);
  });
  api.signedIn(contracts.getJoint, async (ctx, { params }) => {
    const joint = await loadJoint(ctx.manager, params.commissionId, params.jointId);
    authorize(ctx.ability, 'read', 'Joint', joint);
    return { joint: presentJoint(joint), readings: (await loadReadings(ctx.manager, joint.id)).map(presentReading) };
  });
  api.signedIn(contracts.createJoint, async (ctx, input) => presentJoint(await createJoint(ctx, input)));
  api.signedIn(contracts.updateJoint, async (ctx, input) => presentJoint(await updateJoint(ctx, input)));
  api.signedIn(contracts.addReadings, async (ctx, input) => (await addReadings(ctx, input)).map(presentReading));
}
