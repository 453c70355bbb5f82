import type { FitReportDetail } from '../../../../shared/contracts/fit-reports.ts';
import { writeClientWords } from '../../../../shared/contracts/fit-reports.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Fold } from '../../../components/ui/fold.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Stamp } from '../../../components/ui/stamp.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useDraft } from '../../../hooks/use-draft.ts';
import { shortInstant } from '../../../lib/today.ts';
import { REPORT_STATE_STAMPS } from '../../../lib/words.ts';
import { staleAfterReport } from './report-acts.tsx';

const ACT_WORDS: Readonly<Record<string, string>> = {
  raise: 'raised it',
  answer: 'answered with a rework note',
  agree: 'agreed to the rework',
  'ask-other-limits': 'asked for another answer',
  'start-rework': 'began the rework',
  'finish-rework': 'finished the rework',
  'verify-pass': 'verified and closed it',
  'verify-fail': 'verified: it does not go together, open again',
  withdraw: 'took it back',
  'consent-given': 'consented as client',
  'consent-refused': 'refused as client',
};

/** What was found, and everything that happened to the report since. */
export function ReportHead({
  detail,
  nameOf,
  legTitle,
}: {
  detail: FitReportDetail;
  nameOf: (partyId: string) => string;
  legTitle: string | null;
}) {
  const { report, events } = detail;
  const stamp = REPORT_STATE_STAMPS[report.state];
  return (
    <Sheet
      title={`Fit report: ${report.title}`}
      note={`raised by ${report.raisedByName} of ${nameOf(report.raisedByPartyId)}, ${shortInstant(report.raisedAt)}; ${nameOf(report.answerPartyId)} answers`}
      stamp={
        <span className="flex flex-wrap gap-2">
          {report.blocking && legTitle && report.state !== 'closed' && report.state !== 'withdrawn' && (
            <Stamp tone="oxide">Holds {legTitle}</Stamp>
          )}
          <Stamp tone={stamp.tone}>{stamp.words}</Stamp>
        </span>
      }
    >
      {report.plainWords && <p className="max-w-words whitespace-pre-line">{report.plainWords}</p>}
      {report.reopenedCount > 0 && (
        <p className="pt-2 text-note text-oxide">
          Opened again {report.reopenedCount === 1 ? 'once' : `${report.reopenedCount} times`} after a verification that
          failed.
        </p>
      )}
      <Fold summary="What happened so far">
        <ol className="grid gap-1 text-note">
          {events.map((event) => (
            <li key={event.id}>
              <span className="text-lead-grey">{shortInstant(event.at)}</span> {event.by}{' '}
              {ACT_WORDS[event.act] ?? event.act}
              {event.words && `: “${event.words}”`}
            </li>
          ))}
        </ol>
      </Fold>
    </Sheet>
  );
}

/** The lead releases the words in which the client reads of this report. */
export function ClientWords({ commissionId, detail }: { commissionId: string; detail: FitReportDetail }) {
  const { report } = detail;
  const [words, setWords, forget] = useDraft(`client-words-${report.id}`, report.clientWords);
  const write = useAct(writeClientWords, {
    said: 'The words are saved.',
    stale: () => staleAfterReport(commissionId, report.id),
    onDone: forget,
  });
  return (
    <Sheet
      title="What the client reads of this"
      note="Until you write something, they read that a part does not yet go together as agreed"
    >
      <form
        className="grid gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          write.run({
            params: { commissionId, reportId: report.id },
            body: { revision: report.revision, clientWords: words },
          });
        }}
      >
        <Field label="In the client's words" hint="For instance: the end cap was too tight">
          <TextInput value={words} required onChange={(event) => setWords(event.target.value)} />
        </Field>
        <div>
          <Button type="submit" variant="outline" busy={write.pending}>
            Release these words
          </Button>
        </div>
        <ProblemNotice problem={write.problem} />
      </form>
    </Sheet>
  );
}
