import type { Api } from '../http/api.ts';
import { mountAccounts } from './accounts.ts';
import { mountBench } from './bench.ts';
import { mountCommissions } from './commissions.ts';
import { mountFiles } from './files.ts';
import { mountFitReports } from './fit-reports.ts';
import { mountHandoffs } from './handoffs.ts';
import { mountJoints } from './joints.ts';
import { mountParties } from './parties.ts';
import { mountPartsAndLegs } from './parts-and-legs.ts';
import { mountShops } from './shops.ts';
import { mountStanding } from './standing.ts';
import { mountThreads } from './threads.ts';

/** Mounts every resource. A contract that no file here mounts fails the start-up test. */
export function mountAll(api: Api): void {
  mountAccounts(api);
  mountShops(api);
  mountCommissions(api);
  mountParties(api);
  mountPartsAndLegs(api);
  mountJoints(api);
  mountFitReports(api);
  mountHandoffs(api);
  mountThreads(api);
  mountFiles(api);
  mountStanding(api);
  mountBench(api);
}
