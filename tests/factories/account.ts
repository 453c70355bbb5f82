import { randomUUID } from 'node:crypto';
import { signIn } from '../../shared/contracts/accounts.ts';
import { Account } from '../../server/entities/account.ts';
import { hashPassword } from '../../server/security/passwords.ts';
import type { TestApp } from '../support/test-app.ts';
import { TestClient } from '../support/test-client.ts';

export const PASSWORD = 'salt lantern oil and brass';

/** Hashed once: a hash takes 50 ms of one core. */
let passwordHash: Promise<string> | undefined;

export interface MadeAccount {
  id: string;
  email: string;
  displayName: string;
}

/** An account whose password is `PASSWORD`. */
export async function makeAccount(app: TestApp, overrides: Partial<Account> = {}): Promise<MadeAccount> {
  const id = overrides.id ?? randomUUID();
  const account = {
    id,
    email: `person-${id.slice(0, 8)}@bench.test`,
    displayName: `Person ${id.slice(0, 4)}`,
    passwordHash: await (passwordHash ??= hashPassword(PASSWORD)),
    timeZone: 'Europe/Berlin',
    ...overrides,
  };
  await app.services.db.manager.insert(Account, account);
  return { id, email: account.email, displayName: account.displayName };
}

/** A browser in which this person is signed in. */
export async function signedInAs(app: TestApp, person: { email: string }, password = PASSWORD): Promise<TestClient> {
  const client = new TestClient(app);
  await client.call(signIn, { body: { email: person.email, password } });
  return client;
}
