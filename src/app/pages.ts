import { lazy, type ComponentType, type LazyExoticComponent } from 'react';
import { matchPath } from 'react-router-dom';

interface PageModule {
  Component: ComponentType;
}

/** A page of the product: its path below its parent, and its module, which is fetched when the page is first opened. */
export interface LazyPage {
  readonly path: string;
  readonly load: () => Promise<PageModule>;
  readonly Page: LazyExoticComponent<ComponentType>;
}

const page = (path: string, load: () => Promise<PageModule>): LazyPage => ({
  path,
  load,
  Page: lazy(() => load().then(({ Component }) => ({ default: Component }))),
});

/** In front of the sign-in. */
export const DOORS = [
  page('/sign-in', () => import('./routes/sign-in.tsx')),
  page('/reset', () => import('./routes/reset.tsx')),
  page('/invitation', () => import('./routes/invitation.tsx')),
];

/** Behind the sign-in. */
export const PAGES = [
  page('/', () => import('./routes/bench.tsx')),
  page('/commissions', () => import('./routes/commissions.tsx')),
  page('/commissions/new', () => import('./routes/commission-new.tsx')),
  page('/account', () => import('./routes/account.tsx')),
  page('/shops', () => import('./routes/shops.tsx')),
  page('/shops/:shopId', () => import('./routes/shop.tsx')),
  page('/api-reference', () => import('./routes/api-reference.tsx')),
  page('*', () => import('./routes/not-found.tsx')),
];

/** Headline and rooms of one commission, around each of `ROOMS`. */
export const COMMISSION = page('/commissions/:commissionId', () => import('./routes/commission-layout.tsx'));

export const ROOMS = [
  page('', () => import('./routes/room.tsx')),
  page('plan', () => import('./routes/plan.tsx')),
  page('parties', () => import('./routes/parties.tsx')),
  page('joints/:jointId', () => import('./routes/joint.tsx')),
  page('reports/:reportId', () => import('./routes/report.tsx')),
  page('handoffs/:handoffId', () => import('./routes/handoff.tsx')),
  page('threads', () => import('./routes/threads.tsx')),
  page('threads/:threadId', () => import('./routes/thread.tsx')),
  page('pictures', () => import('./routes/pictures.tsx')),
  page('history', () => import('./routes/history.tsx')),
  page('edit', () => import('./routes/commission-edit.tsx')),
];

/** Fetches the modules of an address all at once, where rendering would ask for one after another. */
export function fetchPagesOf(pathname: string): void {
  const rooms = ROOMS.map((room) => ({ ...room, path: `${COMMISSION.path}/${room.path}` }));
  const found = [...DOORS, ...PAGES, ...rooms].filter(({ path }) => path !== '*' && matchPath(path, pathname));
  const around = matchPath({ path: COMMISSION.path, end: false }, pathname) ? [COMMISSION] : [];
  // A module that cannot be fetched is told where the page is rendered.
  for (const { load } of [...found, ...around]) load().catch(() => undefined);
}
