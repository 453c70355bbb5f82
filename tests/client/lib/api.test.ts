import { afterEach, describe, expect, it, vi } from 'vitest';
import { updateMe } from '../../../shared/contracts/accounts.ts';
import { listCommissions } from '../../../shared/contracts/commissions.ts';
import { createShop, getShop, updateShop, withdrawShopInvitation } from '../../../shared/contracts/shops.ts';
import { addressOf, api, ApiProblem, isProblem } from '../../../src/lib/api.ts';
import { fakeServer, json, refusal } from './fake-server.ts';

const SHOP = '5b6f2a4e-9b1d-4a55-8b7c-2f0c3e9d1a01';
const shop = {
  id: SHOP,
  name: 'Tinderlane',
  craft: 'Wiring',
  country: 'DE',
  timeZone: 'Europe/Berlin',
  tint: 'brass',
  revision: 3,
  yourRole: 'owner',
};

const caught = async (call: Promise<unknown>): Promise<ApiProblem> => {
  const error: unknown = await call.then(
    () => null,
    (thrown: unknown) => thrown,
  );
  if (!(error instanceof ApiProblem)) throw new Error('No problem was thrown', { cause: error });
  return error;
};

afterEach(() => void vi.unstubAllGlobals());

describe('an address', () => {
  it('carries its parameters encoded, so that no value becomes a path of its own', () => {
    expect(addressOf(getShop, { params: { shopId: 'a/../b?c' } })).toBe('/api/v1/shops/a%2F..%2Fb%3Fc');
  });

  it('carries only the query that was given', () => {
    expect(addressOf(listCommissions, { query: { search: 'salt & oil' } })).toBe(
      '/api/v1/commissions?search=salt+%26+oil',
    );
    expect(addressOf(listCommissions, {})).toBe('/api/v1/commissions');
  });
});

describe('an answer', () => {
  it('is parsed by the contract: what is not listed does not arrive', async () => {
    fakeServer([[getShop, () => json({ ...shop, ratePerHour: 90 })]]);
    const answer = await api(getShop, { params: { shopId: SHOP } });
    expect(answer).toEqual(shop);
  });

  it('of 204 is nothing', async () => {
    fakeServer([[withdrawShopInvitation, () => json(null, 204)]]);
    await expect(api(withdrawShopInvitation, { params: { shopId: SHOP, invitationId: SHOP } })).resolves.toEqual({});
  });

  it('that the contract does not know counts as no answer, and not as data', async () => {
    fakeServer([[getShop, () => json({ ...shop, revision: 'three' })]]);
    expect((await caught(api(getShop, { params: { shopId: SHOP } }))).code).toBe('upstream-unavailable');
  });
});

describe('a refusal', () => {
  it('arrives whole: code, words, each value, and the record as it stands', async () => {
    const errors = [{ pointer: '/body/name', message: 'Write something here' }];
    fakeServer([
      [updateShop, () => refusal('stale-revision', { detail: 'Saved by Ines.', errors, current: { revision: 4 } })],
    ]);
    const problem = await caught(api(updateShop, { params: { shopId: SHOP }, body: { revision: 3 } }));
    expect(problem.code).toBe('stale-revision');
    expect(problem.message).toBe('Saved by Ines.');
    expect(problem.problem.errors).toEqual(errors);
    expect(problem.problem.current).toEqual({ revision: 4 });
    expect(isProblem(problem, 'stale-revision')).toBe(true);
    expect(isProblem(problem, 'busy')).toBe(false);
  });

  it.each([
    ['a page of a proxy', () => new Response('<html>Bad gateway</html>', { status: 502 })],
    ['a page where data was asked for', () => new Response('<!doctype html>', { status: 200 })],
    ['another program’s error', () => json({ message: 'nope' }, 500)],
    ['no network', () => Promise.reject(new TypeError('Failed to fetch'))],
  ])('is made here for %s', async (_what, answer) => {
    fakeServer([[getShop, answer]]);
    const problem = await caught(api(getShop, { params: { shopId: SHOP } }));
    expect(problem.code).toBe('upstream-unavailable');
    expect(problem.message).toContain('kept');
  });

  it('is not made of a call that its own page gave up', async () => {
    const stop = new AbortController();
    fakeServer([[getShop, () => Promise.reject(new DOMException('gone', 'AbortError'))]]);
    stop.abort();
    await expect(api(getShop, { params: { shopId: SHOP } }, { signal: stop.signal })).rejects.toThrow('gone');
  });
});

describe('a request', () => {
  const body = { name: 'Weir', craft: 'Blades', country: 'DE', ownerEmail: 'hana@weir.example' };

  it('carries the given idempotency key where the act makes something', async () => {
    const seen = fakeServer([[createShop, () => json(shop, 201)]]);
    await api(createShop, { body }, { idempotencyKey: 'k-1' });
    await api(createShop, { body });
    expect(seen[0]?.headers.get('idempotency-key')).toBe('k-1');
    expect(seen[1]?.headers.get('idempotency-key')).toMatch(/^[0-9a-f-]{36}$/);
  });

  it('carries none where it makes nothing, and is JSON', async () => {
    const me = {
      id: SHOP,
      email: 'a@b.example',
      displayName: 'A',
      preferredUnit: 'mm',
      timeZone: 'UTC',
      secondFactor: false,
      recoveryCodesLeft: 0,
      isSteward: false,
      shops: [],
    };
    const seen = fakeServer([[updateMe, () => json(me)]]);
    await api(updateMe, { body: { displayName: 'A' } }, { idempotencyKey: 'k-1' });
    expect(seen[0]?.headers.has('idempotency-key')).toBe(false);
    expect(seen[0]?.headers.get('content-type')).toBe('application/json');
    expect(seen[0]?.body).toEqual({ displayName: 'A' });
  });
});
