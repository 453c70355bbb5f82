import { useState } from 'react';
import { createCommission, updateCommission, type CommissionView } from '../../../../shared/contracts/commissions.ts';
import {
  COMMISSION_STATES,
  CURRENCIES,
  type CommissionState,
  type Currency,
} from '../../../../shared/contracts/vocabulary.ts';
import { MINOR_DIGITS } from '../../../../shared/units/money.ts';
import { ConflictSheet } from '../../../components/conflict-sheet.tsx';
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
import { COMMISSION_STATE_WORDS, ROLE_WORDS } from '../../../lib/words.ts';

interface BriefValues extends Record<string, string> {
  title: string;
  brief: string;
  dateWanted: string;
  budget: string;
  currency: string;
}

const toMinor = (text: string, currency: string): number | null =>
  text.trim() === ''
    ? null
    : Math.round(Number(text.trim().replace(',', '.')) * 10 ** (MINOR_DIGITS[currency as Currency] ?? 2));

const toMajor = (amountMinor: number | null | undefined, currency: string): string =>
  amountMinor === null || amountMinor === undefined
    ? ''
    : String(amountMinor / 10 ** (MINOR_DIGITS[currency as Currency] ?? 2));

const briefBody = (values: BriefValues) => ({
  title: values.title,
  brief: values.brief,
  dateWanted: values.dateWanted || null,
  budgetMinor: toMinor(values.budget, values.currency),
  currency: values.currency as Currency,
});

interface BriefFieldsProps {
  values: BriefValues;
  set: <K extends 'title' | 'brief' | 'dateWanted' | 'budget' | 'currency'>(name: K, value: string) => void;
  errorAt: (pointer: string) => string | undefined;
}

function BriefFields({ values, set, errorAt }: BriefFieldsProps) {
  return (
    <>
      <Field label="Name of the piece" required error={errorAt('title')}>
        <TextInput value={values.title} maxLength={120} onChange={(event) => set('title', event.target.value)} />
      </Field>
      <Field
        label="Brief"
        hint="What it is, finish, blade, sound, switch, cell, accents"
        optional
        error={errorAt('brief')}
      >
        <TextArea value={values.brief} maxLength={8000} onChange={(event) => set('brief', event.target.value)} />
      </Field>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Date wanted" optional error={errorAt('dateWanted')}>
          <DateInput value={values.dateWanted} onChange={(event) => set('dateWanted', event.target.value)} />
        </Field>
        <Field label="Budget" optional hint="Seen by you and the client alone" error={errorAt('budgetMinor')}>
          <TextInput
            inputMode="decimal"
            value={values.budget}
            onChange={(event) => set('budget', event.target.value)}
          />
        </Field>
        <Field label="Currency">
          <Select value={values.currency} onChange={(event) => set('currency', event.target.value)}>
            {CURRENCIES.map((currency) => (
              <option key={currency}>{currency}</option>
            ))}
          </Select>
        </Field>
      </div>
    </>
  );
}

export function NewCommissionForm({
  shops,
  onMade,
}: {
  shops: readonly { shopId: string; name: string }[];
  onMade: (commissionId: string) => void;
}) {
  const [leadShopId, setLeadShopId] = useState(shops[0]?.shopId ?? '');
  const [also, setAlso] = useState<readonly ('maker' | 'finisher' | 'installer')[]>([]);
  const form = useContractForm(createCommission, {
    name: 'new-commission',
    initial: { title: '', brief: '', dateWanted: '', budget: '', currency: 'EUR' },
    toInput: (values) => ({ body: { leadShopId, alsoRoles: [...also], ...briefBody(values) } }),
    stale: () => [keys.commissions.lists(), keys.bench()],
    onDone: (made) => onMade(made.id),
  });
  return (
    <form
      className="grid max-w-words gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        form.submit();
      }}
    >
      <Field label="Lead shop" hint="It holds the contract with the client">
        <Select value={leadShopId} onChange={(event) => setLeadShopId(event.target.value)}>
          {shops.map((shop) => (
            <option key={shop.shopId} value={shop.shopId}>
              {shop.name}
            </option>
          ))}
        </Select>
      </Field>
      <fieldset className="grid gap-2">
        <legend className="font-semibold">Your shop is also</legend>
        {(['maker', 'finisher', 'installer'] as const).map((role) => (
          <Checkbox
            key={role}
            label={ROLE_WORDS[role]}
            checked={also.includes(role)}
            onChange={(event) => setAlso(event.target.checked ? [...also, role] : also.filter((one) => one !== role))}
          />
        ))}
      </fieldset>
      <BriefFields values={form.values} set={form.set} errorAt={form.errorAt} />
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" busy={form.act.pending}>
          Open the commission
        </Button>
        {form.isDraft && <span className="text-note text-lead-grey">draft kept</span>}
      </div>
      <ProblemNotice problem={form.act.problem} />
    </form>
  );
}

