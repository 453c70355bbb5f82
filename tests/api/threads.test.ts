import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as contracts from '../../shared/contracts/threads.ts';
import type { MessageView, postMessage } from '../../shared/contracts/threads.ts';
import { OutboxMessage } from '../../server/entities/outbox-message.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';
import { expelParty, makeCommissionKit, makeThread, type CommissionKit } from '../support/commission-kit.ts';
import { connected, nextEvent, openSocket } from '../support/socket-client.ts';
import type { TestClient } from '../support/test-client.ts';

let app: TestApp;
let kit: CommissionKit;

beforeAll(async () => {
  app = await startTestApp();
  kit = await makeCommissionKit(app);
});
afterAll(() => app.close());

const write = (client: TestClient, threadId: string, body: string, id = randomUUID()): Promise<MessageView> =>
  client.call<typeof postMessage>(contracts.postMessage, {
    params: { commissionId: kit.commissionId, threadId },
    body: { id, body },
  });

const read = async (client: TestClient, threadId: string, query = {}): Promise<MessageView[]> =>
  (await client.call(contracts.listMessages, { params: { commissionId: kit.commissionId, threadId }, query })).messages;

describe('audience', () => {
  it.each([
    ['everyone', ['lead', 'maker', 'finisher', 'client']],
    ['makers', ['lead', 'maker', 'finisher']],
    ['named', ['lead', 'maker']],
    ['own-shop', ['maker']],
  ] as const)('a thread for %s is read by %j and by nobody else', async (audience, readers) => {
    const threadId = await makeThread(
      app,
      kit,
      audience,
      audience === 'named' || audience === 'own-shop' ? [kit.maker.partyId] : [],
    );
    for (const who of ['lead', 'maker', 'finisher', 'client'] as const) {
      const outcome = await kit[who].client.try(contracts.listMessages, {
        params: { commissionId: kit.commissionId, threadId },
      });
      expect([who, outcome.status]).toEqual([who, (readers as readonly string[]).includes(who) ? 200 : 404]);
      const listed = await kit[who].client.call(contracts.listThreads, { params: { commissionId: kit.commissionId } });
      expect(listed.some((thread) => thread.id === threadId)).toBe((readers as readonly string[]).includes(who));
    }
  });

  it('is fixed when the thread is opened, and a client opens none that leaves themselves out', async () => {
    const params = { commissionId: kit.commissionId };
    const subject = { subject: 'commission' as const, subjectId: kit.commissionId, title: 'A word' };
    const opened = await kit.maker.client.call(contracts.openThread, {
      params,
      body: { ...subject, audience: 'named', partyIds: [kit.finisher.partyId] },
    });
    expect([...opened.partyIds].sort()).toEqual([kit.finisher.partyId, kit.maker.partyId].sort());
    const refusal = await kit.client.client.refused(contracts.openThread, {
      params,
      body: { ...subject, audience: 'makers' },
    });
    expect(refusal.code).toBe('not-permitted');
    const elsewhere = await kit.maker.client.refused(contracts.openThread, {
      params,
      body: { ...subject, audience: 'named', partyIds: [randomUUID()] },
    });
    expect(elsewhere.errors?.[0]?.pointer).toBe('/body/partyIds/0');
  });
});

