import { createHandoff } from '../../../../shared/contracts/handoffs.ts';
import { createJoint } from '../../../../shared/contracts/joints.ts';
import { createLeg, createPart, type LegView, type PartView } from '../../../../shared/contracts/parts-and-legs.ts';
import {
  JOINT_KINDS,
  LEG_KINDS,
  PART_KINDS,
  type JointKind,
  type LegKind,
  type PartKind,
} from '../../../../shared/contracts/vocabulary.ts';
import type { PartyView } from '../../../../shared/contracts/commissions.ts';
import { HAND_FITS } from '../../../../shared/engines/fit/hand-fits.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextArea } from '../../../components/ui/text-area.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { keys } from '../../../lib/query-keys.ts';
import { JOINT_KIND_WORDS, LEG_KIND_WORDS, PART_KIND_WORDS, SIDE_WORDS } from '../../../lib/words.ts';

interface PlanFormProps {
  commissionId: string;
  parties: readonly PartyView[];
  parts: readonly PartView[];
  legs: readonly LegView[];
}

const number = (text: string): number => Number(text.trim().replace(',', '.'));
const numberOrNull = (text: string): number | null => (text.trim() === '' ? null : number(text));
const working = (parties: readonly PartyView[]): PartyView[] => parties.filter((party) => party.shopId !== null);
const toggled = (list: readonly string[], item: string, on: boolean): string[] =>
  on ? [...list, item] : list.filter((one) => one !== item);

function PartyOptions({ parties }: { parties: readonly PartyView[] }) {
  return (
    <>
      {parties.map((party) => (
        <option key={party.id} value={party.id}>
          {party.displayName}
        </option>
      ))}
    </>
  );
}

function PartOptions({ parts }: { parts: readonly PartView[] }) {
  return (
    <>
      {parts.map((part) => (
        <option key={part.id} value={part.id}>
          {part.name}
        </option>
      ))}
    </>
  );
}

export function PartForm({ commissionId, parties }: PlanFormProps) {
  const form = useContractForm(createPart, {
    name: `part-${commissionId}`,
    initial: { name: '', kind: 'hilt', holderPartyId: working(parties)[0]?.id ?? '' },
    toInput: (values) => ({
      params: { commissionId },
      body: { name: values.name, kind: values.kind as PartKind, holderPartyId: values.holderPartyId },
    }),
    stale: () => [keys.parts.list(commissionId), keys.standing.detail(commissionId)],
  });
  const { values, set, errorAt } = form;
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        form.submit();
      }}
    >
      <Field label="Name" error={errorAt('name')}>
        <TextInput value={values.name} maxLength={80} onChange={(event) => set('name', event.target.value)} />
      </Field>
      <Field label="Kind">
        <Select value={values.kind} onChange={(event) => set('kind', event.target.value)}>
          {PART_KINDS.map((kind) => (
            <option key={kind} value={kind}>
              {PART_KIND_WORDS[kind]}
            </option>
          ))}
        </Select>
      </Field>
      <Field label="Who holds it now" error={errorAt('holderPartyId')}>
        <Select value={values.holderPartyId} onChange={(event) => set('holderPartyId', event.target.value)}>
          <PartyOptions parties={working(parties)} />
        </Select>
      </Field>
      <div>
        <Button type="submit" variant="outline" busy={form.act.pending}>
          Add the part
        </Button>
      </div>
      <ProblemNotice problem={form.act.problem} />
    </form>
  );
}

