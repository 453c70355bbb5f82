import type { Action } from '../../../shared/abilities/actions.ts';
import { nextReportState, type ReportAct } from '../../../shared/engines/reports/report-states.ts';
import type { FitReportDetail } from '../../../shared/contracts/fit-reports.ts';
import { inTransaction, type UnitOfWork } from '../../db/unit-of-work.ts';
import { FitReport } from '../../entities/fit-report.ts';
import { ReportEvent } from '../../entities/report-event.ts';
import { ReworkNote } from '../../entities/rework-note.ts';
import { NotInThisState, StaleRevision } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { authorize } from '../../policies/authorize.ts';
import { loadReportDetail } from '../../queries/fit-reports/load-report.ts';

/** The note that the report's next step is about: the newest one that was not sent back. */
export async function currentNote(uow: UnitOfWork, reportId: string): Promise<ReworkNote | null> {
  const [note] = await uow.manager.find(ReworkNote, {
    where: { reportId },
    order: { createdAt: 'DESC', id: 'DESC' },
    take: 1,
  });
  return note && note.state !== 'other-limits-asked' ? note : null;
}

interface ActInput {
  commissionId: string;
  reportId: string;
  revision: number;
  /** Right the act needs. */
  action: Action;
  act: ReportAct;
  words: string;
}

/** Everyone who sees the report hears of a change; a leg that is held or freed moves the plan and the merged status. */
export function announceReport(uow: UnitOfWork, report: FitReport): void {
  const { commissionId } = report;
  const partyIds = [report.raisedByPartyId, report.answerPartyId];
  uow.announce(
    'fit-report.changed',
    { commissionId, reportId: report.id, jointId: report.jointId },
    { to: 'parties', commissionId, partyIds },
  );
  if (report.heldLegId) uow.announce('legs.changed', { commissionId }, { to: 'everyone', commissionId });
  uow.announce('standing.changed', { commissionId }, { to: 'everyone', commissionId });
}

/**
 * One step of a report: lock, authorize, guard the revision, ask the state rules, change, keep the history, announce.
 * `change` does what is particular to the act.
 */
export const reportAct = (
  ctx: RequestContext,
  input: ActInput,
  change: (uow: UnitOfWork, report: FitReport, note: ReworkNote | null) => Promise<void>,
): Promise<FitReportDetail> =>
  inTransaction(ctx, async (uow) => {
    const { commissionId, reportId } = input;
    const report = await uow.manager.findOne(FitReport, {
      where: { id: reportId, commissionId },
      lock: { mode: 'pessimistic_write' },
    });
    authorize(ctx.ability, input.action, 'FitReport', report);
    if (report.revision !== input.revision)
      throw new StaleRevision(await loadReportDetail(uow.manager, commissionId, reportId));
    const note = await currentNote(uow, reportId);
    const next = nextReportState(
      { state: report.state, shows: note?.shows ?? false, consent: note?.consentState ?? null },
      input.act,
    );
    if (!next.ok) throw new NotInThisState(next.words);
    const fromState = report.state;
    report.state = next.state;
    report.revision += 1;
    await change(uow, report, note);
    await uow.manager.save(report);
    await uow.manager.insert(ReportEvent, {
      reportId,
      act: input.act,
      fromState,
      toState: next.state,
      accountId: ctx.actor.accountId,
      words: input.words,
    });
    uow.record({
      commissionId,
      accountId: ctx.actor.accountId,
      subject: 'report',
      subjectId: reportId,
      words: `${HISTORY_WORDS[input.act]}: ${report.title}`,
      partyIds: [report.raisedByPartyId, report.answerPartyId],
    });
    announceReport(uow, report);
    return loadReportDetail(uow.manager, commissionId, reportId);
  });

const HISTORY_WORDS: Readonly<Record<ReportAct, string>> = {
  answer: 'Answered with a rework note',
  agree: 'Agreed to the rework',
  'ask-other-limits': 'Asked for another answer',
  'start-rework': 'Began the rework',
  'finish-rework': 'Finished the rework',
  'verify-pass': 'Verified and closed',
  'verify-fail': 'Verification failed, report open again',
  withdraw: 'Took the report back',
};
