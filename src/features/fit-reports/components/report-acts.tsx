import type { QueryKey } from '@tanstack/react-query';
import { useState } from 'react';
import * as contracts from '../../../../shared/contracts/fit-reports.ts';
import type { FitReportDetail } from '../../../../shared/contracts/fit-reports.ts';
import type { RouteInput } from '../../../../shared/contracts/route.ts';
import { mayDo } from '../../../../shared/abilities/ability.ts';
import { openReportActs } from '../../../../shared/engines/reports/report-states.ts';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Fold } from '../../../components/ui/fold.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
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

type WordedRoute = typeof contracts.askOtherLimits | typeof contracts.finishRework | typeof contracts.withdrawFitReport;

/** An act that needs words: they are kept as a draft until the act is done. */
function WordedAct<T extends WordedRoute>({
  route,
  name,
  label,
  button,
  said,
  required,
  toInput,
  stale,
  onDone,
}: {
  route: T;
  name: string;
  label: string;
  button: string;
  said: string;
  required: boolean;
  toInput: (words: string) => RouteInput<T>;
  stale: () => readonly QueryKey[];
  onDone?: () => void;
}) {
  const form = useContractForm<T, { words: string }>(route, {
    name,
    initial: { words: '' },
    toInput: ({ words }) => toInput(words),
    stale,
    said,
    ...(onDone ? { onDone } : {}),
  });
  return (
    <FormFrame form={form}>
      <Field label={label} optional={!required} error={form.errorAt('words')}>
        <TextArea
          value={form.values.words}
          required={required}
          onChange={(event) => form.set('words', event.target.value)}
        />
      </Field>
      <div>
        <Button type="submit" variant="outline" busy={form.act.pending}>
          {button}
        </Button>
      </div>
      <ProblemNotice problem={form.act.problem} />
    </FormFrame>
  );
}

/** The next steps of a report that are open as it stands, to those whose part it is. */
export function ReportActs({ commissionId, detail }: ActsProps) {
  const { report, notes } = detail;
  const { ability } = useSight(commissionId);
  const [asking, setAsking] = useState(false);
  const params = { commissionId, reportId: report.id };
  const stale = () => staleAfterReport(commissionId, report.id);
  const agree = useAct(contracts.agreeToRework, { stale, said: 'The rework is agreed.' });
  const start = useAct(contracts.startRework, { stale, said: 'The rework has begun.' });
  const verify = useAct(contracts.verifyRework, { stale, said: 'The verification is kept.' });
  const latest = notes.at(-1);
  const note = latest && latest.state !== 'other-limits-asked' ? latest : null;
  const facts = { commissionId, raisedByPartyId: report.raisedByPartyId, answerPartyId: report.answerPartyId };
  const open = new Set(
    openReportActs({ state: report.state, shows: note?.shows ?? false, consent: note?.consent?.state ?? null }),
  );
  const may = (action: 'agree' | 'rework' | 'verify' | 'withdraw') => mayDo(ability, action, 'FitReport', facts);
  const { revision } = report;
  const problem = [agree, start, verify].map((act) => act.problem).find(Boolean) ?? null;
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
          route={contracts.askOtherLimits}
          name={`other-limits-${report.id}`}
          label="What should be different"
          button="Ask for another answer"
          said="Another answer is asked for."
          required
          toInput={(words) => ({ params, body: { revision, noteId: note.id, words } })}
          stale={stale}
          onDone={() => setAsking(false)}
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
          route={contracts.finishRework}
          name={`finish-${report.id}`}
          label="What was done"
          button="The rework is done"
          said="The rework is marked as done."
          required={false}
          toInput={(words) => ({ params, body: { revision, words } })}
          stale={stale}
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
        <Fold summary="Take this report back">
          <WordedAct
            route={contracts.withdrawFitReport}
            name={`withdraw-${report.id}`}
            label="Why it is taken back"
            button="Take the report back"
            said="The report is taken back."
            required
            toInput={(words) => ({ params, body: { revision, words } })}
            stale={stale}
          />
        </Fold>
      )}
      <ProblemNotice problem={problem} />
    </div>
  );
}
