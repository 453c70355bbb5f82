import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { addReadings } from '../../../shared/contracts/joints.ts';
import { ReadingEntry } from '../../../src/features/joints/components/reading-entry.tsx';
import { fakeServer, json, newQueryClient, refusal } from '../lib/fake-server.ts';

const ID = '5b6f2a4e-9b1d-4a55-8b7c-2f0c3e9d1a01';

const open = () =>
  render(
    <QueryClientProvider client={newQueryClient()}>
      <ReadingEntry
        commissionId={ID}
        jointId={ID}
        nominalMm={32}
        sideNames={{ hole: 'bore', shaft: 'spigot' }}
        preferredUnit="mm"
        reportId={null}
        ownSide={null}
      />
    </QueryClientProvider>,
  );
const fields = () => screen.getAllByRole<HTMLInputElement>('textbox', { name: /^Reading/ });
const values = () => fields().map((field) => field.value);
const typeInto = async (index: number, text: string): Promise<void> => {
  const field = fields()[index];
  if (!field) throw new Error(`There is no reading ${index + 1}`);
  await userEvent.type(field, text);
};
const side = () => screen.getByRole<HTMLSelectElement>('combobox', { name: 'Which part' });

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

describe('readings being entered', () => {
  it('are all there after a reload, the side they belong to and the gauge included', async () => {
    const first = open();
    await userEvent.selectOptions(side(), 'shaft');
    await typeInto(0, '31.91');
    await userEvent.type(screen.getByRole('textbox', { name: /^Gauge/ }), 'caliper 3');
    first.unmount();
    open();
    expect(values()[0]).toBe('31.91');
    expect(side().value).toBe('shaft');
    expect(screen.getByRole<HTMLInputElement>('textbox', { name: /^Gauge/ }).value).toBe('caliper 3');
  });

  it('are saved to no side that was not chosen', async () => {
    const sent = fakeServer([]);
    open();
    await typeInto(0, '31.91');
    expect(screen.getByRole('button', { name: 'Save 1 reading' })).toBeDisabled();
    expect(sent).toHaveLength(0);
  });

  it('take a pasted column, and keep those below it', async () => {
    open();
    for (const [index, text] of ['31.91', '31.92', '31.93', '31.94'].entries()) await typeInto(index, text);
    fields()[0]?.focus();
    await userEvent.paste('31.81\n31.82\n');
    expect(values()).toEqual(['31.81', '31.82', '31.93', '31.94']);
  });

  it('keep the field that is being cleared, so that the next value of a caliper arrives', async () => {
    open();
    for (const [index, text] of ['31.91', '31.92', '31.93', '31.94'].entries()) await typeInto(index, text);
    await userEvent.click(screen.getByRole('button', { name: 'One more reading' }));
    await typeInto(4, '3');
    await userEvent.keyboard('{Backspace}');
    expect(document.activeElement).toBe(fields()[4]);
  });

  it('are not sent with a temperature that is no figure', async () => {
    const sent = fakeServer([[addReadings, () => json([], 201)]]);
    open();
    await userEvent.selectOptions(side(), 'hole');
    await typeInto(0, '31.91');
    await userEvent.type(screen.getByRole('textbox', { name: /Temperature/ }), '21 C');
    await userEvent.click(screen.getByRole('button', { name: 'Save 1 reading' }));
    expect(await screen.findAllByText('Write a number such as 12 or 12.5')).not.toHaveLength(0);
    expect(screen.getByRole('textbox', { name: /Temperature/ })).toHaveFocus();
    expect(sent).toHaveLength(0);
  });

  it('are still there when the server refuses them', async () => {
    const sent = fakeServer([[addReadings, () => refusal('not-in-this-state', { detail: 'The piece is delivered.' })]]);
    open();
    await userEvent.selectOptions(side(), 'hole');
    await typeInto(0, '31.91');
    await userEvent.click(screen.getByRole('button', { name: 'Save 1 reading' }));
    await waitFor(() => expect(screen.getByText('The piece is delivered.')).toBeInTheDocument());
    expect(sent).toHaveLength(1);
    expect(values()[0]).toBe('31.91');
  });
});
