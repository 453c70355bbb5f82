import { createLeg, updateLeg, type LegView } from '../../../../shared/contracts/parts-and-legs.ts';
import type { LegKind } from '../../../../shared/contracts/vocabulary.ts';
import { EditFormFoot } from '../../../components/edit-form-foot.tsx';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { useEditForm, type EditedValue } from '../../../hooks/use-edit-form.ts';
import { figureFrom } from '../../../lib/figures.ts';
import { keys } from '../../../lib/query-keys.ts';
import { LEG_KIND_WORDS } from '../../../lib/words.ts';
import { nameIn, PartOptions, PartyOptions, shopsAmong, toggled, WordOptions, type PlanChoices } from './choices.tsx';

type LegValues = Record<
  'title' | 'kind' | 'partyId' | 'partId' | 'hopeful' | 'likely' | 'bad' | 'plannedStartOn',
  string
> & { after: readonly string[] };

interface LegFieldsProps {
  form: {
    values: LegValues;
    patch: (changes: Partial<LegValues>) => void;
    errorAt: (pointer: string) => string | undefined;
  };
  choices: PlanChoices;
}

const timesOf = (values: Pick<LegValues, 'hopeful' | 'likely' | 'bad' | 'plannedStartOn'>) => ({
  hopefulDays: figureFrom(values.hopeful),
  likelyDays: figureFrom(values.likely),
  badDays: figureFrom(values.bad),
  plannedStartOn: values.plannedStartOn || null,
});
const workOf = (values: LegValues) => ({
  title: values.title,
  kind: values.kind as LegKind,
  partyId: values.partyId,
  partId: values.partId,
  afterLegIds: [...values.after],
});
const staleAfter = (commissionId: string) => [
  keys.legs.list(commissionId),
  keys.standing.detail(commissionId),
  keys.history.list(commissionId),
  keys.bench(),
];

/** What is done to which part by whom, and what it waits for: the lead's to say. */
function WorkFields({ form: { values, patch, errorAt }, choices: { parties, parts, legs } }: LegFieldsProps) {
  return (
    <>
      <Field label="Work" hint="For instance: turn and hollow the hilt" error={errorAt('title')}>
        <TextInput value={values.title} onChange={(event) => patch({ title: event.target.value })} />
      </Field>
      <div className="grid gap-4 @md:grid-cols-3">
        <Field label="Kind" error={errorAt('kind')}>
          <Select value={values.kind} onChange={(event) => patch({ kind: event.target.value })}>
            <WordOptions words={LEG_KIND_WORDS} />
          </Select>
        </Field>
        <Field label="Shop" error={errorAt('partyId')}>
          <Select value={values.partyId} onChange={(event) => patch({ partyId: event.target.value })}>
            <PartyOptions parties={shopsAmong(parties)} />
          </Select>
        </Field>
        <Field label="Part" error={errorAt('partId')}>
          <Select value={values.partId} onChange={(event) => patch({ partId: event.target.value })}>
            <PartOptions parts={parts} />
          </Select>
        </Field>
      </div>
      {legs.length > 0 && (
        <fieldset className="grid gap-2">
          <legend className="font-semibold">Waits for</legend>
          {legs.map((leg) => (
            <Checkbox
              key={leg.id}
              label={leg.title}
              checked={values.after.includes(leg.id)}
              onChange={(event) => patch({ after: toggled(values.after, leg.id, event.target.checked) })}
            />
          ))}
          {errorAt('afterLegIds') && <p className="text-note text-oxide">{errorAt('afterLegIds')}</p>}
        </fieldset>
      )}
    </>
  );
}

/** Three estimates and the first day it may start: the lead's and the leg's own shop's. */
function TimeFields({ form: { values, patch, errorAt } }: Pick<LegFieldsProps, 'form'>) {
  return (
    <div className="grid gap-4 @sm:grid-cols-3">
      <Field label="Hopeful, days" error={errorAt('hopefulDays')}>
        <TextInput
          inputMode="decimal"
          value={values.hopeful}
          onChange={(event) => patch({ hopeful: event.target.value })}
        />
      </Field>
      <Field label="Likely, days" error={errorAt('likelyDays')}>
        <TextInput
          inputMode="decimal"
          value={values.likely}
          onChange={(event) => patch({ likely: event.target.value })}
        />
      </Field>
      <Field label="Bad, days" error={errorAt('badDays')}>
        <TextInput inputMode="decimal" value={values.bad} onChange={(event) => patch({ bad: event.target.value })} />
      </Field>
      <Field className="@sm:col-span-3" label="Not before" optional error={errorAt('plannedStartOn')}>
        <DateInput value={values.plannedStartOn} onChange={(event) => patch({ plannedStartOn: event.target.value })} />
      </Field>
    </div>
  );
}

