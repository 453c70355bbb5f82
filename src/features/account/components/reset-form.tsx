import { useState } from 'react';
import { Link } from 'react-router-dom';
import { askPasswordReset, completePasswordReset } from '../../../../shared/contracts/accounts.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Notice } from '../../../components/ui/notice.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';

export function AskReset() {
  const [email, setEmail] = useState('');
  const [asked, setAsked] = useState(false);
  const ask = useAct(askPasswordReset, { onDone: () => setAsked(true) });
  if (asked)
    return (
      <Notice tone="verdigris" title="Look into your letters">
        If there is an account for {email}, a link is on its way. It works once, for one hour.
      </Notice>
    );
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        ask.run({ body: { email } });
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
      <Button type="submit" busy={ask.pending}>
        Send me a link
      </Button>
      <ProblemNotice problem={ask.problem} />
      <p>
        <Link to="/sign-in" className="underline">
          Back to the sign-in
        </Link>
      </p>
    </form>
  );
}

export function CompleteReset({ token }: { token: string }) {
  const [password, setPassword] = useState('');
  const [done, setDone] = useState(false);
  const complete = useAct(completePasswordReset, { onDone: () => setDone(true) });
  const trouble = complete.problem?.problem.errors?.[0]?.message;
  if (done)
    return (
      <Notice tone="verdigris" title="Your new password is set">
        <Link to="/sign-in" className="underline">
          Sign in with it
        </Link>
      </Notice>
    );
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        complete.run({ body: { token, newPassword: password } });
      }}
    >
      <Field label="New password" hint="At least 15 characters; a few plain words work well" error={trouble}>
        <TextInput
          type="password"
          value={password}
          required
          minLength={15}
          autoComplete="new-password"
          onChange={(event) => setPassword(event.target.value)}
        />
      </Field>
      <Button type="submit" busy={complete.pending}>
        Set this password
      </Button>
      <ProblemNotice problem={complete.problem} />
    </form>
  );
}
