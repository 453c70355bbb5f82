import { createJoint, updateJoint, type JointView } from '../../../../shared/contracts/joints.ts';
import type { JointKind } from '../../../../shared/contracts/vocabulary.ts';
import { HAND_FITS } from '../../../../shared/engines/fit/hand-fits.ts';
import { EditFormFoot } from '../../../components/edit-form-foot.tsx';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { useEditForm } from '../../../hooks/use-edit-form.ts';
import { figureFrom, optionalFigureFrom } from '../../../lib/figures.ts';
import { keys } from '../../../lib/query-keys.ts';
import { JOINT_KIND_WORDS, SIDE_WORDS } from '../../../lib/words.ts';
import { nameIn, PartOptions, PartyOptions, shopsAmong, WordOptions, type PlanChoices } from './choices.tsx';

type JointValues = Record<
  | 'name'
  | 'kind'
  | 'holePartId'
  | 'shaftPartId'
  | 'holePartyId'
  | 'shaftPartyId'
  | 'nominal'
  | 'handFit'
  | 'min'
  | 'max'
  | 'holeClass'
  | 'shaftClass'
  | 'engagement'
  | 'hidden'
  | 'note',
  string
>;

type JointChoices = Pick<PlanChoices, 'commissionId' | 'parties' | 'parts'>;

const textOf = (figure: number | null): string => (figure === null ? '' : String(figure));

const valuesOf = (joint: JointView): JointValues => ({
  name: joint.name,
  kind: joint.kind,
  holePartId: joint.holePartId,
  shaftPartId: joint.shaftPartId,
  holePartyId: joint.holePartyId,
  shaftPartyId: joint.shaftPartyId,
  nominal: String(joint.nominalMm),
  handFit: joint.handFit ?? '',
  min: String(joint.clearanceMinUm),
  max: String(joint.clearanceMaxUm),
  holeClass: joint.holeClass ?? '',
  shaftClass: joint.shaftClass ?? '',
  engagement: textOf(joint.engagementMm),
  hidden: textOf(joint.hiddenLengthMm),
  note: joint.note,
});

const bodyOf = (values: JointValues) => ({
  name: values.name,
  kind: values.kind as JointKind,
  holePartId: values.holePartId,
  shaftPartId: values.shaftPartId,
  holePartyId: values.holePartyId,
  shaftPartyId: values.shaftPartyId,
  nominalMm: figureFrom(values.nominal),
  clearanceMinUm: figureFrom(values.min),
  clearanceMaxUm: figureFrom(values.max),
  holeClass: values.holeClass.trim() || null,
  shaftClass: values.shaftClass.trim() || null,
  handFit: values.handFit || null,
  engagementMm: optionalFigureFrom(values.engagement),
  hiddenLengthMm: optionalFigureFrom(values.hidden),
  note: values.note,
});

interface JointFieldsProps {
  form: {
    values: JointValues;
    set: (name: keyof JointValues, value: string) => void;
    patch: (changes: Partial<JointValues>) => void;
    errorAt: (pointer: string) => string | undefined;
  };
  choices: JointChoices;
}

/** Which two parts meet, and which shop answers for each side. */
function SideFields({ form: { values, set, errorAt }, choices: { parties, parts } }: JointFieldsProps) {
  const names = SIDE_WORDS[values.kind as JointKind];
  const shops = shopsAmong(parties);
  const side = (part: 'holePartId' | 'shaftPartId', party: 'holePartyId' | 'shaftPartyId', words: string) => (
    <>
      <Field label={words} error={errorAt(part)}>
        <Select value={values[part]} onChange={(event) => set(part, event.target.value)}>
          <PartOptions parts={parts} />
        </Select>
      </Field>
      <Field label="and this shop answers for it" error={errorAt(party)}>
        <Select value={values[party]} onChange={(event) => set(party, event.target.value)}>
          <PartyOptions parties={shops} />
        </Select>
      </Field>
    </>
  );
  return (
    <div className="grid gap-4 @sm:grid-cols-2">
      {side('holePartId', 'holePartyId', `The ${names.hole} is in`)}
      {side('shaftPartId', 'shaftPartyId', `The ${names.shaft} is on`)}
    </div>
  );
}

