import { useState } from 'react';
import {
  changePassword,
  signOutEverywhere,
  updateMe,
  type AccountView,
} from '../../../../shared/contracts/accounts.ts';
import type { LengthUnit } from '../../../../shared/contracts/vocabulary.ts';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Notice } from '../../../components/ui/notice.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { keys } from '../../../lib/query-keys.ts';

export function HowYouRead({ me }: { me: AccountView }) {
  const form = useContractForm(updateMe, {
    name: 'me',
    initial: { displayName: me.displayName, preferredUnit: me.preferredUnit, timeZone: me.timeZone },
    toInput: (values) => ({
      body: {
        displayName: values.displayName,
        preferredUnit: values.preferredUnit,
        timeZone: values.timeZone,
      },
    }),
    stale: () => [keys.me()],
  });
  const { values, set, errorAt } = form;
  return (
    <Sheet title="Name and units">
      <FormFrame form={form}>
        <Field label="Name" error={errorAt('displayName')}>
          <TextInput
            value={values.displayName}
            autoComplete="name"
            onChange={(event) => set('displayName', event.target.value)}
          />
        </Field>
        <Field label="Lengths in">
          <Select
            value={values.preferredUnit}
            onChange={(event) => set('preferredUnit', event.target.value as LengthUnit)}
          >
            <option value="mm">millimetres</option>
            <option value="inch">decimal inches</option>
            <option value="inch-fraction">fractions of an inch</option>
          </Select>
        </Field>
        <Field label="Time zone" hint="For instance Europe/Berlin" error={errorAt('timeZone')}>
          <TextInput value={values.timeZone} onChange={(event) => set('timeZone', event.target.value)} />
        </Field>
        <div>
          <Button type="submit" busy={form.act.pending} disabled={!form.isDraft}>
            Save
          </Button>
        </div>
        <ProblemNotice problem={form.act.problem} />
      </FormFrame>
    </Sheet>
  );
}

export function PasswordSheet({ email }: { email: string }) {
  const [current, setCurrent] = useState('');
  const [next, setNext] = useState('');
  const [done, setDone] = useState(false);
  const change = useAct(changePassword, {
    said: 'The password is changed.',
    onDone: () => {
      setCurrent('');
      setNext('');
      setDone(true);
    },
  });
  const errorAt = (pointer: string): string | undefined =>
    change.problem?.problem.errors?.find((error) => error.pointer === pointer)?.message;
  return (
    <Sheet title="Password" note="Changing it ends your sessions on every other device">
      <form
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          setDone(false);
          change.run({ body: { currentPassword: current, newPassword: next } });
        }}
      >
        {/* A password manager needs to know whose password this is. */}
        <input type="text" autoComplete="username" value={email} readOnly hidden />
        <Field label="Current password" error={errorAt('/body/currentPassword')}>
          <TextInput
            type="password"
            value={current}
            required
            autoComplete="current-password"
            onChange={(event) => setCurrent(event.target.value)}
          />
        </Field>
        <Field
          label="New password"
          hint="At least 15 characters; a few plain words work well"
          error={errorAt('/body/newPassword')}
        >
          <TextInput
            type="password"
            value={next}
            required
            minLength={15}
            autoComplete="new-password"
            onChange={(event) => setNext(event.target.value)}
          />
        </Field>
        <div>
          <Button type="submit" busy={change.pending}>
            Change the password
          </Button>
        </div>
        {done && <Notice tone="verdigris">The password is changed.</Notice>}
        <ProblemNotice problem={change.problem} />
      </form>
    </Sheet>
  );
}

export function SessionsSheet({ onSignedOut }: { onSignedOut: () => void }) {
  const leave = useAct(signOutEverywhere, { onDone: onSignedOut });
  return (
    <Sheet title="Signed in elsewhere" note="A lost phone, a shared computer">
      <Button variant="outline" busy={leave.pending} onClick={() => leave.run({})}>
        Sign out on every device
      </Button>
      <ProblemNotice problem={leave.problem} />
    </Sheet>
  );
}
