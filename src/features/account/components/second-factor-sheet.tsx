import { useEffect, useRef, useState } from 'react';
import {
  beginSecondFactor,
  confirmSecondFactor,
  removeSecondFactor,
  type AccountView,
} from '../../../../shared/contracts/accounts.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Notice } from '../../../components/ui/notice.tsx';
import { Fold } from '../../../components/ui/fold.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { announce } from '../../../components/ui/announcer.ts';
import { useAct } from '../../../hooks/use-act.ts';
import { saveAsFile } from '../../../lib/save-as-file.ts';
import { keys } from '../../../lib/query-keys.ts';

/** The QR code as a picture of its own: the page's policy allows no markup from a string. */
function QrCode({ svg }: { svg: string }) {
  const picture = useRef<HTMLImageElement>(null);
  useEffect(() => {
    const address = URL.createObjectURL(new Blob([svg], { type: 'image/svg+xml' }));
    if (picture.current) picture.current.src = address;
    return () => URL.revokeObjectURL(address);
  }, [svg]);
  return (
    <img
      ref={picture}
      alt="QR code for your authenticator; the secret is beside it in letters"
      width={200}
      height={200}
      className="bg-vellum"
    />
  );
}

function SetUp({ onConfirmed }: { onConfirmed: (codes: readonly string[]) => void }) {
  const [made, setMade] = useState<{ secret: string; qrSvg: string } | null>(null);
  const [code, setCode] = useState('');
  const begin = useAct(beginSecondFactor, { onDone: setMade });
  const confirm = useAct(confirmSecondFactor, {
    stale: () => [keys.me()],
    onDone: ({ recoveryCodes }) => onConfirmed(recoveryCodes),
  });
  if (!made)
    return (
      <>
        <p className="pb-3">A code of your phone beside the password: who finds one of them still does not get in.</p>
        <Button variant="outline" busy={begin.pending} onClick={() => begin.run({})}>
          Set up an authenticator
        </Button>
        <ProblemNotice problem={begin.problem} />
      </>
    );
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        confirm.run({ body: { code } });
      }}
    >
      <QrCode svg={made.qrSvg} />
      <p className="text-note break-all">
        Or type this secret: <code className="figures">{made.secret}</code>
      </p>
      <Field label="Six digits it shows now">
        <TextInput
          value={code}
          required
          inputMode="numeric"
          autoComplete="one-time-code"
          onChange={(event) => setCode(event.target.value)}
        />
      </Field>
      <div>
        <Button type="submit" busy={confirm.pending}>
          Put it in force
        </Button>
      </div>
      <ProblemNotice problem={confirm.problem} />
    </form>
  );
}

function TakeOff() {
  const [password, setPassword] = useState('');
  const [code, setCode] = useState('');
  const remove = useAct(removeSecondFactor, { said: 'The second factor is off.', stale: () => [keys.me()] });
  return (
    <Fold summary="Take the second factor off">
      <form
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          remove.run({ body: { password, code } });
        }}
      >
        <Field label="Password">
          <TextInput
            type="password"
            value={password}
            required
            autoComplete="current-password"
            onChange={(event) => setPassword(event.target.value)}
          />
        </Field>
        <Field label="Code">
          <TextInput
            value={code}
            required
            autoComplete="one-time-code"
            onChange={(event) => setCode(event.target.value)}
          />
        </Field>
        <div>
          <Button type="submit" variant="outline" busy={remove.pending}>
            Take it off
          </Button>
        </div>
        <ProblemNotice problem={remove.problem} />
      </form>
    </Fold>
  );
}

/** The second factor: set up, in force, taken off; recovery codes are shown once. */
export function SecondFactorSheet({ me }: { me: AccountView }) {
  const [codes, setCodes] = useState<readonly string[]>([]);
  return (
    <Sheet title="Second factor">
      {codes.length > 0 && (
        <Notice
          tone="brass"
          title="Keep these recovery codes"
          actions={
            <>
              <Button variant="outline" onClick={() => saveAsFile('ferrule-recovery-codes.txt', codes.join('\n'))}>
                Save them as a file
              </Button>
              <Button
                variant="outline"
                onClick={() =>
                  void navigator.clipboard.writeText(codes.join('\n')).then(
                    () => announce('The codes are copied.'),
                    () => announce('The codes could not be copied; save them as a file.', 'assertive'),
                  )
                }
              >
                Copy them
              </Button>
            </>
          }
        >
          <p>Each works once, when the authenticator is not at hand. They are shown this one time.</p>
          <ul className="grid grid-cols-1 gap-1 pt-2 sm:grid-cols-2">
            {codes.map((code) => (
              <li key={code}>
                <code className="figures">{code}</code>
              </li>
            ))}
          </ul>
        </Notice>
      )}
      {me.secondFactor ? (
        <>
          <p className="py-3">In force. {me.recoveryCodesLeft} recovery codes are left.</p>
          <TakeOff />
        </>
      ) : (
        <SetUp onConfirmed={setCodes} />
      )}
    </Sheet>
  );
}
