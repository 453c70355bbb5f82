import { useSuspenseQuery } from '@tanstack/react-query';
import * as contracts from '../../../../shared/contracts/shops.ts';
import type { ShopView } from '../../../../shared/contracts/shops.ts';
import { SHOP_ROLES, SHOP_TINTS, type ShopRole, type ShopTint } from '../../../../shared/contracts/vocabulary.ts';
import { ConflictSheet } from '../../../components/conflict-sheet.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Page, PageHeading, TwoColumns } from '../../../components/ui/page.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useAct } from '../../../hooks/use-act.ts';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { keys } from '../../../lib/query-keys.ts';
import { shopQueries } from '../../../lib/queries/shops.ts';

const ROLE_WORDS: Readonly<Record<ShopRole, string>> = { owner: 'Owner', hand: 'Hand', bookkeeper: 'Bookkeeper' };

type ShopField = 'name' | 'craft' | 'country' | 'timeZone' | 'tint';

function ShopForm({ shop }: { shop: ShopView }) {
  const form = useContractForm(contracts.updateShop, {
    name: `shop-${shop.id}`,
    initial: {
      name: shop.name,
      craft: shop.craft,
      country: shop.country,
      timeZone: shop.timeZone,
      tint: shop.tint,
      revision: shop.revision.toString(),
    },
    toInput: (values) => ({
      params: { shopId: shop.id },
      body: { ...values, revision: Number(values.revision) },
    }),
    stale: () => [keys.shops.detail(shop.id), keys.me()],
  });
  const { values, set, errorAt } = form;
  const theirs = form.act.problem?.code === 'stale-revision' ? (form.act.problem.problem.current as ShopView) : null;
  const line = (name: ShopField, label: string) => ({
    name,
    label,
    mine: values[name],
    theirs: theirs?.[name] ?? '',
    same: values[name] === theirs?.[name],
    takeTheirs: () => set(name, theirs?.[name] ?? ''),
  });
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
      <Field label="Craft" hint="In a few words, as clients read it" error={errorAt('craft')}>
        <TextInput value={values.craft} maxLength={80} onChange={(event) => set('craft', event.target.value)} />
      </Field>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Country" hint="Two letters" error={errorAt('country')}>
          <TextInput
            value={values.country}
            maxLength={2}
            onChange={(event) => set('country', event.target.value.toUpperCase())}
          />
        </Field>
        <Field label="Time zone" error={errorAt('timeZone')}>
          <TextInput value={values.timeZone} onChange={(event) => set('timeZone', event.target.value)} />
        </Field>
        <Field label="Tint" hint="Of your half of a ring">
          <Select value={values.tint} onChange={(event) => set('tint', event.target.value as ShopTint)}>
            {SHOP_TINTS.map((tint) => (
              <option key={tint} value={tint}>
                {tint.replace('-', ' ')}
              </option>
            ))}
          </Select>
        </Field>
      </div>
      <div>
        <Button type="submit" busy={form.act.pending} disabled={!form.isDraft}>
          Save the shop
        </Button>
      </div>
      {theirs ? (
        <ConflictSheet
          fields={[
            line('name', 'Name'),
            line('craft', 'Craft'),
            line('country', 'Country'),
            line('timeZone', 'Time zone'),
            line('tint', 'Tint'),
          ]}
          onSaveMine={() => {
            form.patch({ revision: theirs.revision.toString() });
            form.act.run({
              params: { shopId: shop.id },
              body: { ...values, revision: theirs.revision },
            });
          }}
        />
      ) : (
        <ProblemNotice problem={form.act.problem} />
      )}
    </form>
  );
}

