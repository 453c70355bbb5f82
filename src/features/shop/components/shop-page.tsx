import { useSuspenseQuery } from '@tanstack/react-query';
import * as contracts from '../../../../shared/contracts/shops.ts';
import type { ShopView } from '../../../../shared/contracts/shops.ts';
import { SHOP_ROLES, SHOP_TINTS, type ShopRole, type ShopTint } from '../../../../shared/contracts/vocabulary.ts';
import { EditFormFoot } from '../../../components/edit-form-foot.tsx';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { CountrySelect } from '../../../components/ui/country-select.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Page, PageHeading, TwoColumns } from '../../../components/ui/page.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { useEditForm } from '../../../hooks/use-edit-form.ts';
import { keys } from '../../../lib/query-keys.ts';
import { shopQueries } from '../../../lib/queries/shops.ts';
import { SHOP_ROLE_WORDS } from '../../../lib/words.ts';
import { ShopPeople } from './shop-people.tsx';

function ShopForm({ shop }: { shop: ShopView }) {
  const form = useEditForm(contracts.updateShop, {
    name: `shop-${shop.id}`,
    record: shop,
    toValues: ({ name, craft, country, timeZone, tint }: ShopView) => ({ name, craft, country, timeZone, tint }),
    toInput: ({ name, craft, country, timeZone, tint }, revision) => ({
      params: { shopId: shop.id },
      body: { revision, name, craft, country, timeZone, tint },
    }),
    edited: [
      { name: 'name', label: 'Name' },
      { name: 'craft', label: 'Craft' },
      { name: 'country', label: 'Country' },
      { name: 'timeZone', label: 'Time zone' },
      { name: 'tint', label: 'Tint' },
    ],
    stale: () => [keys.shops.detail(shop.id), keys.me()],
  });
  const { values, set, errorAt } = form;
  return (
    <FormFrame form={form}>
      <Field label="Name" error={errorAt('name')}>
        <TextInput value={values.name} onChange={(event) => set('name', event.target.value)} />
      </Field>
      <Field label="Craft" hint="In a few words, as clients read it" error={errorAt('craft')}>
        <TextInput value={values.craft} onChange={(event) => set('craft', event.target.value)} />
      </Field>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field label="Country" error={errorAt('country')}>
          <CountrySelect value={values.country} onChange={(event) => set('country', event.target.value)} />
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
      <EditFormFoot form={form} save="Save the shop" />
    </FormFrame>
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
      <FormFrame form={form}>
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
                {SHOP_ROLE_WORDS[role]}
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
      </FormFrame>
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
            <ShopPeople shopId={shopId} shopName={shop.name} isOwner={isOwner} />
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
