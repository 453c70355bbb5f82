import { QueryClientProvider, type QueryClient } from '@tanstack/react-query';
import { act, render, renderHook, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { createShop } from '../../../shared/contracts/shops.ts';
import { FormFrame } from '../../../src/components/form-frame.tsx';
import { ProblemNotice } from '../../../src/components/problem-notice.tsx';
import { Button } from '../../../src/components/ui/button.tsx';
import { Field } from '../../../src/components/ui/field.tsx';
import { TextInput } from '../../../src/components/ui/text-input.tsx';
import { useAct } from '../../../src/hooks/use-act.ts';
import { useContractForm } from '../../../src/hooks/use-contract-form.ts';
import { useDraft } from '../../../src/hooks/use-draft.ts';
import { keys } from '../../../src/lib/query-keys.ts';
import { fakeServer, inTurn, json, newQueryClient, refusal } from './fake-server.ts';

const shop = {
  id: '5b6f2a4e-9b1d-4a55-8b7c-2f0c3e9d1a01',
  name: 'Weir',
  craft: 'Blades',
  country: 'DE',
  timeZone: 'UTC',
  tint: 'brass',
  revision: 1,
  yourRole: null,
};

const signedInAs = (id: string): QueryClient => {
  const client = newQueryClient();
  client.setQueryData(keys.me(), { id });
  return client;
};

const inClient =
  (client: QueryClient) =>
  ({ children }: { children: ReactNode }) => <QueryClientProvider client={client}>{children}</QueryClientProvider>;

const draftOf = (accountId: string, name = 'thread-1', initial = '') =>
  renderHook(() => useDraft(name, initial), { wrapper: inClient(signedInAs(accountId)) });

beforeEach(() => localStorage.clear());
afterEach(() => {
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

describe('a draft', () => {
  it('is there again after the page was left and opened anew', () => {
    const first = draftOf('ines');
    act(() => first.result.current[1]('The spigot is 0.05 over'));
    first.unmount();
    expect(draftOf('ines').result.current[0]).toBe('The spigot is 0.05 over');
  });

  it('is nobody else’s on the same device, and is still its writer’s after they were away', () => {
    const first = draftOf('ines');
    act(() => first.result.current[1]('For Ines alone'));
    expect(draftOf('maud').result.current[0]).toBe('');
    expect(draftOf('ines').result.current[0]).toBe('For Ines alone');
  });

  it('belongs to one form or thread', () => {
    const first = draftOf('ines', 'thread-1');
    act(() => first.result.current[1]('Here'));
    expect(draftOf('ines', 'thread-2').result.current[0]).toBe('');
  });

  it('is gone from the device once it was sent', () => {
    const first = draftOf('ines');
    act(() => first.result.current[1]('Sent'));
    act(() => first.result.current[2]());
    expect(first.result.current[0]).toBe('');
    expect(localStorage.length).toBe(0);
  });

  it('keeps the page working where the device keeps nothing', () => {
    vi.spyOn(Storage.prototype, 'setItem').mockImplementation(() => {
      throw new DOMException('full', 'QuotaExceededError');
    });
    const first = draftOf('ines');
    act(() => first.result.current[1]('Still here'));
    expect(first.result.current[0]).toBe('Still here');
  });
});

function OpenShop({ onDone }: { onDone?: () => void }) {
  const form = useContractForm(createShop, {
    name: 'new-shop',
    initial: { name: '', craft: '', country: 'DE', ownerEmail: '' },
    toInput: (values) => ({ body: values }),
    ...(onDone ? { onDone } : {}),
  });
  const { values, set, errorAt } = form;
  return (
    <FormFrame form={form}>
      <Field label="Name" error={errorAt('name')}>
        <TextInput value={values.name} onChange={(event) => set('name', event.target.value)} />
      </Field>
      <Field label="Craft" error={errorAt('craft')}>
        <TextInput value={values.craft} onChange={(event) => set('craft', event.target.value)} />
      </Field>
      <Field label="Owner" error={errorAt('ownerEmail')}>
        <TextInput value={values.ownerEmail} onChange={(event) => set('ownerEmail', event.target.value)} />
      </Field>
      <Button type="submit" busy={form.act.pending}>
        Open the shop
      </Button>
      {form.isDraft && <span>draft kept</span>}
      <ProblemNotice problem={form.act.problem} />
    </FormFrame>
  );
}

const openForm = (onDone?: () => void) =>
  render(<OpenShop {...(onDone ? { onDone } : {})} />, { wrapper: inClient(signedInAs('steward')) });
const field = (name: string) => screen.getByRole<HTMLInputElement>('textbox', { name });
const press = () => userEvent.click(screen.getByRole('button', { name: 'Open the shop' }));
const fillIn = async (name = 'Weir') => {
  await userEvent.type(field('Name'), name);
  await userEvent.type(field('Craft'), 'Blades');
  await userEvent.type(field('Owner'), 'hana@weir.example');
};

describe('a form of a contract', () => {
  it('asks the contract first: nothing is sent, each finding stands at its field, the first has the focus', async () => {
    const seen = fakeServer([]);
    openForm();
    await userEvent.type(field('Name'), 'Weir');
    await press();
    expect(field('Name')).toBeValid();
    expect(field('Craft')).toHaveAccessibleDescription('Write something here');
    expect(field('Owner')).toHaveAccessibleDescription('Give an e-mail address');
    expect(field('Craft')).toHaveFocus();
    expect(screen.getByRole('alert')).toHaveTextContent('Nothing was sent yet.');
    expect(seen).toEqual([]);
  });

  it('shows what the server found at the field its pointer names', async () => {
    const errors = [
      { pointer: '/body/ownerEmail', message: 'That address takes no letters' },
      { pointer: '/body', message: 'A shop of this name opened today' },
    ];
    fakeServer([[createShop, () => refusal('input-invalid', { errors })]]);
    openForm();
    await fillIn();
    await press();
    await waitFor(() => expect(field('Owner')).toHaveAccessibleDescription('That address takes no letters'));
    expect(field('Name')).toBeValid();
    expect(field('Owner')).toHaveFocus();
    expect(screen.getByRole('alert')).toHaveTextContent('A shop of this name opened today');
  });

  it('keeps every value over a refusal and a reload, says so, and forgets them once they are stored', async () => {
    fakeServer([
      [
        createShop,
        inTurn(
          () => Promise.reject(new TypeError('Failed to fetch')),
          () => json(shop, 201),
        ),
      ],
    ]);
    const first = openForm();
    await fillIn();
    await press();
    expect(await screen.findByRole('alert')).toHaveTextContent('What you wrote is kept');
    first.unmount();
    const done = vi.fn();
    openForm(done);
    expect(field('Name')).toHaveValue('Weir');
    expect(field('Owner')).toHaveValue('hana@weir.example');
    expect(screen.getByText('draft kept')).toBeInTheDocument();
    await press();
    await waitFor(() => expect(done).toHaveBeenCalledOnce());
    expect(field('Name')).toHaveValue('');
    expect(localStorage.length).toBe(0);
  });

  it('keeps what is typed while the answer is on its way', async () => {
    let answer = (): void => {};
    const waiting = new Promise<Response>((resolve) => (answer = () => resolve(json(shop, 201))));
    fakeServer([[createShop, () => waiting]]);
    const done = vi.fn();
    openForm(done);
    await fillIn();
    await press();
    await userEvent.type(field('Name'), ' and daughters');
    act(() => answer());
    await waitFor(() => expect(done).toHaveBeenCalledOnce());
    expect(field('Name')).toHaveValue('Weir and daughters');
  });
});

describe('an act', () => {
  const body = { name: 'Weir', craft: 'Blades', country: 'DE', ownerEmail: 'hana@weir.example' };
  const openAct = () => renderHook(() => useAct(createShop), { wrapper: inClient(signedInAs('steward')) });

  it('is sent again under its key until it was answered; another body, or the next time, is another act', async () => {
    const lost = () => Promise.reject(new TypeError('Failed to fetch'));
    const seen = fakeServer([[createShop, inTurn(lost, () => json(shop, 201), lost)]]);
    const { result } = openAct();
    for (const sent of [body, body, body, { ...body, name: 'Weir two' }]) {
      act(() => result.current.run({ body: sent }));
      await waitFor(() => expect(result.current.pending).toBe(false));
    }
    const [first, again, next, other] = seen.map((request) => request.headers.get('idempotency-key'));
    expect(again).toBe(first);
    expect(next).not.toBe(first);
    expect(other).not.toBe(next);
  });

  it('is done once, however fast it is pressed twice', async () => {
    const sent = fakeServer([[createShop, () => json(shop, 201)]]);
    const { result } = renderHook(() => useAct(createShop), { wrapper: inClient(signedInAs('ines')) });
    const input = { body: { name: 'Weir', craft: 'Blades', country: 'DE', ownerEmail: 'hana@weir.example' } };
    act(() => {
      result.current.run(input);
      result.current.run(input);
    });
    await waitFor(() => expect(result.current.pending).toBe(false));
    expect(sent).toHaveLength(1);
    act(() => result.current.run(input));
    await waitFor(() => expect(sent).toHaveLength(2));
  });

  it('says so when something unforeseen stopped it', async () => {
    fakeServer([]);
    const { result } = openAct();
    act(() => result.current.run({ body }));
    await waitFor(() => expect(result.current.problem?.code).toBe('unexpected'));
  });
});
