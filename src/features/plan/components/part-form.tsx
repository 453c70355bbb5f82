import { createPart, updatePart, type PartView } from '../../../../shared/contracts/parts-and-legs.ts';
import type { PartKind } from '../../../../shared/contracts/vocabulary.ts';
import { EditFormFoot } from '../../../components/edit-form-foot.tsx';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { useEditForm } from '../../../hooks/use-edit-form.ts';
import { keys } from '../../../lib/query-keys.ts';
import { PART_KIND_WORDS } from '../../../lib/words.ts';
import { holdersAmong, nameIn, PartyOptions, shopsAmong, WordOptions, type PlanChoices } from './choices.tsx';

type PartValues = Record<'name' | 'kind' | 'holderPartyId', string>;

const bodyOf = ({ name, kind, holderPartyId }: PartValues) => ({ name, kind: kind as PartKind, holderPartyId });
const staleAfter = (commissionId: string) => [
  keys.parts.list(commissionId),
  keys.standing.detail(commissionId),
  keys.history.list(commissionId),
];

function PartFields({
  form: { values, set, errorAt },
  parties,
}: {
  form: {
    values: PartValues;
    set: (name: keyof PartValues, value: string) => void;
    errorAt: (pointer: string) => string | undefined;
  };
  parties: PlanChoices['parties'];
}) {
  return (
    <>
      <Field label="Name" error={errorAt('name')}>
        <TextInput value={values.name} onChange={(event) => set('name', event.target.value)} />
      </Field>
      <Field label="Kind" error={errorAt('kind')}>
        <Select value={values.kind} onChange={(event) => set('kind', event.target.value)}>
          <WordOptions words={PART_KIND_WORDS} />
        </Select>
      </Field>
      <Field label="Who holds it now" error={errorAt('holderPartyId')}>
        <Select value={values.holderPartyId} onChange={(event) => set('holderPartyId', event.target.value)}>
          <PartyOptions parties={holdersAmong(parties)} />
        </Select>
      </Field>
    </>
  );
}

export function AddPart({ commissionId, parties }: Pick<PlanChoices, 'commissionId' | 'parties'>) {
  const form = useContractForm(createPart, {
    name: `part-${commissionId}`,
    initial: { name: '', kind: 'hilt', holderPartyId: shopsAmong(parties)[0]?.id ?? '' },
    toInput: (values) => ({ params: { commissionId }, body: bodyOf(values) }),
    stale: () => staleAfter(commissionId),
  });
  return (
    <FormFrame form={form}>
      <PartFields form={form} parties={parties} />
      <div>
        <Button type="submit" variant="outline" busy={form.act.pending}>
          Add the part
        </Button>
      </div>
      <ProblemNotice problem={form.act.problem} />
    </FormFrame>
  );
}

/** The lead's correction of a part; parts that change hands in the course of the work do so by a handoff. */
export function EditPart({
  commissionId,
  parties,
  part,
}: Pick<PlanChoices, 'commissionId' | 'parties'> & { part: PartView }) {
  const form = useEditForm(updatePart, {
    name: `part-${part.id}`,
    record: part,
    toValues: ({ name, kind, holderPartyId }: PartView): PartValues => ({ name, kind, holderPartyId }),
    toInput: (values, revision) => ({
      params: { commissionId, partId: part.id },
      body: { revision, ...bodyOf(values) },
    }),
    edited: [
      { name: 'name', label: 'Name' },
      { name: 'kind', label: 'Kind', words: (kind) => PART_KIND_WORDS[kind as PartKind] },
      { name: 'holderPartyId', label: 'Holder', words: nameIn(parties) },
    ],
    stale: () => staleAfter(commissionId),
  });
  return (
    <FormFrame form={form}>
      <PartFields form={form} parties={parties} />
      <EditFormFoot form={form} save="Save this part" />
    </FormFrame>
  );
}
