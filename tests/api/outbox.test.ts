import { afterAll, beforeAll, expect, it } from 'vitest';
import { inTransaction } from '../../server/db/unit-of-work.ts';
import { OutboxMessage } from '../../server/entities/outbox-message.ts';
import { OutboxRelay, type OutboxKind, type OutgoingMessage } from '../../server/outbox/relay.ts';
import { makeCommissionKit, type CommissionKit } from '../support/commission-kit.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
let kit: CommissionKit;

beforeAll(async () => {
  app = await startTestApp();
  kit = await makeCommissionKit(app);
  await app.stopRelays();
});
afterAll(() => app.close());

const scope = () => ({ db: app.services.db, uow: null, wakeRelay: () => undefined });
const event = () => ({ commissionId: kit.commissionId });

const announce = (count: number) =>
  inTransaction(scope(), async (uow) => {
    for (let one = 0; one < count; one += 1)
      uow.announce('legs.changed', event(), { to: 'everyone', commissionId: kit.commissionId });
    return Promise.resolve();
  });

const unsent = () =>
  app.services.db.manager
    .query<{ count: number }[]>('SELECT count(*)::int AS count FROM "outbox_message" WHERE "sent_at" IS NULL')
    .then(([row]) => row?.count);

/** A relay whose handler writes down what it was given. */
function relayInto(
  sent: string[],
  work: (message: OutgoingMessage) => Promise<void> = () => Promise.resolve(),
  kind: OutboxKind = 'event',
): OutboxRelay {
  const take = async (message: OutgoingMessage): Promise<void> => {
    await work(message);
    sent.push(message.id);
  };
  return new OutboxRelay(app.services.db, app.services.log, kind, take);
}

it('leaves nothing when the transaction is rolled back', async () => {
  const before = await unsent();
  await expect(
    inTransaction(scope(), async (uow) => {
      uow.announce('legs.changed', event(), { to: 'everyone', commissionId: kit.commissionId });
      await uow.flush();
      throw new Error('changed my mind');
    }),
  ).rejects.toThrow('changed my mind');
  expect(await unsent()).toBe(before);
});

it('gives each message to one of two relays, in order, and marks it', async () => {
  await announce(150);
  const [first, second] = [[] as string[], [] as string[]];
  const relays = [relayInto(first), relayInto(second)];
  for (const relay of relays) relay.start();
  await expect.poll(unsent, { timeout: 10_000 }).toBe(0);
  await Promise.all(relays.map((relay) => relay.stop()));
  const all = [...first, ...second];
  expect(new Set(all).size).toBe(all.length);
  expect(all.length).toBeGreaterThanOrEqual(150);
  for (const one of [first, second]) expect([...one].sort((a, b) => Number(a) - Number(b))).toEqual(one);
});

it('sends again what was claimed and not marked, as after a crash, and a letter keeps no token once it is out', async () => {
  const { identifiers } = await app.services.db.manager.insert(OutboxMessage, {
    topic: 'mail:password-reset',
    payload: { letter: 'password-reset', to: 'a@b.test', displayName: 'A', token: 'secret' },
    // A process that died held it under a lease that has run out.
    leasedUntil: new Date(Date.now() - 1000),
    attempts: 1,
  });
  const sent: string[] = [];
  const relay = relayInto(sent, undefined, 'mail');
  relay.start();
  await expect.poll(unsent, { timeout: 10_000 }).toBe(0);
  await relay.stop();
  const id = String(identifiers[0]?.['id']);
  expect(sent).toContain(id);
  const row = await app.services.db.manager.findOneByOrFail(OutboxMessage, { id });
  expect(row.payload).toEqual({});
});

it('tries a message that failed again, later', async () => {
  await announce(1);
  const sent: string[] = [];
  let failures = 0;
  const relay = relayInto(sent, () => {
    failures += 1;
    return failures === 1 ? Promise.reject(new Error('the mail server is away')) : Promise.resolve();
  });
  relay.start();
  await expect.poll(unsent, { timeout: 15_000 }).toBe(0);
  await relay.stop();
  expect(failures).toBe(2);
  expect(sent).toHaveLength(1);
});

it('brings events while a letter waits for a mail server that does not answer', async () => {
  await app.services.db.manager.insert(OutboxMessage, { topic: 'mail:password-reset', payload: {} });
  await announce(3);
  let release = (): void => undefined;
  const silent = new Promise<void>((resolve) => (release = resolve));
  const [letters, events] = [[] as string[], [] as string[]];
  const mail = relayInto(letters, () => silent, 'mail');
  const event = relayInto(events);
  mail.start();
  event.start();
  await expect.poll(() => events.length, { timeout: 10_000 }).toBe(3);
  expect(letters).toEqual([]);
  release();
  await Promise.all([mail.stop(), event.stop()]);
  expect(letters).toHaveLength(1);
});
