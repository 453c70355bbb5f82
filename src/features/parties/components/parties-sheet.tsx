import { useSuspenseQuery } from '@tanstack/react-query';
import { inviteParty, removeParty, withdrawInvitation } from '../../../../shared/contracts/commissions.ts';
import { GUEST_SIGHTS, type GuestSight } from '../../../../shared/contracts/vocabulary.ts';
import { mayDo } from '../../../../shared/abilities/ability.ts';
import { addDays, dayMonthYear } from '../../../../shared/units/calendar-day.ts';
import { AskFirst } from '../../../components/ask-first.tsx';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Notice } from '../../../components/ui/notice.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { useSight } from '../../../hooks/use-membership.ts';
import { keys } from '../../../lib/query-keys.ts';
import { commissionQueries } from '../../../lib/queries/commissions.ts';
import { ROLE_WORDS } from '../../../lib/words.ts';

type ShopWork = 'maker' | 'finisher' | 'installer';

const SIGHT_WORDS: Readonly<Record<GuestSight, string>> = {
  standing: 'Where it stands and who holds its parts',
  pictures: 'Pictures',
  threads: 'Threads open to everyone',
  parts: 'Who takes part, and the list of parts',
};

/** Invites a shop, the client or a guest by a letter with a link. */
function Invite({ commissionId, today }: { commissionId: string; today: string }) {
  const form = useContractForm(inviteParty, {
    name: `invite-${commissionId}`,
    initial: {
      kind: 'shop',
      email: '',
      roles: ['maker'] as readonly string[],
      sees: ['standing', 'pictures'] as readonly string[],
      seesUntil: addDays(today, 30),
    },
    toInput: ({ kind, email, roles, sees, seesUntil }) => {
      const params = { commissionId };
      if (kind === 'shop') return { params, body: { kind: 'shop' as const, email, roles: roles as ShopWork[] } };
      if (kind === 'client') return { params, body: { kind: 'client' as const, email } };
      return { params, body: { kind: 'guest' as const, email, sees: sees as GuestSight[], seesUntil } };
    },
    stale: () => [keys.parties.list(commissionId)],
  });
  const { values, set } = form;
  const { data } = useSuspenseQuery(commissionQueries.parties(commissionId));
  const clients = data.parties.filter((party) => party.roles.includes('client'));
  const toggle = (list: readonly string[], item: string, on: boolean): string[] =>
    on ? [...list, item] : list.filter((one) => one !== item);
  return (
    <FormFrame form={form}>
      <Field label="Whom">
        <Select value={values.kind} onChange={(event) => set('kind', event.target.value)}>
          <option value="shop">A shop</option>
          <option value="client">The client</option>
          <option value="guest">A guest who looks on</option>
        </Select>
      </Field>
      <Field label="E-mail" error={form.errorAt('email')}>
        <TextInput type="email" value={values.email} required onChange={(event) => set('email', event.target.value)} />
      </Field>
      {values.kind === 'shop' && (
        <fieldset className="grid gap-2">
          <legend className="font-semibold">Work</legend>
          {(['maker', 'finisher', 'installer'] as const).map((role) => (
            <Checkbox
              key={role}
              label={ROLE_WORDS[role]}
              checked={values.roles.includes(role)}
              onChange={(event) => set('roles', toggle(values.roles, role, event.target.checked))}
            />
          ))}
          {form.errorAt('roles') && <p className="text-note text-oxide">{form.errorAt('roles')}</p>}
        </fieldset>
      )}
      {values.kind === 'client' && clients.length > 0 && (
        <Notice tone="brass">
          There is a client already: {clients.map((party) => party.displayName).join(' and ')}. Another one sees and
          decides as they do.
        </Notice>
      )}
      {values.kind === 'guest' && (
        <>
          <fieldset className="grid gap-2">
            <legend className="font-semibold">May see</legend>
            {GUEST_SIGHTS.map((sight) => (
              <Checkbox
                key={sight}
                label={SIGHT_WORDS[sight]}
                disabled={sight === 'standing'}
                checked={values.sees.includes(sight)}
                onChange={(event) => set('sees', toggle(values.sees, sight, event.target.checked))}
              />
            ))}
          </fieldset>
          <Field label="Until" error={form.errorAt('seesUntil')}>
            <DateInput
              value={values.seesUntil}
              min={today}
              onChange={(event) => set('seesUntil', event.target.value)}
            />
          </Field>
        </>
      )}
      <div>
        <Button type="submit" busy={form.act.pending}>
          Send the invitation
        </Button>
      </div>
      <ProblemNotice problem={form.act.problem} />
    </FormFrame>
  );
}

