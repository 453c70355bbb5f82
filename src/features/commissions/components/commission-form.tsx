import { useState } from 'react';
import { createCommission, updateCommission, type CommissionView } from '../../../../shared/contracts/commissions.ts';
import {
  COMMISSION_STATES,
  CURRENCIES,
  type CommissionState,
  type Currency,
} from '../../../../shared/contracts/vocabulary.ts';
import { MINOR_DIGITS } from '../../../../shared/units/money.ts';
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
import { useEditForm } from '../../../hooks/use-edit-form.ts';
import { minorFrom } from '../../../lib/figures.ts';
import { keys } from '../../../lib/query-keys.ts';
import { COMMISSION_STATE_WORDS, ROLE_WORDS } from '../../../lib/words.ts';

interface BriefValues extends Record<string, string> {
  title: string;
  brief: string;
  dateWanted: string;
  budget: string;
  currency: string;
}

const toMajor = (amountMinor: number | null | undefined, currency: string): string =>
  amountMinor === null || amountMinor === undefined
    ? ''
    : String(amountMinor / 10 ** MINOR_DIGITS[currency as Currency]);

const briefBody = (values: BriefValues) => ({
  title: values.title,
  brief: values.brief,
  dateWanted: values.dateWanted || null,
  budgetMinor: values.budget.trim() === '' ? null : minorFrom(values.budget, values.currency as Currency),
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
        <TextInput value={values.title} onChange={(event) => set('title', event.target.value)} />
      </Field>
      <Field
        label="Brief"
        hint="What it is, finish, blade, sound, switch, cell, accents"
        optional
        error={errorAt('brief')}
      >
        <TextArea value={values.brief} onChange={(event) => set('brief', event.target.value)} />
      </Field>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Date wanted" optional error={errorAt('dateWanted')}>
          <DateInput value={values.dateWanted} onChange={(event) => set('dateWanted', event.target.value)} />
        </Field>
        <Field label="Budget, for you and the client" optional error={errorAt('budgetMinor')}>
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
    <FormFrame form={form} className="max-w-words">
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
    </FormFrame>
  );
}

export function EditCommissionForm({ commission }: { commission: CommissionView }) {
  const currencyOf = (record: CommissionView): string => record.currency ?? 'EUR';
  const form = useEditForm(updateCommission, {
    name: `commission-${commission.id}`,
    record: commission,
    toValues: (record: CommissionView): BriefValues & { state: string } => ({
      title: record.title,
      brief: record.brief ?? '',
      dateWanted: record.dateWanted ?? '',
      budget: toMajor(record.budgetMinor, currencyOf(record)),
      currency: currencyOf(record),
      state: record.state,
    }),
    toInput: (values, revision) => ({
      params: { commissionId: commission.id },
      body: { revision, ...briefBody(values), state: values.state as CommissionState },
    }),
    edited: [
      { name: 'title', label: 'Name' },
      { name: 'brief', label: 'Brief' },
      { name: 'dateWanted', label: 'Date wanted' },
      { name: 'budget', label: 'Budget' },
      { name: 'currency', label: 'Currency' },
      { name: 'state', label: 'State', words: (state) => COMMISSION_STATE_WORDS[state as CommissionState] },
    ],
    stale: () => [keys.commission(commission.id), keys.commissions.lists()],
  });
  return (
    <FormFrame form={form} className="max-w-words">
      <BriefFields values={form.values} set={form.set} errorAt={form.errorAt} />
      <Field label="State" error={form.errorAt('state')}>
        <Select value={form.values.state} onChange={(event) => form.set('state', event.target.value)}>
          {COMMISSION_STATES.map((state) => (
            <option key={state} value={state}>
              {COMMISSION_STATE_WORDS[state]}
            </option>
          ))}
        </Select>
      </Field>
      <EditFormFoot form={form} save="Save the changes" />
    </FormFrame>
  );
}
