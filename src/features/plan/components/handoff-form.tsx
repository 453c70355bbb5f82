import { createHandoff } from '../../../../shared/contracts/handoffs.ts';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { figureFrom } from '../../../lib/figures.ts';
import { keys } from '../../../lib/query-keys.ts';
import { holdersAmong, PartyOptions, toggled, type PlanChoices } from './choices.tsx';

/** @param mine parties in whose name the reader acts: one of them is on one side at first */
export function AddHandoff({ commissionId, parties, parts, legs, mine }: PlanChoices & { mine: ReadonlySet<string> }) {
  const sides = holdersAmong(parties);
  const own = sides.find((side) => mine.has(side.id)) ?? sides[0];
  const form = useContractForm(createHandoff, {
    name: `handoff-${commissionId}`,
    initial: {
      from: own?.id ?? '',
      to: sides.find((side) => side.id !== own?.id)?.id ?? '',
      parts: [] as readonly string[],
      fromLeg: '',
      toLeg: '',
      transit: '2',
      carriage: '',
    },
    toInput: (values) => ({
      params: { commissionId },
      body: {
        fromPartyId: values.from,
        toPartyId: values.to,
        partIds: [...values.parts],
        fromLegId: values.fromLeg || null,
        toLegId: values.toLeg || null,
        transitDays: figureFrom(values.transit),
        carriage: values.carriage,
      },
    }),
    stale: () => [keys.handoffs.lists(commissionId), keys.standing.detail(commissionId), keys.bench()],
  });
  const { values, set, errorAt } = form;
  const legOptions = (partyId: string) =>
    legs
      .filter((leg) => leg.partyId === partyId && leg.state !== 'dropped')
      .map((leg) => (
        <option key={leg.id} value={leg.id}>
          {leg.title}
        </option>
      ));
  return (
    <FormFrame form={form}>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field label="From" error={errorAt('fromPartyId')}>
          <Select value={values.from} onChange={(event) => form.patch({ from: event.target.value, fromLeg: '' })}>
            <PartyOptions parties={sides} />
          </Select>
        </Field>
        <Field label="To" error={errorAt('toPartyId')}>
          <Select value={values.to} onChange={(event) => form.patch({ to: event.target.value, toLeg: '' })}>
            <PartyOptions parties={sides} />
          </Select>
        </Field>
        <Field label="After the leg" optional error={errorAt('fromLegId')}>
          <Select value={values.fromLeg} onChange={(event) => set('fromLeg', event.target.value)}>
            <option value="">none</option>
            {legOptions(values.from)}
          </Select>
        </Field>
        <Field label="Before the leg" optional error={errorAt('toLegId')}>
          <Select value={values.toLeg} onChange={(event) => set('toLeg', event.target.value)}>
            <option value="">none</option>
            {legOptions(values.to)}
          </Select>
        </Field>
      </div>
      <fieldset className="grid gap-2">
        <legend className="font-semibold">Parts</legend>
        {parts.map((part) => (
          <Checkbox
            key={part.id}
            label={part.name}
            checked={values.parts.includes(part.id)}
            onChange={(event) => set('parts', toggled(values.parts, part.id, event.target.checked))}
          />
        ))}
        {errorAt('partIds') && <p className="text-note text-oxide">{errorAt('partIds')}</p>}
      </fieldset>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field label="Working days on the way" error={errorAt('transitDays')}>
          <TextInput
            inputMode="decimal"
            value={values.transit}
            onChange={(event) => set('transit', event.target.value)}
          />
        </Field>
        <Field label="How it travels" optional>
          <TextInput value={values.carriage} onChange={(event) => set('carriage', event.target.value)} />
        </Field>
      </div>
      <div>
        <Button type="submit" variant="outline" busy={form.act.pending}>
          Plan the handoff
        </Button>
      </div>
      <ProblemNotice problem={form.act.problem} />
    </FormFrame>
  );
}