export function EditCommissionForm({ commission }: { commission: CommissionView }) {
  const currency = commission.currency ?? 'EUR';
  const form = useContractForm(updateCommission, {
    name: `commission-${commission.id}`,
    initial: {
      title: commission.title,
      brief: commission.brief ?? '',
      dateWanted: commission.dateWanted ?? '',
      budget: toMajor(commission.budgetMinor, currency),
      currency,
      state: commission.state,
      // Part of what was typed: a draft knows the revision it began from, over a reload too.
      revision: commission.revision.toString(),
    },
    toInput: (values) => ({
      params: { commissionId: commission.id },
      body: { revision: Number(values.revision), ...briefBody(values), state: values.state },
    }),
    stale: () => [keys.commission(commission.id), keys.commissions.lists()],
  });
  const theirs =
    form.act.problem?.code === 'stale-revision' ? (form.act.problem.problem.current as CommissionView) : null;
  const { values, set } = form;
  return (
    <form
      className="grid max-w-words gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        form.submit();
      }}
    >
      <BriefFields values={values} set={(name, value) => form.patch({ [name]: value })} errorAt={form.errorAt} />
      <Field label="State">
        <Select value={values.state} onChange={(event) => set('state', event.target.value as CommissionState)}>
          {COMMISSION_STATES.map((state) => (
            <option key={state} value={state}>
              {COMMISSION_STATE_WORDS[state]}
            </option>
          ))}
        </Select>
      </Field>
      <div className="flex flex-wrap items-center gap-3">
        <Button type="submit" busy={form.act.pending} disabled={!form.isDraft}>
          Save the changes
        </Button>
        {form.isDraft && (
          <>
            <span className="text-note text-lead-grey">draft kept</span>
            <Button variant="quiet" onClick={form.forget}>
              Leave it as it was
            </Button>
          </>
        )}
      </div>
      {theirs ? (
        <ConflictSheet
          fields={[
            {
              name: 'title',
              label: 'Name',
              mine: values.title,
              theirs: theirs.title,
              same: values.title === theirs.title,
              takeTheirs: () => set('title', theirs.title),
            },
            {
              name: 'brief',
              label: 'Brief',
              mine: values.brief,
              theirs: theirs.brief ?? '',
              same: values.brief === (theirs.brief ?? ''),
              takeTheirs: () => set('brief', theirs.brief ?? ''),
            },
            {
              name: 'dateWanted',
              label: 'Date wanted',
              mine: values.dateWanted || 'none',
              theirs: theirs.dateWanted ?? 'none',
              same: values.dateWanted === (theirs.dateWanted ?? ''),
              takeTheirs: () => set('dateWanted', theirs.dateWanted ?? ''),
            },
            {
              name: 'budget',
              label: 'Budget',
              mine: values.budget || 'none',
              theirs: toMajor(theirs.budgetMinor, currency) || 'none',
              same: values.budget === toMajor(theirs.budgetMinor, currency),
              takeTheirs: () => set('budget', toMajor(theirs.budgetMinor, currency)),
            },
            {
              name: 'state',
              label: 'State',
              mine: values.state,
              theirs: theirs.state,
              same: values.state === theirs.state,
              takeTheirs: () => set('state', theirs.state),
            },
          ]}
          onSaveMine={() => {
            form.patch({ revision: theirs.revision.toString() });
            form.act.run({
              params: { commissionId: commission.id },
              body: { revision: theirs.revision, ...briefBody(values), state: values.state },
            });
          }}
        />
      ) : (
        <ProblemNotice problem={form.act.problem} />
      )}
    </form>
  );
}