/** The fit that was agreed: by a hand fit in plain words, by ISO 286 classes, or by limits. */
function FitFields({ form: { values, set, patch, errorAt } }: Pick<JointFieldsProps, 'form'>) {
  const chooseFit = (name: string): void => {
    const fit = HAND_FITS.find((one) => one.name === name);
    patch({ handFit: name, ...(fit ? { min: String(fit.clearanceMinUm), max: String(fit.clearanceMaxUm) } : {}) });
  };
  const text = (
    name: 'nominal' | 'holeClass' | 'shaftClass' | 'min' | 'max' | 'engagement' | 'hidden',
    label: string,
    pointer: string,
    more: { optional?: boolean; placeholder?: string } = {},
  ) => (
    <Field label={label} optional={more.optional ?? false} error={errorAt(pointer)}>
      <TextInput
        inputMode={more.placeholder ? 'text' : 'decimal'}
        placeholder={more.placeholder}
        value={values[name]}
        onChange={(event) => set(name, event.target.value)}
      />
    </Field>
  );
  return (
    <div className="grid gap-4 @sm:grid-cols-2 @lg:grid-cols-3">
      {text('nominal', 'Nominal diameter, mm', 'nominalMm')}
      {text('holeClass', 'ISO class of the outer part', 'holeClass', { optional: true, placeholder: 'H8' })}
      {text('shaftClass', 'ISO class of the inner part', 'shaftClass', { optional: true, placeholder: 'f7' })}
      <Field label="Hand fit" hint="Ranges are common practice; change them below" error={errorAt('handFit')}>
        <Select value={values.handFit} onChange={(event) => chooseFit(event.target.value)}>
          <option value="">By limits alone</option>
          {HAND_FITS.map((fit) => (
            <option key={fit.name} value={fit.name}>
              {fit.name}
            </option>
          ))}
        </Select>
      </Field>
      {text('min', 'Least clearance, µm', 'clearanceMinUm')}
      {text('max', 'Greatest clearance, µm', 'clearanceMaxUm')}
      {text('engagement', 'Engagement, mm', 'engagementMm', { optional: true })}
      {text('hidden', 'of which hidden, mm', 'hiddenLengthMm', { optional: true })}
    </div>
  );
}

function JointFields({ form, choices }: JointFieldsProps) {
  const { values, set, errorAt } = form;
  return (
    <>
      <Field label="Name" hint="For instance: pommel spigot in hilt bore" error={errorAt('name')}>
        <TextInput value={values.name} onChange={(event) => set('name', event.target.value)} />
      </Field>
      <Field label="Kind" error={errorAt('kind')}>
        <Select value={values.kind} onChange={(event) => set('kind', event.target.value)}>
          <WordOptions words={JOINT_KIND_WORDS} />
        </Select>
      </Field>
      <SideFields form={form} choices={choices} />
      <FitFields form={form} />
      <Field label="What was agreed besides" optional error={errorAt('note')}>
        <TextArea value={values.note} onChange={(event) => set('note', event.target.value)} />
      </Field>
    </>
  );
}

export function AddJoint(choices: JointChoices) {
  const { commissionId, parties, parts } = choices;
  const shops = shopsAmong(parties);
  const form = useContractForm(createJoint, {
    name: `joint-${commissionId}`,
    initial: {
      name: '',
      kind: 'spigot-in-bore',
      holePartId: parts[0]?.id ?? '',
      shaftPartId: parts[1]?.id ?? '',
      holePartyId: shops[0]?.id ?? '',
      shaftPartyId: (shops[1] ?? shops[0])?.id ?? '',
      nominal: '',
      handFit: 'hand slip',
      min: '50',
      max: '100',
      holeClass: '',
      shaftClass: '',
      engagement: '',
      hidden: '',
      note: '',
    },
    toInput: (values) => ({ params: { commissionId }, body: bodyOf(values) }),
    stale: () => [keys.joints.lists(commissionId), keys.history.list(commissionId)],
  });
  return (
    <FormFrame form={form}>
      <JointFields form={form} choices={choices} />
      <div>
        <Button type="submit" variant="outline" busy={form.act.pending} disabled={parts.length < 2}>
          Add the joint
        </Button>
      </div>
      {parts.length < 2 && <p className="text-note text-lead-grey">A joint is between two parts; add them first.</p>}
      <ProblemNotice problem={form.act.problem} />
    </FormFrame>
  );
}

/** The lead's change of what a joint is and of the fit that was agreed. */
export function EditJoint({ choices, joint }: { choices: JointChoices; joint: JointView }) {
  const { commissionId, parties, parts } = choices;
  const form = useEditForm(updateJoint, {
    name: `joint-${joint.id}`,
    record: joint,
    toValues: valuesOf,
    toInput: (values, revision) => ({
      params: { commissionId, jointId: joint.id },
      body: { revision, ...bodyOf(values) },
    }),
    edited: [
      { name: 'name', label: 'Name' },
      { name: 'kind', label: 'Kind', words: (kind) => JOINT_KIND_WORDS[kind as JointKind] },
      { name: 'holePartId', label: 'Outer part', words: nameIn(parts) },
      { name: 'holePartyId', label: 'answered for by', words: nameIn(parties) },
      { name: 'shaftPartId', label: 'Inner part', words: nameIn(parts) },
      { name: 'shaftPartyId', label: 'answered for by', words: nameIn(parties) },
      { name: 'nominal', label: 'Nominal, mm' },
      { name: 'holeClass', label: 'Class, outer' },
      { name: 'shaftClass', label: 'Class, inner' },
      { name: 'handFit', label: 'Hand fit' },
      { name: 'min', label: 'Least, µm' },
      { name: 'max', label: 'Greatest, µm' },
      { name: 'engagement', label: 'Engagement, mm' },
      { name: 'hidden', label: 'Hidden, mm' },
      { name: 'note', label: 'Agreed besides' },
    ],
    stale: () => [
      keys.joints.lists(commissionId),
      keys.joints.detail(commissionId, joint.id),
      keys.history.list(commissionId),
    ],
  });
  return (
    <FormFrame form={form}>
      <JointFields form={form} choices={choices} />
      <EditFormFoot form={form} save="Save the joint" />
    </FormFrame>
  );
}
