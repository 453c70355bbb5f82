import { useState } from 'react';
import * as contracts from '../../../../shared/contracts/fit-reports.ts';
import type { FitReportDetail } from '../../../../shared/contracts/fit-reports.ts';
import { mayDo } from '../../../../shared/abilities/ability.ts';
import { openReportActs } from '../../../../shared/engines/reports/report-states.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useDraft } from '../../../hooks/use-draft.ts';
import { useSight } from '../../../hooks/use-membership.ts';
import { keys } from '../../../lib/query-keys.ts';

export const staleAfterReport = (commissionId: string, reportId: string) => [
  keys.fitReports.lists(commissionId),
  keys.fitReports.detail(commissionId, reportId),
  keys.legs.list(commissionId),
  keys.standing.detail(commissionId),
  keys.bench(),
];

interface ActsProps {
  commissionId: string;
  detail: FitReportDetail;
}

/** An act that needs words: the words are kept as a draft until it is done. */
function WordedAct({
  name,
  label,
  button,
  required,
  onSend,
  pending,
}: {
  name: string;
  label: string;
  button: string;
  required: boolean;
  onSend: (words: string, forget: () => void) => void;
  pending: boolean;
}) {
  const [words, setWords, forget] = useDraft(name, '');
  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        onSend(words, forget);
      }}
    >
      <Field label={label} optional={!required}>
        <TextArea
          value={words}
          required={required}
          maxLength={2000}
          onChange={(event) => setWords(event.target.value)}
        />
      </Field>
      <div>
        <Button type="submit" variant="outline" busy={pending}>
          {button}
        </Button>
      </div>
    </form>
  );
}

/** The next steps of a report that are open as it stands, to those whose part it is. */
export function ReportActs({ commissionId, detail }: ActsProps) {
  const { report, notes } = detail;
  const { ability } = useSight(commissionId);
  const [asking, setAsking] = useState(false);
  const params = { commissionId, reportId: report.id };
  const stale = () => staleAfterReport(commissionId, report.id);
  const agree = useAct(contracts.agreeToRework, { stale });
  const ask = useAct(contracts.askOtherLimits, { stale, onDone: () => setAsking(false) });
  const start = useAct(contracts.startRework, { stale });
  const finish = useAct(contracts.finishRework, { stale });
  const verify = useAct(contracts.verifyRework, { stale });
  const withdraw = useAct(contracts.withdrawFitReport, { stale });
  const latest = notes.at(-1);
  const note = latest && latest.state !== 'other-limits-asked' ? latest : null;
  const facts = { commissionId, raisedByPartyId: report.raisedByPartyId, answerPartyId: report.answerPartyId };
  const open = new Set(
    openReportActs({ state: report.state, shows: note?.shows ?? false, consent: note?.consent?.state ?? null }),
  );
  const may = (action: 'agree' | 'rework' | 'verify' | 'withdraw') => mayDo(ability, action, 'FitReport', facts);
  const { revision } = report;
  const problem = [agree, ask, start, finish, verify, withdraw].map((act) => act.problem).find(Boolean) ?? null;
  const waitsForClient = report.state === 'agreed' && note?.shows && note.consent?.state === 'asked';

  return (
    <div className="grid gap-4">
      {open.has('agree') && may('agree') && note && (
        <div className="flex flex-wrap gap-2">
          <Button busy={agree.pending} onClick={() => agree.run({ params, body: { revision, noteId: note.id } })}>
            Agree to this rework
          </Button>
          <Button variant="outline" aria-expanded={asking} onClick={() => setAsking(!asking)}>
            Ask for other limits
          </Button>
        </div>
      )}
      {asking && note && (
        <WordedAct
          name={`other-limits-${report.id}`}
          label="What should be different"
          button="Ask for another answer"
          required
          pending={ask.pending}
          onSend={(words, forget) => {
            ask.run({ params, body: { revision, noteId: note.id, words } });
            forget();
          }}
        />
      )}
      {waitsForClient && (
        <p className="text-note">
          This rework shows, so work waits for the client's consent. The client has been asked.
        </p>
      )}
      {open.has('start-rework') && may('rework') && (
        <div>
          <Button busy={start.pending} onClick={() => start.run({ params, body: { revision } })}>
            Begin the rework
          </Button>
        </div>
      )}
      {open.has('finish-rework') && may('rework') && (
        <WordedAct
          name={`finish-${report.id}`}
          label="What was done"
          button="The rework is done"
          required={false}
          pending={finish.pending}
          onSend={(words, forget) => {
            finish.run({ params, body: { revision, words } });
            forget();
          }}
        />
      )}
      {open.has('verify-pass') && may('verify') && (
        <div className="grid gap-3">
          <p className="text-note">Measure the parts afresh below, then say whether they go together as agreed.</p>
          <div className="flex flex-wrap gap-2">
            <Button
              busy={verify.pending}
              onClick={() => verify.run({ params, body: { revision, passed: true, words: '' } })}
            >
              It goes together: close the report
            </Button>
            <Button
              variant="outline"
              busy={verify.pending}
              onClick={() => verify.run({ params, body: { revision, passed: false, words: '' } })}
            >
              It does not: open it again
            </Button>
          </div>
        </div>
      )}
      {open.has('withdraw') && may('withdraw') && (
        <details>
          <summary className="min-h-thumb cursor-pointer py-2 text-note">Take this report back</summary>
          <WordedAct
            name={`withdraw-${report.id}`}
            label="Why it is taken back"
            button="Take the report back"
            required
            pending={withdraw.pending}
            onSend={(words, forget) => {
              withdraw.run({ params, body: { revision, words } });
              forget();
            }}
          />
        </details>
      )}
      <ProblemNotice problem={problem} />
    </div>
  );
}
