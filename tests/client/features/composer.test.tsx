import { QueryClientProvider } from '@tanstack/react-query';
import { act, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { postMessage, type MessageView } from '../../../shared/contracts/threads.ts';
import { Composer } from '../../../src/features/threads/components/composer.tsx';
import { fakeServer, inTurn, json, newQueryClient } from '../lib/fake-server.ts';

const ID = '5b6f2a4e-9b1d-4a55-8b7c-2f0c3e9d1a01';

const stored: MessageView = {
  id: ID,
  sequence: 1,
  authorAccountId: ID,
  authorName: 'Ines',
  authorPartyId: ID,
  body: 'one',
  mentionedAccountIds: [],
  files: [],
  at: '2026-12-01T12:00:00.000Z',
};

const open = () =>
  render(
    <QueryClientProvider client={newQueryClient()}>
      <Composer
        commissionId={ID}
        threadId={ID}
        audience="All makers"
        readers={[]}
        onTyped={() => undefined}
        onSent={() => undefined}
      />
    </QueryClientProvider>,
  );
const field = () => screen.getByRole<HTMLTextAreaElement>('textbox', { name: 'Write' });
const send = () => userEvent.click(screen.getByRole('button', { name: 'Send' }));
const idOf = (body: unknown): string => (body as { id: string }).id;

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

describe('a message being written', () => {
  it('loses nothing that was typed while the one before was on its way', async () => {
    let release = (): void => undefined;
    const answer = new Promise<Response>((resolve) => (release = () => resolve(json(stored, 201))));
    fakeServer([[postMessage, () => answer]]);
    open();
    await userEvent.type(field(), 'one');
    await send();
    await userEvent.type(field(), ' and two');
    act(release);
    await waitFor(() => expect(field().value).toBe('and two'));
  });

  it('that was not answered is sent again under its own id', async () => {
    const sent = fakeServer([
      [
        postMessage,
        inTurn(
          () => Promise.reject(new TypeError('cut')),
          () => json(stored, 201),
        ),
      ],
    ]);
    open();
    await userEvent.type(field(), 'one');
    await send();
    await screen.findByRole('alert');
    await send();
    await waitFor(() => expect(field().value).toBe(''));
    expect(idOf(sent[1]?.body)).toBe(idOf(sent[0]?.body));
  });

  it('that was changed after a try is another message, so that the first cannot swallow it', async () => {
    const sent = fakeServer([
      [
        postMessage,
        inTurn(
          () => Promise.reject(new TypeError('cut')),
          () => json(stored, 201),
        ),
      ],
    ]);
    open();
    await userEvent.type(field(), 'one');
    await send();
    await screen.findByRole('alert');
    await userEvent.type(field(), ', or rather two');
    await send();
    await waitFor(() => expect(field().value).toBe(''));
    expect(sent[1]?.body).toMatchObject({ body: 'one, or rather two' });
    expect(idOf(sent[1]?.body)).not.toBe(idOf(sent[0]?.body));
  });
});
