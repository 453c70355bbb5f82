import { useSuspenseQuery } from '@tanstack/react-query';
import { createShop, type ShopView } from '../../../../shared/contracts/shops.ts';
import { FormFrame } from '../../../components/form-frame.tsx';
import { ProblemNotice } from '../../../components/problem-notice.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { DataTable, type Column } from '../../../components/ui/data-table.tsx';
import { CountrySelect } from '../../../components/ui/country-select.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Page, PageHeading, TwoColumns } from '../../../components/ui/page.tsx';
import { Sheet } from '../../../components/ui/sheet.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { useContractForm } from '../../../hooks/use-contract-form.ts';
import { keys } from '../../../lib/query-keys.ts';
import { shopQueries } from '../../../lib/queries/shops.ts';

const COLUMNS: Column<ShopView>[] = [
  { key: 'name', header: 'Shop', cell: (shop) => shop.name, namesRow: true },
  { key: 'craft', header: 'Craft', cell: (shop) => shop.craft },
  { key: 'country', header: 'Country', cell: (shop) => shop.country },
];

/** For the steward: every shop, and the way to open one. */
export function AllShopsPage() {
  const { data: shops } = useSuspenseQuery(shopQueries.list());
  const form = useContractForm(createShop, {
    name: 'new-shop',
    initial: { name: '', craft: '', country: '', ownerEmail: '' },
    toInput: (values) => ({ body: values }),
    stale: () => [keys.shops.lists()],
  });
  const { values, set, errorAt } = form;
  return (
    <Page>
      <PageHeading
        title="All shops"
        headline="Accounts and shops; what is inside commissions is not the steward's to see."
      />
      <TwoColumns
        main={
          <DataTable
            caption="Shops of this installation"
            columns={COLUMNS}
            rows={shops}
            rowKey={(shop) => shop.id}
            empty="No shops yet."
          />
        }
        side={
          <Sheet title="Open a shop" note="Its owner comes by a letter with a link">
            <FormFrame form={form}>
              <Field label="Name" error={errorAt('name')}>
                <TextInput value={values.name} onChange={(event) => set('name', event.target.value)} />
              </Field>
              <Field label="Craft" error={errorAt('craft')}>
                <TextInput value={values.craft} onChange={(event) => set('craft', event.target.value)} />
              </Field>
              <Field label="Country" error={errorAt('country')}>
                <CountrySelect value={values.country} onChange={(event) => set('country', event.target.value)} />
              </Field>
              <Field label="Owner's e-mail" error={errorAt('ownerEmail')}>
                <TextInput
                  type="email"
                  value={values.ownerEmail}
                  onChange={(event) => set('ownerEmail', event.target.value)}
                />
              </Field>
              <div>
                <Button type="submit" busy={form.act.pending}>
                  Open the shop
                </Button>
              </div>
              <ProblemNotice problem={form.act.problem} />
            </FormFrame>
          </Sheet>
        }
      />
    </Page>
  );
}
