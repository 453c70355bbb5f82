import { useState } from 'react';
import { answerFitReport, type FitReportDetail } from '../../../../shared/contracts/fit-reports.ts';
import type { Currency, JointSide } from '../../../../shared/contracts/vocabulary.ts';
import { parseLength } from '../../../../shared/units/length.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Caution } from '../../../components/ui/caution.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useDraft } from '../../../hooks/use-draft.ts';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { staleAfterReport } from './report-acts.tsx';

export interface AnswerFormProps {
  commissionId: string;
  detail: FitReportDetail;
  sideNames: { hole: string; shaft: string };
  /** What the engine says has to come off, as a start. */
  suggestedUm: number | null;
  suggestedOverMm: number | null;
  currency: Currency;
  mine: ReadonlySet<string>;
}

const number = (text: string): number => Number(text.trim().replace(',', '.'));

/** The rework note: what will be done, where it shows, at whose cost. Everything typed is kept until it is sent. */
export function AnswerForm({
  commissionId,
  detail,
  sideNames,
  suggestedUm,
  suggestedOverMm,
  currency,
  mine,
}: AnswerFormProps) {
  const { report } = detail;
  const name = `answer-${report.id}`;
  const { parties } = usePartyBook(commissionId);
  const [method, setMethod, forgetMethod] = useDraft(`${name}-method`, '');
  const [remove, setRemove, forgetRemove] = useDraft(
    `${name}-remove`,
    suggestedUm === null ? '' : (suggestedUm / 1000).toFixed(3),
  );
  const [over, setOver] = useState(suggestedOverMm === null ? '' : String(suggestedOverMm));
  const [risk, setRisk, forgetRisk] = useDraft(`${name}-risk`, '');
  const [where, setWhere, forgetWhere] = useDraft(`${name}-where`, '');
  const [side, setSide] = useState<JointSide>('shaft');
  const [shows, setShows] = useState(where !== '');
  const [cost, setCost] = useState('0');
  const [bearer, setBearer] = useState(parties.find((party) => mine.has(party.id))?.id ?? '');
  const [days, setDays] = useState('0');
  const answer = useAct(answerFitReport, {
    stale: () => staleAfterReport(commissionId, report.id),
    onDone: () => [forgetMethod, forgetRemove, forgetRisk, forgetWhere].forEach((forget) => forget()),
  });
  const removal = remove.trim() === '0' ? { ok: true as const, valueMm: 0 } : parseLength(remove);
  const errorAt = (pointer: string): string | undefined =>
    answer.problem?.problem.errors?.find((error) => error.pointer === `/body/${pointer}`)?.message;

  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        if (!removal.ok) return;
        answer.run({
          params: { commissionId, reportId: report.id },
          body: {
            revision: report.revision,
            method,
            cutSide: side,
            removeOnDiameterUm: Math.round(removal.valueMm * 1e6) / 1e3,
            overLengthMm: over.trim() === '' ? null : number(over),
            risk,
            shows,
            whereItShows: shows ? where : '',
            costMinor: Math.round(number(cost) * 100),
            currency,
            costBorneByPartyId: bearer || null,
            effectDays: number(days),
          },
        });
      }}
    >
      <Field label="What will be done" required error={errorAt('method')}>
        <TextArea value={method} required maxLength={4000} onChange={(event) => setMethod(event.target.value)} />
      </Field>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Which part is cut">
          <Select value={side} onChange={(event) => setSide(event.target.value as JointSide)}>
            <option value="shaft">{sideNames.shaft}</option>
            <option value="hole">{sideNames.hole}</option>
          </Select>
        </Field>
        <Field
          label="Off the diameter"
          hint="In mm, or with its unit, as 0.118 or 0.0046 in"
          error={remove !== '' && !removal.ok ? removal.message : errorAt('removeOnDiameterUm')}
        >
          <TextInput value={remove} required onChange={(event) => setRemove(event.target.value)} />
        </Field>
        <Field label="Over a length of, mm" optional error={errorAt('overLengthMm')}>
          <TextInput inputMode="decimal" value={over} onChange={(event) => setOver(event.target.value)} />
        </Field>
      </div>
      <Field label="What could go wrong" optional>
        <TextArea value={risk} maxLength={2000} onChange={(event) => setRisk(event.target.value)} />
      </Field>
      <Checkbox
        label="It will show when the joint is closed"
        hint="Then the client is asked before work may start"
        checked={shows}
        onChange={(event) => setShows(event.target.checked)}
      />
      {shows && (
        <Field label="Where it will show, in words for the client" required error={errorAt('whereItShows')}>
          <TextInput value={where} required maxLength={500} onChange={(event) => setWhere(event.target.value)} />
        </Field>
      )}
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label={`Cost, ${currency}`} error={errorAt('costMinor')}>
          <TextInput inputMode="decimal" value={cost} onChange={(event) => setCost(event.target.value)} />
        </Field>
        <Field label="Borne by">
          <Select value={bearer} onChange={(event) => setBearer(event.target.value)}>
            <option value="">Not settled</option>
            {parties
              .filter((party) => !party.roles.includes('guest'))
              .map((party) => (
                <option key={party.id} value={party.id}>
                  {party.displayName}
                </option>
              ))}
          </Select>
        </Field>
        <Field label="Working days it takes" error={errorAt('effectDays')}>
          <TextInput inputMode="decimal" value={days} onChange={(event) => setDays(event.target.value)} />
        </Field>
      </div>
      <Caution>
        Turning and drilling thin or wooden work: support it, keep hands and sleeves clear, catch the dust, follow the
        machine maker's instructions and your local rules.
      </Caution>
      <div>
        <Button type="submit" busy={answer.pending}>
          Answer with this rework note
        </Button>
      </div>
      <ProblemNotice problem={answer.problem} />
    </form>
  );
}
