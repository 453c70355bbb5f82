import { generate } from 'otplib';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import * as accounts from '../../shared/contracts/accounts.ts';
import { makeAccount, PASSWORD, signedInAs, type MadeAccount } from '../factories/account.ts';
import { letterTo, tokenIn } from '../support/letters.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';
import { TestClient } from '../support/test-client.ts';

const STEP_S = 30;

let app: TestApp;
/** The application's clock, in seconds; each test starts in the middle of a step, far from the one before. */
let nowS = 1_800_000_015;

const goOn = (seconds: number): void => {
  nowS += seconds;
  app.setNow(new Date(nowS * 1000));
};

beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.close());
beforeEach(() => goOn(100 * STEP_S));

interface Guarded {
  person: MadeAccount;
  client: TestClient;
  secret: string;
  recoveryCodes: string[];
}

const codeOf = (secret: string, atS = nowS): Promise<string> => generate({ secret, epoch: atS });

/** A person with a second factor in force; the clock stands one step after the code that confirmed it. */
async function makeGuarded(): Promise<Guarded> {
  const person = await makeAccount(app);
  const client = await signedInAs(app, person);
  const { secret } = await client.call(accounts.beginSecondFactor);
  const { recoveryCodes } = await client.call(accounts.confirmSecondFactor, { body: { code: await codeOf(secret) } });
  goOn(STEP_S);
  return { person, client, secret, recoveryCodes };
}

/** A browser in which the password was given and the code is asked for. */
async function halfSignedIn(person: MadeAccount): Promise<TestClient> {
  const client = new TestClient(app);
  const { next } = await client.call(accounts.signIn, { body: { email: person.email, password: PASSWORD } });
  expect(next).toBe('second-factor');
  return client;
}

describe('setting up a second factor', () => {
  it('gives a secret, its address and its picture, and keeps the secret sealed', async () => {
    const person = await makeAccount(app);
    const client = await signedInAs(app, person);
    const { secret, uri, qrSvg } = await client.call(accounts.beginSecondFactor);
    expect(uri).toContain(`secret=${secret}`);
    expect(qrSvg).toMatch(/^<svg /);
    const [kept] = await app.services.db.query<{ totp_secret: string }[]>(
      'SELECT "totp_secret" FROM "account" WHERE "id" = $1',
      [person.id],
    );
    expect(kept?.totp_secret).toBeTruthy();
    expect(kept?.totp_secret).not.toContain(secret);
    expect((await client.call(accounts.getMe)).secondFactor).toBe(false);
  });

  it('comes into force with a right code, with ten recovery codes of which only hashes are kept', async () => {
    const { person, client, recoveryCodes } = await makeGuarded();
    expect(new Set(recoveryCodes).size).toBe(10);
    expect(await client.call(accounts.getMe)).toMatchObject({ secondFactor: true, recoveryCodesLeft: 10 });
    const rows = await app.services.db.query<{ code_hash: string }[]>(
      'SELECT "code_hash" FROM "recovery_code" WHERE "account_id" = $1',
      [person.id],
    );
    for (const { code_hash: hash } of rows) expect(hash).toMatch(/^[0-9a-f]{64}$/);
  });

  it('does not come into force with a wrong code', async () => {
    const person = await makeAccount(app);
    const client = await signedInAs(app, person);
    const { secret } = await client.call(accounts.beginSecondFactor);
    const stale = await codeOf(secret, nowS - 10 * STEP_S);
    expect((await client.refused(accounts.confirmSecondFactor, { body: { code: stale } })).code).toBe(
      'credentials-refused',
    );
    await signedInAs(app, person);
  });

  it('is not begun anew while one is in force, and not confirmed where none waits', async () => {
    const { client } = await makeGuarded();
    expect((await client.refused(accounts.beginSecondFactor)).code).toBe('not-in-this-state');
    expect((await client.refused(accounts.confirmSecondFactor, { body: { code: '123456' } })).code).toBe(
      'not-in-this-state',
    );
  });

  it('is confirmed once when two tries come at the same moment', async () => {
    const client = await signedInAs(app, await makeAccount(app));
    const { secret } = await client.call(accounts.beginSecondFactor);
    const body = { code: await codeOf(secret) };
    const outcomes = await Promise.all([1, 2].map(() => client.try(accounts.confirmSecondFactor, { body })));
    expect(outcomes.filter((outcome) => outcome.ok)).toHaveLength(1);
    expect((await client.call(accounts.getMe)).recoveryCodesLeft).toBe(10);
  });

  it('is for the person signed in', async () => {
    const nobody = new TestClient(app);
    const code = { body: { code: '123456' } };
    expect((await nobody.refused(accounts.beginSecondFactor)).code).toBe('not-signed-in');
    expect((await nobody.refused(accounts.confirmSecondFactor, code)).code).toBe('not-signed-in');
    const removal = { body: { ...code.body, password: PASSWORD } };
    expect((await nobody.refused(accounts.removeSecondFactor, removal)).code).toBe('not-signed-in');
  });
});

