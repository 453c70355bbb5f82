import { useRef, useState } from 'react';
import { addReadings } from '../../../../shared/contracts/joints.ts';
import type { JointSide, LengthUnit } from '../../../../shared/contracts/vocabulary.ts';
import { formatMm, looksLikeUnitMixUp, parseLength } from '../../../../shared/units/length.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { LengthInput } from '../../../components/ui/length-input.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useDraft } from '../../../hooks/use-draft.ts';
import { figureFrom, optionalFigureFrom } from '../../../lib/figures.ts';
import { keys } from '../../../lib/query-keys.ts';

export interface ReadingEntryProps {
  commissionId: string;
  jointId: string;
  nominalMm: number;
  sideNames: { hole: string; shaft: string };
  preferredUnit: LengthUnit;
  reportId: string | null;
  onDone?: () => void;
}

const FIELDS_AT_FIRST = 4;

/** What is wrong with one typed reading, or nothing. */
function troubleWith(text: string, unit: LengthUnit, nominalMm: number): string | undefined {
  if (text.trim() === '') return undefined;
  const read = parseLength(text, unit);
  if (!read.ok) return read.message;
  return looksLikeUnitMixUp(read.valueMm, nominalMm)
    ? `${formatMm(read.valueMm)} is far from ${formatMm(nominalMm)}; check the unit`
    : undefined;
}

/**
 * Readings of one side, typed or sent by a caliper that types like a keyboard: value, Enter, next field. A column pasted
 * into a field fills the fields below it. The texts are kept as a draft until they are saved.
 */
export function ReadingEntry({
  commissionId,
  jointId,
  nominalMm,
  sideNames,
  preferredUnit,
  reportId,
  onDone,
}: ReadingEntryProps) {
  const [draft, setDraft, forgetDraft] = useDraft(`readings-${jointId}`, '');
  const [side, setSide] = useState<JointSide>('hole');
  const [unit, setUnit] = useState<LengthUnit>(preferredUnit);
  const [resolution, setResolution] = useState('10');
  const [gauge, setGauge] = useState('');
  const [temperature, setTemperature] = useState('');
  const [humidity, setHumidity] = useState('');
  const list = useRef<HTMLOListElement>(null);
  const typed = draft.split('\n');
  const texts = [...typed, ...Array.from({ length: Math.max(0, FIELDS_AT_FIRST - typed.length) }, () => '')];
  const filled = texts.map((text) => text.trim()).filter((text) => text !== '');
  const inTrouble = texts.some((text) => troubleWith(text, unit, nominalMm));
  const save = useAct(addReadings, {
    stale: () => [keys.joints.detail(commissionId, jointId)],
    onDone: () => {
      forgetDraft();
      onDone?.();
    },
  });
  const setText = (index: number, value: string): void => {
    const lines = value.split(/[\r\n\t;]+/).map((line) => line.trim());
    const next = [...texts];
    if (lines.length > 1) next.splice(index, lines.length, ...lines.filter(Boolean));
    else next[index] = value;
    setDraft(next.join('\n').replace(/\n+$/, ''));
  };
  const addField = (): void => {
    setDraft([...texts, ''].join('\n'));
    requestAnimationFrame(() => list.current?.querySelector<HTMLInputElement>('li:last-child input')?.focus());
  };

  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        save.run({
          params: { commissionId, jointId },
          body: {
            side,
            reportId,
            resolutionUm: figureFrom(resolution),
            gauge: gauge.trim() || null,
            temperatureC: optionalFigureFrom(temperature),
            humidityPct: optionalFigureFrom(humidity),
            readings: filled.map((text) => ({ text, unit })),
          },
        });
      }}
    >
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Which part">
          <Select value={side} onChange={(event) => setSide(event.target.value as JointSide)}>
            <option value="hole">{sideNames.hole}</option>
            <option value="shaft">{sideNames.shaft}</option>
          </Select>
        </Field>
        <Field label="Unit of bare numbers">
          <Select value={unit} onChange={(event) => setUnit(event.target.value as LengthUnit)}>
            <option value="mm">mm</option>
            <option value="inch">decimal inch</option>
            <option value="inch-fraction">inch fraction</option>
          </Select>
        </Field>
        <Field label="Smallest step of the gauge, µm" hint="10 for a digital caliper, 1 for a micrometer">
          <TextInput
            inputMode="decimal"
            value={resolution}
            onChange={(event) => setResolution(event.target.value)}
            required
          />
        </Field>
      </div>
      <ol ref={list} className="grid gap-3 sm:grid-cols-2" aria-label={`Readings of the ${sideNames[side]}`}>
        {texts.map((text, index) => (
          // Fields have no identity but their place: readings are a column of figures.
          <li key={index}>
            <Field label={`Reading ${index + 1}`} error={troubleWith(text, unit, nominalMm)}>
              <LengthInput
                value={text}
                unit={unit === 'mm' ? 'mm' : 'in'}
                onChange={(event) => setText(index, event.target.value)}
                onPaste={(event) => {
                  const pasted = event.clipboardData.getData('text');
                  if (!/[\r\n\t]/.test(pasted)) return;
                  event.preventDefault();
                  setText(index, pasted);
                }}
                onLastEnter={addField}
              />
            </Field>
          </li>
        ))}
      </ol>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Gauge" optional>
          <TextInput value={gauge} maxLength={60} onChange={(event) => setGauge(event.target.value)} />
        </Field>
        <Field label="Temperature, °C" optional>
          <TextInput inputMode="decimal" value={temperature} onChange={(event) => setTemperature(event.target.value)} />
        </Field>
        <Field label="Humidity, %" optional>
          <TextInput inputMode="decimal" value={humidity} onChange={(event) => setHumidity(event.target.value)} />
        </Field>
      </div>
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" busy={save.pending} disabled={filled.length === 0 || inTrouble}>
          Save {filled.length === 1 ? '1 reading' : `${filled.length} readings`}
        </Button>
        <Button variant="outline" onClick={addField}>
          One more reading
        </Button>
        {draft !== '' && <span className="text-note text-lead-grey">draft kept</span>}
      </div>
      <ProblemNotice problem={save.problem} />
    </form>
  );
}