function People({ shopId, isOwner }: { shopId: string; isOwner: boolean }) {
  const { data } = useSuspenseQuery(shopQueries.members(shopId));
  const stale = () => [keys.shops.members(shopId)];
  const change = useAct(contracts.changeShopMember, { stale });
  const remove = useAct(contracts.removeShopMember, { stale });
  const withdraw = useAct(contracts.withdrawShopInvitation, { stale });
  return (
    <Sheet title="People">
      <ul>
        {data.members.map((member) => (
          <li
            key={member.accountId}
            className="flex flex-wrap items-center justify-between gap-3 border-b border-hairline py-3"
          >
            <span>
              <span className="font-semibold">{member.displayName}</span>{' '}
              <span className="text-note text-lead-grey">{member.email}</span>
            </span>
            {isOwner ? (
              <span className="flex flex-wrap items-center gap-2">
                <Select
                  aria-label={`What ${member.displayName} does`}
                  value={member.role}
                  onChange={(event) =>
                    change.run({
                      params: { shopId, accountId: member.accountId },
                      body: { role: event.target.value as ShopRole },
                    })
                  }
                >
                  {SHOP_ROLES.map((role) => (
                    <option key={role} value={role}>
                      {ROLE_WORDS[role]}
                    </option>
                  ))}
                </Select>
                <Button variant="quiet" onClick={() => remove.run({ params: { shopId, accountId: member.accountId } })}>
                  Take out
                </Button>
              </span>
            ) : (
              <span>{ROLE_WORDS[member.role]}</span>
            )}
          </li>
        ))}
        {data.invitations.map((invitation) => (
          <li
            key={invitation.id}
            className="flex flex-wrap items-center justify-between gap-3 border-b border-hairline py-3"
          >
            <span>
              {invitation.email}{' '}
              <span className="text-note text-lead-grey">invited as {ROLE_WORDS[invitation.role].toLowerCase()}</span>
            </span>
            <Button variant="quiet" onClick={() => withdraw.run({ params: { shopId, invitationId: invitation.id } })}>
              Take it back
            </Button>
          </li>
        ))}
      </ul>
      <ProblemNotice problem={change.problem ?? remove.problem ?? withdraw.problem} />
    </Sheet>
  );
}

function InviteMember({ shopId }: { shopId: string }) {
  const form = useContractForm(contracts.inviteShopMember, {
    name: `shop-invite-${shopId}`,
    initial: { email: '', role: 'hand' },
    toInput: (values) => ({ params: { shopId }, body: { email: values.email, role: values.role as ShopRole } }),
    stale: () => [keys.shops.members(shopId)],
  });
  return (
    <Sheet title="Invite a person">
      <form
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          form.submit();
        }}
      >
        <Field label="E-mail" error={form.errorAt('email')}>
          <TextInput
            type="email"
            value={form.values.email}
            required
            onChange={(event) => form.set('email', event.target.value)}
          />
        </Field>
        <Field label="As" hint="A bookkeeper sees money and the plan, and no threads">
          <Select value={form.values.role} onChange={(event) => form.set('role', event.target.value)}>
            {SHOP_ROLES.map((role) => (
              <option key={role} value={role}>
                {ROLE_WORDS[role]}
              </option>
            ))}
          </Select>
        </Field>
        <div>
          <Button type="submit" variant="outline" busy={form.act.pending}>
            Send the invitation
          </Button>
        </div>
        <ProblemNotice problem={form.act.problem} />
      </form>
    </Sheet>
  );
}

/** A shop's own page: what it says of itself, its people, and who is invited. */
export function ShopPage({ shopId }: { shopId: string }) {
  const { data: shop } = useSuspenseQuery(shopQueries.detail(shopId));
  const isOwner = shop.yourRole === 'owner';
  return (
    <Page>
      <PageHeading title={shop.name} headline={shop.craft} />
      <TwoColumns
        main={
          <div className="grid gap-5">
            {isOwner && (
              <Sheet title="What the shop says of itself">
                <ShopForm shop={shop} />
              </Sheet>
            )}
            <People shopId={shopId} isOwner={isOwner} />
          </div>
        }
        side={
          isOwner ? (
            <InviteMember shopId={shopId} />
          ) : (
            <p className="text-lead-grey">The shop's owners change this page.</p>
          )
        }
      />
    </Page>
  );
}