describe('signing in with a second factor', () => {
  it('opens nothing before the code', async () => {
    const { person, secret } = await makeGuarded();
    const client = await halfSignedIn(person);
    expect((await client.refused(accounts.getMe)).code).toBe('not-signed-in');
    const before = client.cookie;
    expect(await client.call(accounts.giveSecondFactor, { body: { code: await codeOf(secret) } })).toEqual({
      next: 'done',
    });
    expect(client.cookie).not.toBe(before);
    expect((await client.call(accounts.getMe)).id).toBe(person.id);
  });

  it('takes the code as people type it', async () => {
    const { person, secret } = await makeGuarded();
    const code = await codeOf(secret);
    const client = await halfSignedIn(person);
    await client.call(accounts.giveSecondFactor, { body: { code: `${code.slice(0, 3)} ${code.slice(3)} ` } });
  });

  it('does not take a code twice, nor an earlier one after a later one', async () => {
    const { person, secret } = await makeGuarded();
    const code = await codeOf(secret);
    await (await halfSignedIn(person)).call(accounts.giveSecondFactor, { body: { code } });
    const again = await halfSignedIn(person);
    expect((await again.refused(accounts.giveSecondFactor, { body: { code } })).code).toBe('credentials-refused');
    const earlier = await codeOf(secret, nowS - STEP_S);
    expect((await again.refused(accounts.giveSecondFactor, { body: { code: earlier } })).code).toBe(
      'credentials-refused',
    );
  });

  it('takes a code once of two tries at the same moment', async () => {
    const { person, secret } = await makeGuarded();
    const body = { code: await codeOf(secret) };
    const browsers = await Promise.all([halfSignedIn(person), halfSignedIn(person)]);
    const outcomes = await Promise.all(browsers.map((client) => client.try(accounts.giveSecondFactor, { body })));
    expect(outcomes.filter((outcome) => outcome.ok)).toHaveLength(1);
  });

  it('takes each recovery code once, also of two tries at the same moment', async () => {
    const { person, client, recoveryCodes } = await makeGuarded();
    const code = recoveryCodes[3]?.toLowerCase().replaceAll('-', ' ') ?? '';
    const browsers = await Promise.all([halfSignedIn(person), halfSignedIn(person)]);
    const outcomes = await Promise.all(
      browsers.map((browser) => browser.try(accounts.giveSecondFactor, { body: { code } })),
    );
    expect(outcomes.filter((outcome) => outcome.ok)).toHaveLength(1);
    expect((await client.call(accounts.getMe)).recoveryCodesLeft).toBe(9);
    const later = await halfSignedIn(person);
    expect((await later.refused(accounts.giveSecondFactor, { body: { code } })).code).toBe('credentials-refused');
  });

  it('does not take another person’s recovery code', async () => {
    const [one, other] = [await makeGuarded(), await makeGuarded()];
    const client = await halfSignedIn(one.person);
    const problem = await client.refused(accounts.giveSecondFactor, { body: { code: other.recoveryCodes[0] ?? '' } });
    expect(problem.code).toBe('credentials-refused');
    expect((await other.client.call(accounts.getMe)).recoveryCodesLeft).toBe(10);
  });

  it('asks for the password again after ten minutes', async () => {
    const { person, secret } = await makeGuarded();
    const client = await halfSignedIn(person);
    goOn(601);
    const problem = await client.refused(accounts.giveSecondFactor, { body: { code: await codeOf(secret) } });
    expect(problem.code).toBe('credentials-refused');
  });

  it('is nothing without a password first', async () => {
    const { secret } = await makeGuarded();
    const problem = await new TestClient(app).refused(accounts.giveSecondFactor, {
      body: { code: await codeOf(secret) },
    });
    expect(problem.code).toBe('credentials-refused');
  });

  it('ends a half-open sign-in with every session of the account', async () => {
    const { person, client, secret } = await makeGuarded();
    const half = await halfSignedIn(person);
    await client.call(accounts.signOutEverywhere);
    expect((await half.refused(accounts.giveSecondFactor, { body: { code: await codeOf(secret) } })).code).toBe(
      'credentials-refused',
    );
  });
});

describe('taking a second factor off', () => {
  it('needs the password and a code, and takes the recovery codes with it', async () => {
    const { person, client, secret } = await makeGuarded();
    const wrongPassword = { body: { password: 'not the password', code: await codeOf(secret) } };
    expect((await client.refused(accounts.removeSecondFactor, wrongPassword)).code).toBe('credentials-refused');
    const wrongCode = { body: { password: PASSWORD, code: await codeOf(secret, nowS - 20 * STEP_S) } };
    expect((await client.refused(accounts.removeSecondFactor, wrongCode)).code).toBe('credentials-refused');
    expect((await client.call(accounts.getMe)).secondFactor).toBe(true);
    // A refused try does not use the code up.
    await client.call(accounts.removeSecondFactor, { body: { password: PASSWORD, code: await codeOf(secret) } });
    expect(await client.call(accounts.getMe)).toMatchObject({ secondFactor: false, recoveryCodesLeft: 0 });
    await signedInAs(app, person);
  });

  it('can be done with a recovery code, when the authenticator is lost', async () => {
    const { client, recoveryCodes } = await makeGuarded();
    await client.call(accounts.removeSecondFactor, { body: { password: PASSWORD, code: recoveryCodes[0] ?? '' } });
    const { secret } = await client.call(accounts.beginSecondFactor);
    await client.call(accounts.confirmSecondFactor, { body: { code: await codeOf(secret) } });
    expect(await client.call(accounts.getMe)).toMatchObject({ secondFactor: true, recoveryCodesLeft: 10 });
  });

  it('is refused where none is in force', async () => {
    const client = await signedInAs(app, await makeAccount(app));
    const problem = await client.refused(accounts.removeSecondFactor, { body: { password: PASSWORD, code: '123456' } });
    expect(problem.code).toBe('not-in-this-state');
  });

  it('is not done by a forgotten password', async () => {
    const { person } = await makeGuarded();
    await new TestClient(app).call(accounts.askPasswordReset, { body: { email: person.email } });
    const token = tokenIn(await letterTo(app, person.email));
    const newPassword = 'seven grey herons at dusk';
    await new TestClient(app).call(accounts.completePasswordReset, { body: { token, newPassword } });
    const after = await new TestClient(app).call(accounts.signIn, {
      body: { email: person.email, password: newPassword },
    });
    expect(after.next).toBe('second-factor');
  });
});
