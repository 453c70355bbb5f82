import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as accounts from '../../shared/contracts/accounts.ts';
import { makeAccount, PASSWORD } from '../factories/account.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';
import { TestClient } from '../support/test-client.ts';

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ RELAXED_LIMITS: '0', TRUST_PROXY: '1' });
});
afterAll(() => app.close());

let lastAddress = 0;
/** An address that no other test here uses. */
const newAddress = (): string => `192.0.2.${(lastAddress += 1)}`;

const from = (address: string): Record<string, string> => ({ 'x-forwarded-for': address });

/** Tries to sign in and gives the answer's status. */
async function trySignIn(email: string, password: string, address: string): Promise<number> {
  return (await new TestClient(app).try(accounts.signIn, { body: { email, password } }, from(address))).status;
}

/** Seconds to wait that a right password is answered with. */
async function waitOf(email: string, address: string): Promise<number> {
  const body = { email, password: PASSWORD };
  const outcome = await new TestClient(app).try(accounts.signIn, { body }, from(address));
  return outcome.ok ? 0 : (outcome.problem.retry_after_s ?? 0);
}

/** Lets the waits of every key run out. */
const letWaitsEnd = (): Promise<unknown> =>
  app.services.db.query(`UPDATE "rate_limit" SET "expire" = 0 WHERE "key" NOT LIKE '%-waits:%'`);

describe('limits at the door', () => {
  it('let five tries through and then make this address wait for this account', async () => {
    const [person, other] = [await makeAccount(app), await makeAccount(app)];
    const [here, elsewhere] = [newAddress(), newAddress()];
    for (let number = 1; number <= 5; number += 1) expect(await trySignIn(person.email, 'wrong', here)).toBe(401);
    const refused = await new TestClient(app).try(
      accounts.signIn,
      { body: { email: person.email, password: PASSWORD } },
      from(here),
    );
    expect(refused).toMatchObject({ ok: false, status: 429, problem: { code: 'too-many-tries', retry_after_s: 60 } });
    // A stranger's tries lock nobody out: not the owner at another address, nor someone else at this one.
    expect(await trySignIn(person.email, PASSWORD, elsewhere)).toBe(200);
    expect(await trySignIn(other.email, PASSWORD, here)).toBe(200);
  });

  it('count the same for an account that is not there', async () => {
    const here = newAddress();
    for (let number = 1; number <= 5; number += 1) expect(await trySignIn('none@bench.test', 'wrong', here)).toBe(401);
    expect(await trySignIn('none@bench.test', 'wrong', here)).toBe(429);
  });

  it('wait longer each time', async () => {
    const person = await makeAccount(app);
    const here = newAddress();
    const waits: number[] = [];
    for (let round = 1; round <= 8; round += 1) {
      for (let number = 1; number <= 5; number += 1) expect(await trySignIn(person.email, 'wrong', here)).toBe(401);
      const [told, later] = [await waitOf(person.email, here), await waitOf(person.email, here)];
      waits.push(told);
      // The next try hears the rest of the same wait.
      expect(later).toBeLessThanOrEqual(told);
      expect(later).toBeGreaterThan(told - 20);
      await letWaitsEnd();
    }
    expect(waits).toEqual([60, 120, 240, 480, 960, 1920, 3600, 3600]);
  });

  it('do not run out while a wait is on, however often it is tried', async () => {
    const person = await makeAccount(app);
    const here = newAddress();
    for (let number = 1; number <= 6; number += 1) await trySignIn(person.email, 'wrong', here);
    for (let number = 1; number <= 4; number += 1) expect(await trySignIn(person.email, PASSWORD, here)).toBe(429);
    await letWaitsEnd();
    expect(await trySignIn(person.email, PASSWORD, here)).toBe(200);
  });

  it('forget the tries after a success', async () => {
    const person = await makeAccount(app);
    const here = newAddress();
    for (let round = 1; round <= 3; round += 1) {
      for (let number = 1; number <= 4; number += 1) expect(await trySignIn(person.email, 'wrong', here)).toBe(401);
      expect(await trySignIn(person.email, PASSWORD, here)).toBe(200);
    }
  });

  it('stop one address that walks through many accounts', async () => {
    const here = newAddress();
    const statuses: number[] = [];
    for (let number = 1; number <= 61; number += 1)
      statuses.push(await trySignIn(`walk-${number}@bench.test`, 'wrong', here));
    expect(statuses.slice(0, 60).every((status) => status === 401)).toBe(true);
    expect(statuses[60]).toBe(429);
  });

  it('hold for the second factor', async () => {
    const person = await makeAccount(app);
    const client = new TestClient(app);
    await app.services.db.query(`UPDATE "account" SET "totp_confirmed_at" = now() WHERE "id" = $1`, [person.id]);
    await client.try(accounts.signIn, { body: { email: person.email, password: PASSWORD } }, from(newAddress()));
    const statuses: number[] = [];
    for (let number = 1; number <= 6; number += 1)
      statuses.push((await client.try(accounts.giveSecondFactor, { body: { code: '123456' } })).status);
    expect(statuses).toEqual([401, 401, 401, 401, 401, 429]);
  });

  it('hold for reset letters to one address, wherever they are asked for', async () => {
    const person = await makeAccount(app);
    const statuses: number[] = [];
    for (let number = 1; number <= 4; number += 1) {
      const ask = { body: { email: person.email } };
      statuses.push((await new TestClient(app).try(accounts.askPasswordReset, ask, from(newAddress()))).status);
    }
    expect(statuses).toEqual([202, 202, 202, 429]);
  });

  it('hold for links that are guessed', async () => {
    const here = newAddress();
    const statuses: number[] = [];
    for (let number = 1; number <= 31; number += 1) {
      const body = { token: `guess-${number}-${'x'.repeat(30)}` };
      statuses.push((await new TestClient(app).try(accounts.previewInvitation, { body }, from(here))).status);
    }
    expect(statuses.slice(0, 30).every((status) => status === 410)).toBe(true);
    expect(statuses[30]).toBe(429);
  });

  it('take the longest address there can be', async () => {
    const email = `${'a'.repeat(60)}@${'b'.repeat(60)}.${'c'.repeat(60)}.${'d'.repeat(60)}.test`;
    expect(email.length).toBeGreaterThan(240);
    expect(await trySignIn(email, 'wrong', newAddress())).toBe(401);
    const ask = await new TestClient(app).try(accounts.askPasswordReset, { body: { email } }, from(newAddress()));
    expect(ask.status).toBe(202);
  });

  it('are counted in the database without anyone’s address', async () => {
    const rows = await app.services.db.query<{ key: string }[]>('SELECT "key" FROM "rate_limit"');
    expect(rows.length).toBeGreaterThan(10);
    for (const { key } of rows) expect(key).not.toMatch(/@|192\.0\.2/);
  });
});
