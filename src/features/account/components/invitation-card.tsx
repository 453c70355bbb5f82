import { useEffect, useState } from 'react';
import { Link } from 'react-router-dom';
import { acceptInvitation, previewInvitation } from '../../../../shared/contracts/accounts.ts';
import type { RouteOutput } from '../../../../shared/contracts/route.ts';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { CountrySelect } from '../../../components/ui/country-select.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { Skeleton } from '../../../components/ui/skeleton.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';

type Preview = RouteOutput<typeof previewInvitation>;

function Accept({
  token,
  preview,
  signedIn,
  onJoined,
}: {
  token: string;
  preview: Preview;
  signedIn: boolean;
  onJoined: (commissionId: string | null) => void;
}) {
  const [displayName, setDisplayName] = useState('');
  const [password, setPassword] = useState('');
  const [shopId, setShopId] = useState(preview.yourShops[0]?.shopId ?? '');
  const [shopName, setShopName] = useState('');
  const [country, setCountry] = useState('');
  const accept = useAct(acceptInvitation, { onDone: ({ commissionId }) => onJoined(commissionId) });
  const errorAt = (pointer: string): string | undefined =>
    accept.problem?.problem.errors?.find((error) => error.pointer === pointer)?.message;
  const makesShop = preview.needsShop && shopId === '';
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        accept.run({
          body: {
            token,
            ...(signedIn
              ? {}
              : { newAccount: { displayName, password, timeZone: Intl.DateTimeFormat().resolvedOptions().timeZone } }),
            ...(preview.needsShop ? (makesShop ? { newShop: { name: shopName, country } } : { shopId }) : {}),
          },
        });
      }}
    >
      {!signedIn && (
        <>
          <Field label="Your name" error={errorAt('/body/newAccount/displayName')}>
            <TextInput
              value={displayName}
              required
              autoComplete="name"
              onChange={(event) => setDisplayName(event.target.value)}
            />
          </Field>
          <Field label="E-mail">
            <TextInput type="email" value={preview.email} readOnly autoComplete="username" />
          </Field>
          <Field
            label="Password"
            hint="At least 15 characters; a few plain words work well"
            error={errorAt('/body/newAccount/password')}
          >
            <TextInput
              type="password"
              value={password}
              required
              minLength={15}
              autoComplete="new-password"
              onChange={(event) => setPassword(event.target.value)}
            />
          </Field>
        </>
      )}
      {preview.needsShop && preview.yourShops.length > 0 && (
        <Field label="Which of your shops takes part" error={errorAt('/body/shopId')}>
          <Select value={shopId} onChange={(event) => setShopId(event.target.value)}>
            {preview.yourShops.map((shop) => (
              <option key={shop.shopId} value={shop.shopId}>
                {shop.name}
              </option>
            ))}
            <option value="">A new shop</option>
          </Select>
        </Field>
      )}
      {makesShop && (
        <>
          <Field label="Name of your shop">
            <TextInput
              value={shopName}
              required
              autoComplete="organization"
              onChange={(event) => setShopName(event.target.value)}
            />
          </Field>
          <Field label="Country" error={errorAt('/body/newShop/country')}>
            <CountrySelect
              value={country}
              required
              autoComplete="country"
              onChange={(event) => setCountry(event.target.value)}
            />
          </Field>
        </>
      )}
      <Button type="submit" busy={accept.pending}>
        {signedIn ? 'Take part' : 'Make an account and take part'}
      </Button>
      <ProblemNotice problem={accept.problem} />
    </form>
  );
}

/** What an invitation offers, and the way to take it. The token stays in this tab and in no address that is sent anywhere. */
export function InvitationCard({
  token,
  signedInAs,
  leaving,
  onLeave,
  onJoined,
}: {
  token: string;
  signedInAs: string | null;
  /** The reader signs out, to go on as the one who is invited. */
  leaving: boolean;
  onLeave: () => void;
  onJoined: (commissionId: string | null) => void;
}) {
  const [preview, setPreview] = useState<Preview | null>(null);
  const look = useAct(previewInvitation, { onDone: setPreview });
  const { run } = look;
  useEffect(() => {
    run({ body: { token } });
    // Asked once for each link; the act itself is made anew at each render.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [token]);
  if (look.problem) return <ProblemNotice problem={look.problem} />;
  if (!preview) return <Skeleton label="Reading the invitation" lines={3} />;
  const wrongPerson = signedInAs !== null && !preview.forYou;
  return (
    <Sheet title={preview.kind === 'commission' ? (preview.commissionTitle ?? '') : (preview.shopName ?? '')}>
      <p className="pb-4">
        {preview.invitedBy} invites you{preview.kind === 'shop' ? ' into this shop' : ' to take part'}, as{' '}
        {preview.roles.join(', ')}.
      </p>
      {wrongPerson ? (
        <div className="grid gap-4">
          <p>
            This invitation is for {preview.email}; you are signed in as {signedInAs}.
          </p>
          <div>
            <Button variant="outline" busy={leaving} onClick={onLeave}>
              Sign out and go on as {preview.email}
            </Button>
          </div>
        </div>
      ) : (
        <>
          {signedInAs === null && (
            <p className="pb-4 text-note">
              Do you have an account already?{' '}
              <Link to="/sign-in?back=/invitation" className="underline">
                Sign in
              </Link>
              , and you come back here.
            </p>
          )}
          <Accept token={token} preview={preview} signedIn={signedInAs !== null} onJoined={onJoined} />
        </>
      )}
    </Sheet>
  );
}