describe('messages', () => {
  it('are stored once and in one order, whatever is resent', async () => {
    const threadId = await makeThread(app, kit, 'makers');
    const ids = Array.from({ length: 30 }, () => randomUUID());
    const writers = [kit.lead.client, kit.maker.client, kit.finisher.client];
    // Each message is sent three times at once, by one writer.
    await Promise.all(
      ids.flatMap((id, index) =>
        [0, 1, 2].map(() => write(writers[index % 3] ?? kit.lead.client, threadId, `message ${index}`, id)),
      ),
    );
    const stored = await read(kit.lead.client, threadId, { limit: 200 });
    expect(stored.map((message) => message.sequence)).toEqual(ids.map((_id, index) => index + 1));
    expect(stored.map((message) => message.id).sort()).toEqual([...ids].sort());
    const announced = await app.services.db.manager.query<{ count: string }[]>(
      `SELECT count(*) FROM "outbox_message" WHERE "topic" = 'event:thread.message-added' AND ("sent_at" IS NOT NULL OR "payload"->'event'->>'threadId' = $1)`,
      [threadId],
    );
    expect(Number(announced[0]?.count)).toBeGreaterThanOrEqual(ids.length);
  });

  it('of another thread keep their id to themselves', async () => {
    const [first, second] = [await makeThread(app, kit, 'makers'), await makeThread(app, kit, 'makers')];
    const id = randomUUID();
    await write(kit.maker.client, first, 'once', id);
    const refusal = await kit.maker.client.refused(contracts.postMessage, {
      params: { commissionId: kit.commissionId, threadId: second },
      body: { id, body: 'again' },
    });
    expect(refusal.code).toBe('already-there');
    expect(await read(kit.maker.client, second)).toEqual([]);
  });

  it('come in pages by sequence, forwards and backwards', async () => {
    const threadId = await makeThread(app, kit, 'makers');
    for (let count = 1; count <= 7; count += 1) await write(kit.lead.client, threadId, `line ${count}`);
    const sequences = async (query: object): Promise<number[]> =>
      (await read(kit.lead.client, threadId, query)).map((message) => message.sequence);
    expect(await sequences({ limit: 3 })).toEqual([5, 6, 7]);
    expect(await sequences({ before: 5, limit: 3 })).toEqual([2, 3, 4]);
    expect(await sequences({ after: 2, limit: 3 })).toEqual([3, 4, 5]);
    expect(await sequences({ after: 7 })).toEqual([]);
  });

  it('name only people who read them, and count as unread mentions for those', async () => {
    const threadId = await makeThread(app, kit, 'makers');
    const params = { commissionId: kit.commissionId, threadId };
    const refusal = await kit.lead.client.refused(contracts.postMessage, {
      params,
      body: { id: randomUUID(), body: 'Look', mentionedAccountIds: [kit.client.person.id] },
    });
    expect(refusal.errors?.[0]?.pointer).toBe('/body/mentionedAccountIds/0');
    await kit.lead.client.call(contracts.postMessage, {
      params,
      body: { id: randomUUID(), body: 'Look', mentionedAccountIds: [kit.maker.person.id] },
    });
    const mine = async () =>
      (await kit.maker.client.call(contracts.listThreads, { params: { commissionId: kit.commissionId } })).find(
        (thread) => thread.id === threadId,
      );
    expect(await mine()).toMatchObject({ lastSequence: 1, readSequence: 0, unreadMentions: 1 });
    await kit.maker.client.call(contracts.markThreadRead, { params, body: { readSequence: 99 } });
    expect(await mine()).toMatchObject({ readSequence: 1, unreadMentions: 0 });
    await kit.maker.client.call(contracts.markThreadRead, { params, body: { readSequence: 0 } });
    expect(await mine()).toMatchObject({ readSequence: 1 });
  });

  it('say what is wrong with an empty one, at its field', async () => {
    const threadId = await makeThread(app, kit, 'makers');
    const refusal = await kit.lead.client.refused(contracts.postMessage, {
      params: { commissionId: kit.commissionId, threadId },
      body: { id: randomUUID(), body: '   ' },
    });
    expect(refusal).toMatchObject({ status: 422, code: 'input-invalid', errors: [{ pointer: '/body/body' }] });
    expect(await read(kit.lead.client, threadId)).toEqual([]);
  });
});

describe('the live connection', () => {
  it('is refused without a session and from another origin', async () => {
    await expect(connected(openSocket({ cookie: '' }, app.port, app.origin))).rejects.toThrow('not-signed-in');
    await expect(connected(openSocket(kit.lead.client, app.port, 'http://elsewhere.test'))).rejects.toThrow();
  });

  it('tells readers of a message and nobody else, and says who is here', async () => {
    const threadId = await makeThread(app, kit, 'makers');
    const [maker, client, lead] = [kit.maker, kit.client, kit.lead].map(({ client: person }) =>
      openSocket(person, app.port, app.origin),
    );
    if (!maker || !client || !lead) throw new Error('no sockets');
    await Promise.all([maker, client, lead].map(connected));
    const enter = { commissionId: kit.commissionId, threadId };
    expect(await client.emitWithAck('thread.enter', enter)).toEqual({ ok: false, code: 'not-found' });
    const presence = nextEvent<{ people: { accountId: string }[] }>(maker, 'thread.presence');
    expect(await maker.emitWithAck('thread.enter', enter)).toEqual({ ok: true });
    expect((await presence)?.people.map((person) => person.accountId)).toEqual([kit.maker.person.id]);
    const [heard, notHeard] = [
      nextEvent<{ sequence: number }>(maker, 'thread.message-added'),
      nextEvent(client, 'thread.message-added', 700),
    ];
    await write(kit.lead.client, threadId, 'only for makers');
    expect((await heard)?.sequence).toBe(1);
    expect(await notHeard).toBeNull();
    for (const socket of [maker, client, lead]) socket.disconnect();
  });

  it('is lost at once by a party that is taken out: no event, no thread, no page', async () => {
    const mine = await makeCommissionKit(app);
    const threadId = await makeThread(app, mine, 'makers');
    const socket = openSocket(mine.finisher.client, app.port, app.origin);
    await connected(socket);
    const enter = { commissionId: mine.commissionId, threadId };
    expect(await socket.emitWithAck('thread.enter', enter)).toEqual({ ok: true });
    await expelParty(app, mine, mine.finisher);
    const told = nextEvent(socket, 'membership.changed');
    await app.services.db.manager.insert(OutboxMessage, {
      topic: 'event:membership.changed',
      payload: { event: { commissionId: mine.commissionId }, audience: { to: 'keys', keys: [mine.finisher.shopId] } },
    });
    app.services.wakeRelay();
    expect(await told).toMatchObject({ commissionId: mine.commissionId });
    const silence = Promise.all([
      nextEvent(socket, 'thread.message-added', 700),
      nextEvent(socket, 'thread.presence', 700),
    ]);
    await mine.lead.client.call(contracts.postMessage, { params: enter, body: { id: randomUUID(), body: 'after' } });
    expect(await silence).toEqual([null, null]);
    expect(await socket.emitWithAck('thread.enter', enter)).toEqual({ ok: false, code: 'not-found' });
    expect((await mine.finisher.client.try(contracts.listMessages, { params: enter })).status).toBe(404);
    socket.disconnect();
  });
});
