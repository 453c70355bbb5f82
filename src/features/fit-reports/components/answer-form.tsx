import { answerFitReport, type FitReportDetail } from '../../../../shared/contracts/fit-reports.ts';
import type { Currency, JointSide } from '../../../../shared/contracts/vocabulary.ts';
import { parseLength, type LengthReading } from '../../../../shared/units/length.ts';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Caution } from '../../../components/ui/caution.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { usePartyBook } from '../../../hooks/use-party-names.ts';
import { figureFrom, minorFrom, optionalFigureFrom } from '../../../lib/figures.ts';
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

type AnswerValues = Record<
  'method' | 'side' | 'remove' | 'over' | 'risk' | 'where' | 'cost' | 'bearer' | 'days',
  string
> & { shows: boolean };

/** "0" is an answer too: nothing comes off. */
const removalOf = (text: string): LengthReading =>
  Number(text.replace(',', '.')) === 0 && text.trim() !== '' ? { ok: true, valueMm: 0, unit: 'mm' } : parseLength(text);

const removalUm = (text: string): number => {
  const removal = removalOf(text);
  return removal.ok ? Math.round(removal.valueMm * 1e6) / 1e3 : Number.NaN;
};

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
  const { parties } = usePartyBook(commissionId);
  const form = useContractForm<typeof answerFitReport, AnswerValues>(answerFitReport, {
    name: `answer-${report.id}`,
    initial: {
      method: '',
      side: 'shaft',
      remove: suggestedUm === null ? '' : (suggestedUm / 1000).toFixed(3),
      over: suggestedOverMm === null ? '' : String(suggestedOverMm),
      risk: '',
      shows: false,
      where: '',
      cost: '0',
      bearer: parties.find((party) => mine.has(party.id))?.id ?? '',
      days: '0',
    },
    toInput: (values) => ({
      params: { commissionId, reportId: report.id },
      body: {
        revision: report.revision,
        method: values.method,
        cutSide: values.side as JointSide,
        removeOnDiameterUm: removalUm(values.remove),
        overLengthMm: optionalFigureFrom(values.over),
        risk: values.risk,
        shows: values.shows,
        whereItShows: values.shows ? values.where : '',
        costMinor: minorFrom(values.cost, currency),
        currency,
        costBorneByPartyId: values.bearer || null,
        effectDays: figureFrom(values.days),
      },
    }),
    stale: () => staleAfterReport(commissionId, report.id),
  });
  const { values, set, errorAt, act } = form;
  const { method, side, remove, over, risk, shows, where, cost, bearer, days } = values;
  const removal = removalOf(remove);

  return (
    <FormFrame form={form}>
      <Field label="What will be done" required error={errorAt('method')}>
        <TextArea value={method} required onChange={(event) => set('method', event.target.value)} />
      </Field>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Which part is cut">
          <Select value={side} onChange={(event) => set('side', event.target.value)}>
            <option value="shaft">{sideNames.shaft}</option>
            <option value="hole">{sideNames.hole}</option>
          </Select>
        </Field>
        <Field
          label="Off the diameter"
          hint="In mm, or with its unit, as 0.118 or 0.0046 in"
          error={remove !== '' && !removal.ok ? removal.message : errorAt('removeOnDiameterUm')}
        >
          <TextInput value={remove} required onChange={(event) => set('remove', event.target.value)} />
        </Field>
        <Field label="Over a length of, mm" optional error={errorAt('overLengthMm')}>
          <TextInput inputMode="decimal" value={over} onChange={(event) => set('over', event.target.value)} />
        </Field>
      </div>
      <Field label="What could go wrong" optional>
        <TextArea value={risk} onChange={(event) => set('risk', event.target.value)} />
      </Field>
      <Checkbox
        label="It will show when the joint is closed"
        hint="Then the client is asked before work may start"
        checked={shows}
        onChange={(event) => set('shows', event.target.checked)}
      />
      {shows && (
        <Field label="Where it will show, in words for the client" required error={errorAt('whereItShows')}>
          <TextInput value={where} required onChange={(event) => set('where', event.target.value)} />
        </Field>
      )}
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label={`Cost, ${currency}`} error={errorAt('costMinor')}>
          <TextInput inputMode="decimal" value={cost} onChange={(event) => set('cost', event.target.value)} />
        </Field>
        <Field label="Borne by">
          <Select value={bearer} onChange={(event) => set('bearer', event.target.value)}>
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
          <TextInput inputMode="decimal" value={days} onChange={(event) => set('days', event.target.value)} />
        </Field>
      </div>
      <Caution>
        Turning and drilling thin or wooden work: support it, keep hands and sleeves clear, catch the dust, follow the
        machine maker's instructions and your local rules.
      </Caution>
      <div>
        <Button type="submit" busy={act.pending}>
          Answer with this rework note
        </Button>
        {form.isDraft && <span className="ml-3 text-note text-lead-grey">draft kept</span>}
      </div>
      <ProblemNotice problem={act.problem} />
    </FormFrame>
  );
}
