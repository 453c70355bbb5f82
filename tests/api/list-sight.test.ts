import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { listFitReports } from '../../shared/contracts/fit-reports.ts';
import { listHandoffs } from '../../shared/contracts/handoffs.ts';
import { listJoints } from '../../shared/contracts/joints.ts';
import { listLegs } from '../../shared/contracts/parts-and-legs.ts';
import type { AnyRoute } from '../../shared/contracts/route.ts';
import { listThreads } from '../../shared/contracts/threads.ts';
import { FitReport } from '../../server/entities/fit-report.ts';
import { makeAuthorizationWorld, type AuthorizationWorld, type RoleName } from '../support/authorization-world.ts';
import { startTestApp, type TestApp } from '../support/test-app.ts';

let app: TestApp;
let world: AuthorizationWorld;
beforeAll(async () => {
  app = await startTestApp();
  world = await makeAuthorizationWorld(app);
  const { own } = world.targets;
  await app.services.db.manager.update(FitReport, { id: own.reportId }, { blocking: true, heldLegId: own.legId });
}, 60_000);
afterAll(() => app.close());

/** Who takes part, in the order of the columns below. */
const READERS = ['lead', 'leadHand', 'bookkeeper', 'maker', 'makerHand', 'finisher', 'client', 'guest'] as const;

/**
 * What of each list a reader gets, from the product's roles: `b` both records, `m` the maker's, `f` the finisher's,
 * `-` none. The guest has the merged status and pictures, and none of these.
 */
const SIGHT: readonly [string, AnyRoute, 'legId' | 'jointId' | 'reportId' | 'handoffId' | 'threadId', string][] = [
  ['legs', listLegs, 'legId', 'bbbbbb--'],
  ['joints', listJoints, 'jointId', 'bb-mmf--'],
  ['fit reports', listFitReports, 'reportId', 'bb-mmf--'],
  ['handoffs', listHandoffs, 'handoffId', 'bb-bbb--'],
  ['threads', listThreads, 'threadId', 'bb-mmf--'],
];

const ask = async (role: RoleName, route: AnyRoute): Promise<{ id: string }[]> =>
  (await world.clients[role].call(route, {
    params: { commissionId: world.targets.own.commissionId },
  })) as { id: string }[];

describe.each(SIGHT)('the list of %s', (_name, route, key, row) => {
  it('holds for each reader what their role sees, and never a record of another commission', async () => {
    const letters: string[] = [];
    for (const role of READERS) {
      const ids = (await ask(role, route)).map((record) => record.id);
      const [own, other] = [ids.includes(world.targets.own[key]), ids.includes(world.targets.other[key])];
      letters.push(own && other ? 'b' : own ? 'm' : other ? 'f' : '-');
      expect(ids).not.toContain(world.targets.foreign[key]);
    }
    expect(letters.join('')).toBe(row);
  });
});

it('says to everyone who sees the plan that a leg is held, and by which report only to those who may read that', async () => {
  const { own } = world.targets;
  const held = async (role: RoleName): Promise<unknown> => {
    const legs = await world.clients[role].call(listLegs, { params: { commissionId: own.commissionId } });
    return legs.find((leg) => leg.id === own.legId)?.held;
  };
  const known = { sinceDay: expect.any(String) as string, reportId: own.reportId, title: 'Tight' };
  expect([await held('lead'), await held('maker')]).toEqual([known, known]);
  expect([await held('finisher'), await held('bookkeeper')]).toEqual([
    { sinceDay: known.sinceDay },
    { sinceDay: known.sinceDay },
  ]);
});

it('shows the days that are offered to the two sides and the lead, and to other shops what is agreed alone', async () => {
  const { own } = world.targets;
  const offers = async (role: RoleName): Promise<boolean> => {
    const handoffs = await world.clients[role].call(listHandoffs, { params: { commissionId: own.commissionId } });
    return handoffs.find((handoff) => handoff.id === own.handoffId)?.offers !== undefined;
  };
  expect([await offers('lead'), await offers('maker'), await offers('finisher')]).toEqual([true, true, false]);
});
