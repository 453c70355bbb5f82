import { Suspense } from 'react';
import { NavLink, Outlet, useLocation } from 'react-router-dom';
import { Page } from '../../components/ui/page.tsx';
import { Sheet } from '../../components/ui/sheet.tsx';
import { Skeleton } from '../../components/ui/skeleton.tsx';
import { MakersBand } from '../../features/commissions/components/commission-band.tsx';
import { CommissionHeading } from '../../features/commissions/components/commission-heading.tsx';
import { mayDo } from '../../../shared/abilities/ability.ts';
import { useSight } from '../../hooks/use-membership.ts';
import { usePathId } from '../use-path-id.ts';

const roomLink = ({ isActive }: { isActive: boolean }): string =>
  `inline-flex min-h-thumb items-center border-b-2 px-1 ${isActive ? 'border-brass font-semibold' : 'border-transparent text-lead-grey'}`;

/** Headline, band, and the way to each room; the room itself is the child route. */
export function Component() {
  const commissionId = usePathId('commissionId');
  const { pathname } = useLocation();
  const { ability, isClient, roles } = useSight(commissionId);
  const works =
    mayDo(ability, 'read', 'Joint', { commissionId, holePartyId: '', shaftPartyId: '' }) ||
    ['lead', 'maker', 'finisher', 'installer'].some((role) => roles.has(role as 'lead'));
  const isLead = roles.has('lead');
  const base = `/commissions/${commissionId}`;
  return (
    <Page>
      <CommissionHeading commissionId={commissionId} forClient={isClient} />
      {works && (pathname === base || pathname === `${base}/plan`) && (
        <div className="mb-5">
          <Sheet title="The way of the piece">
            <MakersBand commissionId={commissionId} title="The way of the piece from brief to delivery" />
          </Sheet>
        </div>
      )}
      <nav
        data-rooms=""
        aria-label="Rooms of this commission"
        className="mb-5 flex flex-wrap gap-x-5 border-b border-hairline"
      >
        <NavLink end to={base} className={roomLink}>
          {isClient ? 'Your window' : isLead ? "Lead's desk" : works ? 'Bench' : 'Where it stands'}
        </NavLink>
        {works && (
          <NavLink to={`${base}/plan`} className={roomLink}>
            Plan
          </NavLink>
        )}
        {(works || isClient) && (
          <NavLink to={`${base}/threads`} className={roomLink}>
            Threads
          </NavLink>
        )}
        {mayDo(ability, 'read', 'Pictures', { commissionId }) && (
          <NavLink to={`${base}/pictures`} className={roomLink}>
            Pictures
          </NavLink>
        )}
        {(works || isClient) && (
          <NavLink to={`${base}/parties`} className={roomLink}>
            Who takes part
          </NavLink>
        )}
        {(works || isClient) && (
          <NavLink to={`${base}/history`} className={roomLink}>
            What happened
          </NavLink>
        )}
        {isLead && (
          <NavLink to={`${base}/edit`} className={roomLink}>
            Brief and state
          </NavLink>
        )}
      </nav>
      <Suspense key={pathname} fallback={<Skeleton label="Fetching the room" lines={4} />}>
        <Outlet />
      </Suspense>
    </Page>
  );
}
