import { MoreThan } from 'typeorm';
import type * as contracts from '../../../shared/contracts/fit-reports.ts';
import type { FitReportDetail } from '../../../shared/contracts/fit-reports.ts';
import type { AnyRoute, ParsedInput } from '../../../shared/contracts/route.ts';
import type { UnitOfWork } from '../../db/unit-of-work.ts';
import type { FitReport } from '../../entities/fit-report.ts';
import { Reading } from '../../entities/reading.ts';
import { ReportEvent } from '../../entities/report-event.ts';
import { ReworkNote } from '../../entities/rework-note.ts';
import { NotInThisState } from '../../errors.ts';
import type { RequestContext } from '../../http/context.ts';
import { reportAct } from './report-act.ts';

type Input<N extends keyof typeof contracts> = ParsedInput<Extract<(typeof contracts)[N], AnyRoute>>;

/** The step must be about the note the person looked at, and not one that came since. */
function sameNote(note: ReworkNote | null, noteId: string): ReworkNote {
  if (note?.id !== noteId)
    throw new NotInThisState('Another answer came since. Read that one first; nothing was changed.');
  return note;
}

/** Agreeing to a rework that shows asks the client in the same act. */
export const agreeToRework = (
  ctx: RequestContext,
  { params, body }: Input<'agreeToRework'>,
): Promise<FitReportDetail> =>
  reportAct(
    ctx,
    { ...params, revision: body.revision, action: 'agree', act: 'agree', words: '' },
    async (uow, report, latest) => {
      const note = sameNote(latest, body.noteId);
      await uow.manager.update(
        ReworkNote,
        { id: note.id },
        { state: 'agreed', ...(note.shows ? { consentState: 'asked', consentAskedAt: ctx.now } : {}) },
      );
      if (note.shows) announceConsent(uow, report.commissionId);
    },
  );

export const askOtherLimits = (
  ctx: RequestContext,
  { params, body }: Input<'askOtherLimits'>,
): Promise<FitReportDetail> =>
  reportAct(
    ctx,
    { ...params, revision: body.revision, action: 'agree', act: 'ask-other-limits', words: body.words },
    async (uow, report, latest) => {
      const note = sameNote(latest, body.noteId);
      // A question that is off the table is taken back from the client too.
      await uow.manager.update(
        ReworkNote,
        { id: note.id },
        {
          state: 'other-limits-asked',
          ...(note.consentState === 'asked' ? { consentState: null, consentAskedAt: null } : {}),
        },
      );
      announceConsent(uow, report.commissionId);
    },
  );

export const startRework = (ctx: RequestContext, { params, body }: Input<'startRework'>): Promise<FitReportDetail> =>
  reportAct(
    ctx,
    { ...params, revision: body.revision, action: 'rework', act: 'start-rework', words: '' },
    async () => {},
  );

export const finishRework = (ctx: RequestContext, { params, body }: Input<'finishRework'>): Promise<FitReportDetail> =>
  reportAct(
    ctx,
    { ...params, revision: body.revision, action: 'rework', act: 'finish-rework', words: body.words },
    async (uow, _report, note) => {
      if (note) await uow.manager.update(ReworkNote, { id: note.id }, { state: 'done' });
    },
  );

export const verifyRework = (ctx: RequestContext, { params, body }: Input<'verifyRework'>): Promise<FitReportDetail> =>
  reportAct(
    ctx,
    {
      ...params,
      revision: body.revision,
      action: 'verify',
      act: body.passed ? 'verify-pass' : 'verify-fail',
      words: body.words,
    },
    async (uow, report) => {
      if (body.passed) await requireFreshReadings(uow, report);
      else report.reopenedCount += 1;
      const { commissionId, jointId } = report;
      uow.announce(
        'joint.changed',
        { commissionId, jointId },
        { to: 'parties', commissionId, partyIds: [report.raisedByPartyId, report.answerPartyId] },
      );
    },
  );

/** A rework is verified by readings taken after it was done, and not by a word. */
async function requireFreshReadings(uow: UnitOfWork, report: FitReport): Promise<void> {
  const done = await uow.manager.findOneOrFail(ReportEvent, {
    where: { reportId: report.id, act: 'finish-rework' },
    order: { at: 'DESC' },
  });
  const fresh = await uow.manager.countBy(Reading, { jointId: report.jointId, takenAt: MoreThan(done.at) });
  if (fresh === 0)
    throw new NotInThisState('Measure the parts afresh first: a rework is verified by readings taken after it.');
}

export const withdrawFitReport = (
  ctx: RequestContext,
  { params, body }: Input<'withdrawFitReport'>,
): Promise<FitReportDetail> =>
  reportAct(
    ctx,
    { ...params, revision: body.revision, action: 'withdraw', act: 'withdraw', words: body.words },
    async (uow, report, note) => {
      if (note?.consentState === 'asked') {
        await uow.manager.update(ReworkNote, { id: note.id }, { consentState: null, consentAskedAt: null });
        announceConsent(uow, report.commissionId);
      }
    },
  );

const announceConsent = (uow: UnitOfWork, commissionId: string): void =>
  uow.announce('consent.changed', { commissionId }, { to: 'everyone', commissionId });
