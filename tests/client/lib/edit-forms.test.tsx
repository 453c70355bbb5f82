import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { updatePart, type PartView } from '../../../shared/contracts/parts-and-legs.ts';
import { EditFormFoot } from '../../../src/components/edit-form-foot.tsx';
import { FormFrame } from '../../../src/components/form-frame.tsx';
import { Field } from '../../../src/components/ui/field.tsx';
import { TextInput } from '../../../src/components/ui/text-input.tsx';
import { useEditForm } from '../../../src/hooks/use-edit-form.ts';
import { fakeServer, inTurn, json, newQueryClient, refusal, type Answer } from './fake-server.ts';

const part: PartView = {
  id: '5b6f2a4e-9b1d-4a55-8b7c-2f0c3e9d1a01',
  name: 'Hilt',
  kind: 'hilt',
  holderPartyId: '5b6f2a4e-9b1d-4a55-8b7c-2f0c3e9d1a02',
  holderSince: '2026-12-01',
  position: 0,
  revision: 3,
};

function Rename() {
  const form = useEditForm(updatePart, {
    name: `part-${part.id}`,
    record: part,
    toValues: ({ name }: PartView) => ({ name }),
    toInput: ({ name }, revision) => ({
      params: { commissionId: part.holderPartyId, partId: part.id },
      body: { revision, name },
    }),
    edited: [{ name: 'name', label: 'Name' }],
    stale: () => [],
  });
  return (
    <FormFrame form={form}>
      <Field label="Name" error={form.errorAt('name')}>
        <TextInput value={form.values.name} onChange={(event) => form.set('name', event.target.value)} />
      </Field>
      <EditFormFoot form={form} save="Save this part" />
    </FormFrame>
  );
}

const open = () =>
  render(
    <QueryClientProvider client={newQueryClient()}>
      <Rename />
    </QueryClientProvider>,
  );

const answers = (...inOrder: readonly Answer[]) => fakeServer([[updatePart, inTurn(...inOrder)]]);
const stale = () => refusal('stale-revision', { current: { ...part, name: 'Hilt body', revision: 4 } });
const nameField = () => screen.getByRole<HTMLInputElement>('textbox', { name: 'Name' });
const typeName = async (name: string): Promise<void> => {
  await userEvent.clear(nameField());
  await userEvent.type(nameField(), name);
};
const save = () => userEvent.click(screen.getByRole('button', { name: 'Save this part' }));

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

describe('a form that changes a record', () => {
  it('says with a save which state it began from, over a reload too', async () => {
    const sent = answers(() => json({ ...part, name: 'Lower hilt', revision: 4 }));
    const first = open();
    await typeName('Lower hilt');
    first.unmount();
    open();
    expect(nameField().value).toBe('Lower hilt');
    await save();
    await waitFor(() => expect(sent).toHaveLength(1));
    expect(sent[0]?.body).toEqual({ revision: 3, name: 'Lower hilt' });
  });

  it('that comes too late shows both values, and saves mine over theirs only when told to', async () => {
    const sent = answers(stale, () => json({ ...part, name: 'Lower hilt', revision: 5 }));
    open();
    await typeName('Lower hilt');
    await save();
    const alert = await screen.findByRole('alert');
    expect(within(alert).getByText('Lower hilt')).toBeInTheDocument();
    expect(within(alert).getByText('Hilt body')).toBeInTheDocument();
    expect(sent).toHaveLength(1);
    await userEvent.click(screen.getByRole('button', { name: 'Save what stands in the form' }));
    await waitFor(() => expect(sent).toHaveLength(2));
    expect(sent[1]?.body).toEqual({ revision: 4, name: 'Lower hilt' });
    await waitFor(() => expect(localStorage.length).toBe(0));
  });

  it('takes theirs where theirs is better, and keeps the comparison in sight meanwhile', async () => {
    answers(stale);
    open();
    await typeName('Lower hilt');
    await save();
    await userEvent.click(await screen.findByRole('button', { name: 'Take theirs: Name' }));
    expect(nameField().value).toBe('Hilt body');
    expect(screen.getByText('Your values are the same as theirs by now.')).toBeInTheDocument();
  });

  it('goes back to what is saved when the draft is given up', async () => {
    answers(stale);
    open();
    await typeName('Lower hilt');
    await save();
    await screen.findByRole('alert');
    await userEvent.click(screen.getByRole('button', { name: 'Leave it as it was' }));
    expect(nameField().value).toBe('Hilt');
    expect(screen.queryByRole('alert')).toBeNull();
  });
});