export function LegForm({ commissionId, parties, parts, legs }: PlanFormProps) {
  const form = useContractForm(createLeg, {
    name: `leg-${commissionId}`,
    initial: {
      title: '',
      kind: 'machining',
      partyId: working(parties)[0]?.id ?? '',
      partId: parts[0]?.id ?? '',
      hopeful: '3',
      likely: '5',
      bad: '8',
      plannedStartOn: '',
      after: [] as readonly string[],
    },
    toInput: (values) => ({
      params: { commissionId },
      body: {
        title: values.title,
        kind: values.kind as LegKind,
        partyId: values.partyId,
        partId: values.partId,
        hopefulDays: number(values.hopeful),
        likelyDays: number(values.likely),
        badDays: number(values.bad),
        plannedStartOn: values.plannedStartOn || null,
        afterLegIds: [...values.after],
      },
    }),
    stale: () => [keys.legs.list(commissionId), keys.standing.detail(commissionId), keys.bench()],
  });
  const { values, set, errorAt } = form;
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        form.submit();
      }}
    >
      <Field label="Work" hint="For instance: turn and hollow the hilt" error={errorAt('title')}>
        <TextInput value={values.title} maxLength={80} onChange={(event) => set('title', event.target.value)} />
      </Field>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Kind">
          <Select value={values.kind} onChange={(event) => set('kind', event.target.value)}>
            {LEG_KINDS.map((kind) => (
              <option key={kind} value={kind}>
                {LEG_KIND_WORDS[kind]}
              </option>
            ))}
          </Select>
        </Field>
        <Field label="Shop" error={errorAt('partyId')}>
          <Select value={values.partyId} onChange={(event) => set('partyId', event.target.value)}>
            <PartyOptions parties={working(parties)} />
          </Select>
        </Field>
        <Field label="Part" error={errorAt('partId')}>
          <Select value={values.partId} onChange={(event) => set('partId', event.target.value)}>
            <PartOptions parts={parts} />
          </Select>
        </Field>
      </div>
      <div className="grid gap-4 sm:grid-cols-4">
        <Field label="Hopeful, days" error={errorAt('hopefulDays')}>
          <TextInput
            inputMode="decimal"
            value={values.hopeful}
            onChange={(event) => set('hopeful', event.target.value)}
          />
        </Field>
        <Field label="Likely, days" error={errorAt('likelyDays')}>
          <TextInput
            inputMode="decimal"
            value={values.likely}
            onChange={(event) => set('likely', event.target.value)}
          />
        </Field>
        <Field label="Bad, days" error={errorAt('badDays')}>
          <TextInput inputMode="decimal" value={values.bad} onChange={(event) => set('bad', event.target.value)} />
        </Field>
        <Field label="Not before" optional>
          <DateInput value={values.plannedStartOn} onChange={(event) => set('plannedStartOn', event.target.value)} />
        </Field>
      </div>
      {legs.length > 0 && (
        <fieldset className="grid gap-2">
          <legend className="font-semibold">Waits for</legend>
          {legs
            .filter((leg) => leg.state !== 'dropped')
            .map((leg) => (
              <Checkbox
                key={leg.id}
                label={leg.title}
                checked={values.after.includes(leg.id)}
                onChange={(event) => set('after', toggled(values.after, leg.id, event.target.checked))}
              />
            ))}
          {errorAt('afterLegIds') && <p className="text-note text-oxide">{errorAt('afterLegIds')}</p>}
        </fieldset>
      )}
      <div>
        <Button type="submit" variant="outline" busy={form.act.pending} disabled={parts.length === 0}>
          Add the leg
        </Button>
      </div>
      {parts.length === 0 && <p className="text-note text-lead-grey">Add a part first: a leg is work on a part.</p>}
      <ProblemNotice problem={form.act.problem} />
    </form>
  );
}

