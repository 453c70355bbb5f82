import type { FitReportDetail, raiseFitReport as contract } from '../../../shared/contracts/fit-reports.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { FitReport } from '../../entities/fit-report.ts';
import { Joint } from '../../entities/joint.ts';
import { Leg } from '../../entities/leg.ts';
import { ReportEvent } from '../../entities/report-event.ts';
import { InputInvalid } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { actingParty } from '../../policies/acting-party.ts';
import { authorize } from '../../policies/authorize.ts';
import { loadReportDetail } from '../../queries/fit-reports/load-report.ts';
import { announceReport } from './report-act.ts';

export const raiseFitReport = (
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<FitReportDetail> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId } = params;
    const joint = await uow.manager.findOneBy(Joint, { id: body.jointId, commissionId });
    authorize(ctx.ability, 'raise', 'Joint', joint);
    const sides = [joint.holePartyId, joint.shaftPartyId];
    const { partyId: raisedByPartyId } = actingParty(ctx.actor, commissionId, sides);
    // Whoever raises it, the other side of the joint answers; one shop that made both sides answers itself.
    const answerPartyId = body.answerPartyId ?? sides.find((partyId) => partyId !== raisedByPartyId) ?? raisedByPartyId;
    if (!sides.includes(answerPartyId))
      throw new InputInvalid([
        { pointer: '/body/answerPartyId', message: 'One of the two parties of the joint answers' },
      ]);
    if (body.blocking && !body.heldLegId)
      throw new InputInvalid([{ pointer: '/body/heldLegId', message: 'Say which leg is held' }]);
    if (body.heldLegId && (await uow.manager.countBy(Leg, { id: body.heldLegId, commissionId })) === 0)
      throw new InputInvalid([{ pointer: '/body/heldLegId', message: 'This leg is not in this commission' }]);
    const report = await uow.manager.save(
      uow.manager.create(FitReport, {
        commissionId,
        jointId: joint.id,
        title: body.title,
        plainWords: body.plainWords,
        blocking: body.blocking,
        heldLegId: body.blocking ? body.heldLegId : null,
        raisedByPartyId,
        raisedByAccountId: ctx.actor.accountId,
        answerPartyId,
        raisedAt: ctx.now,
      }),
    );
    await uow.manager.insert(ReportEvent, {
      reportId: report.id,
      act: 'raise',
      fromState: null,
      toState: 'raised',
      accountId: ctx.actor.accountId,
      words: body.plainWords,
    });
    uow.record({
      commissionId,
      accountId: ctx.actor.accountId,
      subject: 'report',
      subjectId: report.id,
      words: `Raised a fit report: ${report.title}`,
      partyIds: [raisedByPartyId, answerPartyId],
    });
    announceReport(uow, report);
    uow.announce(
      'joint.changed',
      { commissionId, jointId: joint.id },
      { to: 'parties', commissionId, partyIds: sides },
    );
    return loadReportDetail(uow.manager, commissionId, report.id);
  });