function RemoveParty({ commissionId, partyId, name }: { commissionId: string; partyId: string; name: string }) {
  const remove = useAct(removeParty, { said: 'They are taken out.', stale: () => [keys.parties.list(commissionId)] });
  return (
    <AskFirst
      label="Take out"
      title={`Take ${name} out of this commission`}
      description="They lose sight of it at once. What they wrote and did stays."
      act={`Take ${name} out`}
      keep="Keep them"
      pending={remove.pending}
      problem={remove.problem}
      onAct={() => remove.run({ params: { commissionId, partyId } })}
    />
  );
}

/** Who takes part, as what; for the lead also who is invited, and the way to invite. */
export function PartiesSheet({ commissionId, today }: { commissionId: string; today: string }) {
  const { data } = useSuspenseQuery(commissionQueries.parties(commissionId));
  const { ability } = useSight(commissionId);
  const withdraw = useAct(withdrawInvitation, {
    said: 'The invitation is taken back.',
    stale: () => [keys.parties.list(commissionId)],
  });
  const facts = { id: commissionId, memberKeys: [] };
  const mayRemove = mayDo(ability, 'remove', 'Commission', facts);
  return (
    <div className="grid gap-5">
      <Sheet title="Who takes part">
        <ul>
          {data.parties.map((party) => (
            <li
              key={party.id}
              className="flex flex-wrap items-center justify-between gap-3 border-b border-hairline py-3 last:border-b-0"
            >
              <div>
                <p className="font-semibold">{party.displayName}</p>
                <p className="text-note text-lead-grey">
                  {party.roles.map((role) => ROLE_WORDS[role]).join(', ')}
                  {party.seesUntil && `, until ${dayMonthYear(party.seesUntil)}`}
                  {party.shopId &&
                    party.people.length > 0 &&
                    ` · ${party.people.map((person) => person.displayName).join(', ')}`}
                </p>
              </div>
              {mayRemove && !party.roles.includes('lead') && (
                <RemoveParty commissionId={commissionId} partyId={party.id} name={party.displayName} />
              )}
            </li>
          ))}
        </ul>
      </Sheet>
      {data.invitations.length > 0 && (
        <Sheet title="Invited, not yet here">
          <ul>
            {data.invitations.map((invitation) => (
              <li
                key={invitation.id}
                className="flex flex-wrap items-center justify-between gap-3 border-b border-hairline py-2 last:border-b-0"
              >
                <span>
                  {invitation.email}{' '}
                  <span className="text-note text-lead-grey">
                    as {invitation.roles.map((role) => ROLE_WORDS[role]).join(', ')}, good until{' '}
                    {dayMonthYear(invitation.expiresAt.slice(0, 10))}
                  </span>
                </span>
                <Button
                  variant="quiet"
                  onClick={() => withdraw.run({ params: { commissionId, invitationId: invitation.id } })}
                >
                  Take it back
                </Button>
              </li>
            ))}
          </ul>
          <ProblemNotice problem={withdraw.problem} />
        </Sheet>
      )}
      {mayDo(ability, 'invite', 'Commission', facts) && (
        <Sheet title="Invite">
          <Invite commissionId={commissionId} today={today} />
        </Sheet>
      )}
    </div>
  );
}
