import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { PartyView } from '../../../shared/contracts/commissions.ts';
import { createHandoff } from '../../../shared/contracts/handoffs.ts';
import { createLeg, type LegView, type PartView } from '../../../shared/contracts/parts-and-legs.ts';
import { AddHandoff } from '../../../src/features/plan/components/handoff-form.tsx';
import { AddLeg } from '../../../src/features/plan/components/leg-form.tsx';
import { fakeServer, newQueryClient, refusal } from '../lib/fake-server.ts';

const id = (nth: number): string => `5b6f2a4e-9b1d-4a55-8b7c-2f0c3e9d1a0${nth}`;

const party = (nth: number, name: string): PartyView => ({
  id: id(nth),
  roles: ['maker'],
  shopId: id(nth),
  displayName: name,
  tint: null,
  seesUntil: null,
  joinedAt: '2026-12-01T08:00:00.000Z',
  people: [],
});
const parties = [party(1, 'Aldgrove'), party(2, 'Tinder Lane'), party(3, 'Weir')];
const hilt: PartView = {
  id: id(5),
  name: 'Hilt',
  kind: 'hilt',
  holderPartyId: id(1),
  holderSince: '2026-12-01',
  position: 0,
  revision: 1,
};
const turning: LegView = {
  id: id(6),
  partyId: id(2),
  partId: id(5),
  kind: 'machining',
  title: 'Turn the hilt',
  state: 'planned',
  plannedStartOn: null,
  startedOn: null,
  finishedOn: null,
  afterLegIds: [],
  position: 0,
  revision: 1,
  held: null,
};

const show = (form: ReactNode) => render(<QueryClientProvider client={newQueryClient()}>{form}</QueryClientProvider>);
const choice = (name: string | RegExp) => screen.getByRole<HTMLSelectElement>('combobox', { name });

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

describe('a form of the plan', () => {
  it('that was begun before there was a part sends the part that it shows', async () => {
    const sent = fakeServer([[createLeg, () => refusal('busy')]]);
    const begun = show(<AddLeg commissionId={id(9)} parties={parties} legs={[]} parts={[]} />);
    await userEvent.type(screen.getByRole('textbox', { name: 'Work' }), 'Turn');
    begun.unmount();
    show(<AddLeg commissionId={id(9)} parties={parties} legs={[]} parts={[hilt]} />);
    expect(choice('Part').selectedOptions[0]?.text).toBe('Hilt');
    await userEvent.click(screen.getByRole('button', { name: 'Add the leg' }));
    await waitFor(() => expect(sent).toHaveLength(1));
    expect(sent[0]?.body).toMatchObject({ title: 'Turn', partId: hilt.id });
  });

  it('of a handoff sends the leg that it shows, also after the side has changed', async () => {
    const sent = fakeServer([[createHandoff, () => refusal('busy')]]);
    show(<AddHandoff commissionId={id(9)} parties={parties} parts={[hilt]} legs={[turning]} mine={new Set([id(2)])} />);
    expect(choice('From').selectedOptions[0]?.text).toBe('Tinder Lane');
    await userEvent.selectOptions(choice(/After the leg/), turning.id);
    await userEvent.selectOptions(choice('From'), id(3));
    await userEvent.click(screen.getByRole('checkbox', { name: 'Hilt' }));
    await userEvent.click(screen.getByRole('button', { name: 'Plan the handoff' }));
    await waitFor(() => expect(sent).toHaveLength(1));
    expect(choice(/After the leg/).selectedOptions[0]?.text).toBe('none');
    expect(sent[0]?.body).toMatchObject({ fromPartyId: id(3), fromLegId: null });
  });

  it('says at its field that a leg needs its days', async () => {
    const sent = fakeServer([]);
    show(<AddLeg commissionId={id(9)} parties={parties} legs={[]} parts={[hilt]} />);
    await userEvent.type(screen.getByRole('textbox', { name: 'Work' }), 'Turn');
    await userEvent.clear(screen.getByRole('textbox', { name: 'Likely, days' }));
    await userEvent.click(screen.getByRole('button', { name: 'Add the leg' }));
    expect(screen.getByRole('textbox', { name: 'Likely, days' })).toBeInvalid();
    await waitFor(() => expect(screen.getByRole('textbox', { name: 'Likely, days' })).toHaveFocus());
    expect(sent).toHaveLength(0);
  });
});
