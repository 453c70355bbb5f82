import { randomUUID } from 'node:crypto';
import { io, type Socket } from 'socket.io-client';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import * as accounts from '../../shared/contracts/accounts.ts';
import { removeShopMember } from '../../shared/contracts/shops.ts';
import { makeAccount, PASSWORD, signedInAs } from '../factories/account.ts';
import { makeMember, makeShop } from '../factories/shop.ts';
import { letterTo, tokenIn } from '../support/letters.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';
import { TestClient } from '../support/test-client.ts';

const NEW_PASSWORD = 'seven grey herons at dusk';

let app: TestApp;
const sockets: Socket[] = [];
beforeAll(async () => {
  app = await startTestApp();
});
afterEach(() => {
  for (const socket of sockets.splice(0)) socket.disconnect();
});
afterAll(() => app.close());

const openSocket = (client: TestClient, origin = app.origin): Socket => {
  const socket = io(client.baseUrl, {
    transports: ['websocket'],
    reconnection: false,
    extraHeaders: { cookie: client.cookie, origin },
  });
  sockets.push(socket);
  return socket;
};

const connected = (socket: Socket): Promise<void> =>
  new Promise((resolve, reject) => {
    socket.once('connect', resolve);
    socket.once('connect_error', reject);
  });

const cut = (socket: Socket): Promise<string> => new Promise((resolve) => socket.once('disconnect', resolve));

/** A live connection of this browser. */
async function live(client: TestClient): Promise<Socket> {
  const socket = openSocket(client);
  await connected(socket);
  return socket;
}

describe('live connections', () => {
  it('open for someone signed in, from the own pages', async () => {
    const client = await signedInAs(app, await makeAccount(app));
    await connected(openSocket(client));
    await expect(connected(openSocket(client, 'https://elsewhere.test'))).rejects.toThrow();
    await expect(connected(openSocket(new TestClient(app)))).rejects.toThrow('not-signed-in');
  });

  it('are cut when the person signs out everywhere, and do not open again', async () => {
    const [person, bystander] = [await makeAccount(app), await makeAccount(app)];
    const [here, there] = [await signedInAs(app, person), await signedInAs(app, person)];
    const other = await live(await signedInAs(app, bystander));
    const ended = Promise.all((await Promise.all([live(here), live(there)])).map(cut));
    await here.call(accounts.signOutEverywhere);
    expect(await ended).toEqual(['io server disconnect', 'io server disconnect']);
    await expect(connected(openSocket(there))).rejects.toThrow('not-signed-in');
    expect(other.connected).toBe(true);
  });

  it('of a browser do not outlive its sign-out', async () => {
    const client = await signedInAs(app, await makeAccount(app));
    const ended = cut(await live(client));
    await client.call(accounts.signOut);
    expect(await ended).toBe('io server disconnect');
    await expect(connected(openSocket(client))).rejects.toThrow('not-signed-in');
  });

  it('end nothing but themselves with an event that is none, or an acknowledgement that is no function', async () => {
    const client = await signedInAs(app, await makeAccount(app));
    const socket = await live(client);
    const uncaught: unknown[] = [];
    const note = (error: unknown): number => uncaught.push(error);
    const before = process.listeners('unhandledRejection');
    process.removeAllListeners('unhandledRejection');
    process.on('unhandledRejection', note);
    process.on('uncaughtExceptionMonitor', note);
    try {
      socket.emit('thread.enter', {}, 'no function');
      socket.emit('thread.leave', { threadId: randomUUID() }, 7);
      socket.emit('thread.typing');
      expect(await socket.timeout(5000).emitWithAck('thread.leave', { threadId: randomUUID() })).toEqual({ ok: true });
      await new Promise((resolve) => setTimeout(resolve, 100));
      expect(uncaught).toEqual([]);
      expect(socket.connected).toBe(true);
    } finally {
      process.removeAllListeners('unhandledRejection');
      process.off('uncaughtExceptionMonitor', note);
      for (const listener of before) process.on('unhandledRejection', listener);
    }
  });

  it('are cut when the password changes; the browser that changed it may open one again', async () => {
    const person = await makeAccount(app);
    const [here, there] = [await signedInAs(app, person), await signedInAs(app, person)];
    const ended = cut(await live(there));
    await here.call(accounts.changePassword, { body: { currentPassword: PASSWORD, newPassword: NEW_PASSWORD } });
    await ended;
    await expect(connected(openSocket(there))).rejects.toThrow('not-signed-in');
    await connected(openSocket(here));
  });

  it('are cut when a forgotten password is set anew', async () => {
    const person = await makeAccount(app);
    const there = await signedInAs(app, person);
    const ended = cut(await live(there));
    await new TestClient(app).call(accounts.askPasswordReset, { body: { email: person.email } });
    const token = tokenIn(await letterTo(app, person.email));
    await new TestClient(app).call(accounts.completePasswordReset, { body: { token, newPassword: NEW_PASSWORD } });
    await ended;
    await expect(connected(openSocket(there))).rejects.toThrow('not-signed-in');
  });

  it('are cut when the person is taken out of a shop, and open again without its rooms', async () => {
    const shop = await makeShop(app);
    const owner = await signedInAs(app, await makeMember(app, shop, 'owner'));
    const hand = await makeMember(app, shop, 'hand');
    const client = await signedInAs(app, hand);
    const ended = cut(await live(client));
    await owner.call(removeShopMember, { params: { shopId: shop.id, accountId: hand.id } });
    await ended;
    await live(client);
    const inShopRoom = await app.hub.io.in(`key:${shop.id}`).fetchSockets();
    const inOwnRoom = await app.hub.io.in(`key:${hand.id}`).fetchSockets();
    expect(inShopRoom).toHaveLength(0);
    expect(inOwnRoom).toHaveLength(1);
  });
});
