import * as accounts from './accounts.ts';
import * as commissions from './commissions.ts';
import * as files from './files.ts';
import * as fitReports from './fit-reports.ts';
import * as handoffs from './handoffs.ts';
import * as joints from './joints.ts';
import * as partsAndLegs from './parts-and-legs.ts';
import type { AnyRoute } from './route.ts';
import * as shops from './shops.ts';
import * as standing from './standing.ts';
import * as threads from './threads.ts';

const modules: Record<string, object> = {
  accounts,
  shops,
  commissions,
  'parts-and-legs': partsAndLegs,
  joints,
  'fit-reports': fitReports,
  handoffs,
  threads,
  files,
  standing,
};

const isRoute = (value: unknown): value is AnyRoute =>
  typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'access' in value;

export interface NamedRoute {
  readonly name: string;
  /** The contract file, which groups the routes in the API reference. */
  readonly group: string;
  readonly route: AnyRoute;
}

/** Every route of the product by the name of its constant; tests hold the mounted routes against this list. */
export const ALL_ROUTES: readonly NamedRoute[] = Object.entries(modules).flatMap(([group, exported]) =>
  Object.entries(exported).flatMap(([name, value]: [string, unknown]) =>
    isRoute(value) ? [{ name, group, route: value }] : [],
  ),
);