export function AddLeg(choices: PlanChoices) {
  const { commissionId, parties, parts, legs } = choices;
  const form = useContractForm<typeof createLeg, LegValues>(createLeg, {
    name: `leg-${commissionId}`,
    initial: {
      title: '',
      kind: 'machining',
      partyId: shopsAmong(parties)[0]?.id ?? '',
      partId: parts[0]?.id ?? '',
      hopeful: '3',
      likely: '5',
      bad: '8',
      plannedStartOn: '',
      after: [],
    },
    toInput: (values) => ({ params: { commissionId }, body: { ...workOf(values), ...timesOf(values) } }),
    stale: () => staleAfter(commissionId),
  });
  return (
    <FormFrame form={form}>
      <WorkFields form={form} choices={{ ...choices, legs: legs.filter((leg) => leg.state !== 'dropped') }} />
      <TimeFields form={form} />
      <div>
        <Button type="submit" variant="outline" busy={form.act.pending} disabled={parts.length === 0}>
          Add the leg
        </Button>
      </div>
      {parts.length === 0 && <p className="text-note text-lead-grey">Add a part first: a leg is work on a part.</p>}
      <ProblemNotice problem={form.act.problem} />
    </FormFrame>
  );
}

type EditLegValues = LegValues & { note: string };

/**
 * Changes a leg: the lead everything but the shop's own note, the shop its times and its note.
 * @param isLead the reader leads the commission
 * @param isOwn the leg is the reader's own shop's
 */
export function EditLeg({
  choices,
  leg,
  isLead,
  isOwn,
}: {
  choices: PlanChoices;
  leg: LegView;
  isLead: boolean;
  isOwn: boolean;
}) {
  const { commissionId, parties, parts, legs } = choices;
  const others = legs.filter(
    (one) => one.id !== leg.id && (one.state !== 'dropped' || leg.afterLegIds.includes(one.id)),
  );
  const work: EditedValue<EditLegValues>[] = [
    { name: 'title', label: 'Work' },
    { name: 'kind', label: 'Kind', words: (kind) => LEG_KIND_WORDS[kind as LegKind] },
    { name: 'partyId', label: 'Shop', words: nameIn(parties) },
    { name: 'partId', label: 'Part', words: nameIn(parts) },
    {
      name: 'after',
      label: 'Waits for',
      words: (ids) => (ids as readonly string[]).map(nameIn(legs)).join(', ') || 'none',
    },
  ];
  const form = useEditForm(updateLeg, {
    name: `leg-${leg.id}`,
    record: leg,
    toValues: (record: LegView): EditLegValues => ({
      title: record.title,
      kind: record.kind,
      partyId: record.partyId,
      partId: record.partId,
      hopeful: String(record.hopefulDays ?? ''),
      likely: String(record.likelyDays ?? ''),
      bad: String(record.badDays ?? ''),
      plannedStartOn: record.plannedStartOn ?? '',
      after: record.afterLegIds,
      note: record.privateNote ?? '',
    }),
    toInput: (values, revision) => ({
      params: { commissionId, legId: leg.id },
      body: {
        revision,
        ...timesOf(values),
        ...(isLead ? workOf(values) : {}),
        ...(isOwn ? { privateNote: values.note } : {}),
      },
    }),
    edited: [
      ...(isLead ? work : []),
      { name: 'hopeful', label: 'Hopeful' },
      { name: 'likely', label: 'Likely' },
      { name: 'bad', label: 'Bad' },
      { name: 'plannedStartOn', label: 'Not before' },
      ...(isOwn ? [{ name: 'note' as const, label: 'Own note' }] : []),
    ],
    stale: () => staleAfter(commissionId),
  });
  const { values, set, errorAt } = form;
  return (
    <FormFrame form={form}>
      {isLead && <WorkFields form={form} choices={{ ...choices, legs: others }} />}
      <TimeFields form={form} />
      {isOwn && (
        <Field label="Own note" hint="Seen by your shop alone" optional error={errorAt('privateNote')}>
          <TextArea value={values.note} onChange={(event) => set('note', event.target.value)} />
        </Field>
      )}
      <EditFormFoot form={form} save="Save this leg" />
    </FormFrame>
  );
}
