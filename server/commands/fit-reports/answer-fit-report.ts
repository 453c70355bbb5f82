import type { answerFitReport as contract, FitReportDetail } from '../../../shared/contracts/fit-reports.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { Joint } from '../../entities/joint.ts';
import { ReworkNote } from '../../entities/rework-note.ts';
import { InputInvalid } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { requireParties } from '../../queries/parties/load-party.ts';
import { reportAct } from './report-act.ts';

/** Adds a rework note. A note that was offered before and not agreed steps back for the new one. */
export const answerFitReport = (
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<FitReportDetail> =>
  reportAct(
    ctx,
    { ...params, revision: body.revision, action: 'answer', act: 'answer', words: body.method },
    async (uow, report, earlier) => {
      const { revision: _revision, ...fields } = body;
      if (body.costBorneByPartyId)
        await requireParties(uow.manager, params.commissionId, [['/body/costBorneByPartyId', body.costBorneByPartyId]]);
      const joint = await uow.manager.findOneByOrFail(Joint, { id: report.jointId });
      if (joint.hiddenLengthMm !== null && (body.overLengthMm ?? 0) > joint.hiddenLengthMm && !body.shows)
        throw new InputInvalid([
          {
            pointer: '/body/overLengthMm',
            message: `${joint.hiddenLengthMm} mm of this joint are hidden, so a cut over ${body.overLengthMm} mm shows: say where, and the client is asked`,
          },
        ]);
      if (earlier?.state === 'offered')
        await uow.manager.update(ReworkNote, { id: earlier.id }, { state: 'other-limits-asked' });
      await uow.manager.insert(ReworkNote, {
        ...fields,
        whereItShows: fields.shows ? fields.whereItShows : '',
        reportId: report.id,
        partyId: report.answerPartyId,
        accountId: ctx.actor.accountId,
        createdAt: ctx.now,
      });
    },
  );
