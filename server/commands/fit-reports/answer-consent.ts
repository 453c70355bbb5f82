import { In } from 'typeorm';
import type { answerConsent as contract, ConsentView } from '../../../shared/contracts/fit-reports.ts';
import type { ParsedInput } from '../../../shared/contracts/route.ts';
import { inTransaction } from '../../db/unit-of-work.ts';
import { FitReport } from '../../entities/fit-report.ts';
import { ReportEvent } from '../../entities/report-event.ts';
import { ReworkNote } from '../../entities/rework-note.ts';
import { NotFound, NotInThisState } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { loadConsents } from '../../queries/fit-reports/load-consents.ts';
import { announceReport } from './report-act.ts';

/** The client's yes or no to a rework that shows. It is given once; a new rework note asks anew. */
export const answerConsent = (
  ctx: RequestContext,
  { params, body }: ParsedInput<typeof contract>,
): Promise<ConsentView> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, noteId } = params;
    authorize(ctx.ability, 'consent', 'Consent', { commissionId });
    // The report first, as every step of a report does: two orders of locks would wait for each other.
    const about = await uow.manager.findOneBy(ReworkNote, { id: noteId });
    const report =
      about &&
      (await uow.manager.findOne(FitReport, {
        where: { id: about.reportId, commissionId },
        lock: { mode: 'pessimistic_write' },
      }));
    const note =
      report &&
      (await uow.manager.findOneBy(ReworkNote, { id: noteId, consentState: In(['asked', 'given', 'refused']) }));
    if (!note) throw new NotFound();
    if (note.consentState !== 'asked')
      throw new NotInThisState(`This was answered already: consent ${note.consentState}. Nothing was changed.`);
    await uow.manager.update(
      ReworkNote,
      { id: noteId },
      {
        consentState: body.given ? 'given' : 'refused',
        consentAnsweredAt: ctx.now,
        consentByAccountId: ctx.actor.accountId,
        consentWords: body.words,
      },
    );
    report.revision += 1;
    await uow.manager.save(report);
    await uow.manager.insert(ReportEvent, {
      reportId: report.id,
      act: body.given ? 'consent-given' : 'consent-refused',
      fromState: report.state,
      toState: report.state,
      accountId: ctx.actor.accountId,
      words: body.words,
    });
    uow.record({
      commissionId,
      accountId: ctx.actor.accountId,
      subject: 'report',
      subjectId: report.id,
      clientMayRead: false,
      words: body.given ? 'The client consents to what will show' : 'The client refuses what would show',
      partyIds: [report.raisedByPartyId, report.answerPartyId],
    });
    uow.announce('consent.changed', { commissionId }, { to: 'everyone', commissionId });
    announceReport(uow, report);
    const [view] = await loadConsents(uow.manager, commissionId, noteId);
    if (!view) throw new NotFound();
    return view;
  });
