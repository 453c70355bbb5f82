import { useState } from 'react';
import { Link } from 'react-router-dom';
import { giveSecondFactor, signIn } from '../../../../shared/contracts/accounts.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';

/** Password first, then the second factor where there is one. Neither is kept as a draft. */
export function SignInForm({ onSignedIn }: { onSignedIn: () => void }) {
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const [shown, setShown] = useState(false);
  const [code, setCode] = useState('');
  const [asksCode, setAsksCode] = useState(false);
  const enter = useAct(signIn, { onDone: ({ next }) => (next === 'done' ? onSignedIn() : setAsksCode(true)) });
  const give = useAct(giveSecondFactor, { onDone: onSignedIn });
  if (asksCode)
    return (
      <form
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          give.run({ body: { code } });
        }}
      >
        <Field label="Six digits of your authenticator" hint="Or one of your recovery codes">
          <TextInput
            value={code}
            required
            autoFocus
            inputMode="text"
            autoComplete="one-time-code"
            onChange={(event) => setCode(event.target.value)}
          />
        </Field>
        <Button type="submit" busy={give.pending}>
          Sign in
        </Button>
        <ProblemNotice problem={give.problem} />
      </form>
    );
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        enter.run({ body: { email, password } });
      }}
    >
      <Field label="E-mail">
        <TextInput
          type="email"
          value={email}
          required
          autoComplete="username"
          onChange={(event) => setEmail(event.target.value)}
        />
      </Field>
      <Field label="Password">
        <TextInput
          type={shown ? 'text' : 'password'}
          value={password}
          required
          autoComplete="current-password"
          onChange={(event) => setPassword(event.target.value)}
        />
      </Field>
      <Checkbox label="Show the password" checked={shown} onChange={(event) => setShown(event.target.checked)} />
      <Button type="submit" busy={enter.pending}>
        Sign in
      </Button>
      <ProblemNotice problem={enter.problem} />
      <p>
        <Link to="/reset" className="underline">
          Ask for a new password
        </Link>
      </p>
      <p className="text-note text-lead-grey">Accounts come by invitation: from a shop, a lead or the steward.</p>
    </form>
  );
}