export function JointForm({ commissionId, parties, parts }: PlanFormProps) {
  const shops = working(parties);
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
    toInput: (values) => ({
      params: { commissionId },
      body: {
        name: values.name,
        kind: values.kind as JointKind,
        holePartId: values.holePartId,
        shaftPartId: values.shaftPartId,
        holePartyId: values.holePartyId,
        shaftPartyId: values.shaftPartyId,
        nominalMm: number(values.nominal),
        clearanceMinUm: number(values.min),
        clearanceMaxUm: number(values.max),
        holeClass: values.holeClass.trim() || null,
        shaftClass: values.shaftClass.trim() || null,
        handFit: values.handFit || null,
        engagementMm: numberOrNull(values.engagement),
        hiddenLengthMm: numberOrNull(values.hidden),
        note: values.note,
      },
    }),
    stale: () => [keys.joints.lists(commissionId)],
  });
  const { values, set, errorAt } = form;
  const names = SIDE_WORDS[values.kind as JointKind];
  const chooseFit = (name: string): void => {
    const fit = HAND_FITS.find((one) => one.name === name);
    form.patch({ handFit: name, ...(fit ? { min: String(fit.clearanceMinUm), max: String(fit.clearanceMaxUm) } : {}) });
  };
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        form.submit();
      }}
    >
      <Field label="Name" hint="For instance: pommel spigot in hilt bore" error={errorAt('name')}>
        <TextInput value={values.name} maxLength={120} onChange={(event) => set('name', event.target.value)} />
      </Field>
      <Field label="Kind">
        <Select value={values.kind} onChange={(event) => set('kind', event.target.value)}>
          {JOINT_KINDS.map((kind) => (
            <option key={kind} value={kind}>
              {JOINT_KIND_WORDS[kind]}
            </option>
          ))}
        </Select>
      </Field>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field label={`The ${names.hole} is in`} error={errorAt('holePartId')}>
          <Select value={values.holePartId} onChange={(event) => set('holePartId', event.target.value)}>
            <PartOptions parts={parts} />
          </Select>
        </Field>
        <Field label="and this shop answers for it" error={errorAt('holePartyId')}>
          <Select value={values.holePartyId} onChange={(event) => set('holePartyId', event.target.value)}>
            <PartyOptions parties={shops} />
          </Select>
        </Field>
        <Field label={`The ${names.shaft} is on`} error={errorAt('shaftPartId')}>
          <Select value={values.shaftPartId} onChange={(event) => set('shaftPartId', event.target.value)}>
            <PartOptions parts={parts} />
          </Select>
        </Field>
        <Field label="and this shop answers for it" error={errorAt('shaftPartyId')}>
          <Select value={values.shaftPartyId} onChange={(event) => set('shaftPartyId', event.target.value)}>
            <PartyOptions parties={shops} />
          </Select>
        </Field>
      </div>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Nominal diameter, mm" error={errorAt('nominalMm')}>
          <TextInput
            inputMode="decimal"
            value={values.nominal}
            onChange={(event) => set('nominal', event.target.value)}
          />
        </Field>
        <Field label="ISO class of the outer part" optional error={errorAt('holeClass')}>
          <TextInput
            value={values.holeClass}
            placeholder="H8"
            onChange={(event) => set('holeClass', event.target.value)}
          />
        </Field>
        <Field label="ISO class of the inner part" optional error={errorAt('shaftClass')}>
          <TextInput
            value={values.shaftClass}
            placeholder="f7"
            onChange={(event) => set('shaftClass', event.target.value)}
          />
        </Field>
        <Field label="Hand fit" hint="Ranges are common practice; change them below">
          <Select value={values.handFit} onChange={(event) => chooseFit(event.target.value)}>
            <option value="">By limits alone</option>
            {HAND_FITS.map((fit) => (
              <option key={fit.name} value={fit.name}>
                {fit.name}
              </option>
            ))}
          </Select>
        </Field>
        <Field label="Least clearance, µm" error={errorAt('clearanceMinUm')}>
          <TextInput inputMode="decimal" value={values.min} onChange={(event) => set('min', event.target.value)} />
        </Field>
        <Field label="Greatest clearance, µm" error={errorAt('clearanceMaxUm')}>
          <TextInput inputMode="decimal" value={values.max} onChange={(event) => set('max', event.target.value)} />
        </Field>
        <Field label="Engagement, mm" optional error={errorAt('engagementMm')}>
          <TextInput
            inputMode="decimal"
            value={values.engagement}
            onChange={(event) => set('engagement', event.target.value)}
          />
        </Field>
        <Field label="of which hidden, mm" optional error={errorAt('hiddenLengthMm')}>
          <TextInput
            inputMode="decimal"
            value={values.hidden}
            onChange={(event) => set('hidden', event.target.value)}
          />
        </Field>
      </div>
      <Field label="What was agreed besides" optional>
        <TextArea value={values.note} maxLength={2000} onChange={(event) => set('note', event.target.value)} />
      </Field>
      <div>
        <Button type="submit" variant="outline" busy={form.act.pending} disabled={parts.length < 2}>
          Add the joint
        </Button>
      </div>
      {parts.length < 2 && <p className="text-note text-lead-grey">A joint is between two parts; add them first.</p>}
      <ProblemNotice problem={form.act.problem} />
    </form>
  );
}

export function HandoffForm({ commissionId, parties, parts, legs }: PlanFormProps) {
  const sides = parties.filter((party) => !party.roles.includes('guest'));
  const form = useContractForm(createHandoff, {
    name: `handoff-${commissionId}`,
    initial: {
      from: sides[0]?.id ?? '',
      to: sides[1]?.id ?? '',
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
        transitDays: number(values.transit),
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
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        form.submit();
      }}
    >
      <div className="grid gap-4 sm:grid-cols-2">
        <Field label="From">
          <Select value={values.from} onChange={(event) => set('from', event.target.value)}>
            <PartyOptions parties={sides} />
          </Select>
        </Field>
        <Field label="To" error={errorAt('toPartyId')}>
          <Select value={values.to} onChange={(event) => set('to', event.target.value)}>
            <PartyOptions parties={sides} />
          </Select>
        </Field>
        <Field label="After the leg" optional>
          <Select value={values.fromLeg} onChange={(event) => set('fromLeg', event.target.value)}>
            <option value="">none</option>
            {legOptions(values.from)}
          </Select>
        </Field>
        <Field label="Before the leg" optional>
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
          <TextInput
            value={values.carriage}
            maxLength={120}
            onChange={(event) => set('carriage', event.target.value)}
          />
        </Field>
      </div>
      <div>
        <Button type="submit" variant="outline" busy={form.act.pending}>
          Plan the handoff
        </Button>
      </div>
      <ProblemNotice problem={form.act.problem} />
    </form>
  );
}
