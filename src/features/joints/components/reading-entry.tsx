import { useRef } from 'react';
import { addReadings } from '../../../../shared/contracts/joints.ts';
import type { JointSide, LengthUnit } from '../../../../shared/contracts/vocabulary.ts';
import { formatMm, looksLikeUnitMixUp, parseLength } from '../../../../shared/units/length.ts';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { LengthInput } from '../../../components/ui/length-input.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { figureFrom, optionalFigureFrom } from '../../../lib/figures.ts';
import { keys } from '../../../lib/query-keys.ts';

export interface ReadingEntryProps {
  commissionId: string;
  jointId: string;
  nominalMm: number;
  sideNames: { hole: string; shaft: string };
  preferredUnit: LengthUnit;
  reportId: string | null;
  /** The one side that the reader's own shop answers for; null where it is both or neither. */
  ownSide: JointSide | null;
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

/** What a value in inches is in millimetres, so that a slip of the unit is seen at once. */
function readAs(text: string, unit: LengthUnit): string | undefined {
  const read = parseLength(text, unit);
  return read.ok && read.unit !== 'mm' ? `= ${formatMm(read.valueMm)}` : undefined;
}

const filledOf = (texts: readonly string[]): string[] => texts.map((text) => text.trim()).filter((text) => text !== '');

type ReadingValues = Record<'side' | 'unit' | 'resolution' | 'gauge' | 'temperature' | 'humidity', string> & {
  texts: readonly string[];
};

const EMPTY_FIELDS: readonly string[] = Array.from({ length: FIELDS_AT_FIRST }, () => '');

/** The values of a pasted column, or of a line that a caliper sent. */
const columnOf = (pasted: string): string[] =>
  pasted
    .split(/[\r\n\t;]+/)
    .map((line) => line.trim())
    .filter(Boolean);

/**
 * Readings of one side, typed or sent by a caliper that types like a keyboard: value, Enter, next field. A column pasted
 * into a field fills the fields below it. All of it is kept as a draft until it is saved.
 */
export function ReadingEntry({
  commissionId,
  jointId,
  nominalMm,
  sideNames,
  preferredUnit,
  reportId,
  ownSide,
  onDone,
}: ReadingEntryProps) {
  const form = useContractForm<typeof addReadings, ReadingValues>(addReadings, {
    name: `readings-${jointId}`,
    initial: {
      // Readings stay with the side they were saved to, so nothing but the reader's own side is taken for granted.
      side: ownSide ?? '',
      unit: preferredUnit,
      resolution: '10',
      gauge: '',
      temperature: '',
      humidity: '',
      texts: EMPTY_FIELDS,
    },
    toInput: (values) => ({
      params: { commissionId, jointId },
      body: {
        side: values.side as JointSide,
        reportId,
        resolutionUm: figureFrom(values.resolution),
        gauge: values.gauge.trim() || null,
        temperatureC: optionalFigureFrom(values.temperature),
        humidityPct: optionalFigureFrom(values.humidity),
        readings: filledOf(values.texts).map((text) => ({ text, unit: values.unit as LengthUnit })),
      },
    }),
    stale: () => [keys.joints.detail(commissionId, jointId)],
    said: 'The readings are saved.',
    ...(onDone ? { onDone } : {}),
  });
  const { values, set, errorAt, act } = form;
  const { side, resolution, gauge, temperature, humidity, texts } = values;
  const unit = values.unit as LengthUnit;
  const list = useRef<HTMLOListElement>(null);
  const filled = filledOf(texts);
  const inTrouble = texts.some((text) => troubleWith(text, unit, nominalMm));
  const setText = (index: number, value: string): void => set('texts', texts.with(index, value));
  const paste = (index: number, column: readonly string[]): void =>
    set('texts', [...texts.slice(0, index), ...column, ...texts.slice(index + column.length)]);
  const addField = (): void => {
    set('texts', [...texts, '']);
    requestAnimationFrame(() => list.current?.querySelector<HTMLInputElement>('li:last-child input')?.focus());
  };

  return (
    <FormFrame form={form}>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Which part" error={errorAt('side')}>
          <Select value={side} onChange={(event) => set('side', event.target.value)}>
            <option value="" disabled>
              Choose
            </option>
            <option value="hole">{sideNames.hole}</option>
            <option value="shaft">{sideNames.shaft}</option>
          </Select>
        </Field>
        <Field label="Unit of bare numbers">
          <Select value={unit} onChange={(event) => set('unit', event.target.value)}>
            <option value="mm">mm</option>
            <option value="inch">decimal inch</option>
            <option value="inch-fraction">inch fraction</option>
          </Select>
        </Field>
        <Field
          label="Smallest step of the gauge, µm"
          hint="10 for a digital caliper, 1 for a micrometer"
          error={errorAt('resolutionUm')}
        >
          <TextInput
            inputMode="decimal"
            value={resolution}
            onChange={(event) => set('resolution', event.target.value)}
            required
          />
        </Field>
      </div>
      <ol
        ref={list}
        className="grid gap-3 sm:grid-cols-2"
        aria-label={side === '' ? 'Readings' : `Readings of the ${sideNames[side as JointSide]}`}
      >
        {texts.map((text, index) => (
          // Fields have no identity but their place: readings are a column of figures.
          <li key={index}>
            <Field label={`Reading ${index + 1}`} hint={readAs(text, unit)} error={troubleWith(text, unit, nominalMm)}>
              <LengthInput
                value={text}
                unit={unit === 'mm' ? 'mm' : 'in'}
                onChange={(event) => setText(index, event.target.value)}
                onPaste={(event) => {
                  const column = columnOf(event.clipboardData.getData('text'));
                  if (column.length < 2) return;
                  event.preventDefault();
                  paste(index, column);
                }}
                onLastEnter={addField}
              />
            </Field>
          </li>
        ))}
      </ol>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Gauge" optional error={errorAt('gauge')}>
          <TextInput value={gauge} onChange={(event) => set('gauge', event.target.value)} />
        </Field>
        <Field label="Temperature, °C" optional error={errorAt('temperatureC')}>
          <TextInput
            inputMode="decimal"
            value={temperature}
            onChange={(event) => set('temperature', event.target.value)}
          />
        </Field>
        <Field label="Humidity, %" optional error={errorAt('humidityPct')}>
          <TextInput inputMode="decimal" value={humidity} onChange={(event) => set('humidity', event.target.value)} />
        </Field>
      </div>
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" busy={act.pending} disabled={filled.length === 0 || inTrouble || side === ''}>
          Save {filled.length === 1 ? '1 reading' : `${filled.length} readings`}
        </Button>
        <Button variant="outline" onClick={addField}>
          One more reading
        </Button>
        {form.isDraft && <span className="text-note text-lead-grey">draft kept</span>}
      </div>
      <ProblemNotice problem={act.problem} />
    </FormFrame>
  );
}
