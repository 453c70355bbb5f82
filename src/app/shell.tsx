import { useQuery, useSuspenseQuery } from '@tanstack/react-query';
import { lazy, Suspense, useEffect, useRef, useState, useSyncExternalStore } from 'react';
import { Link, NavLink, Outlet, useLocation, useNavigate, useSearchParams } from 'react-router-dom';
import { BrandMark } from '../components/ui/brand-mark.tsx';
import { Notice } from '../components/ui/notice.tsx';
import { Skeleton } from '../components/ui/skeleton.tsx';
import { SkipLink, stripLinkClass, TopStrip } from '../components/ui/top-strip.tsx';
import { useArrival } from '../hooks/use-arrival.ts';
import { isProblem } from '../lib/api.ts';
import { benchQuery } from '../lib/queries/bench.ts';
import { meQuery } from '../lib/queries/me.ts';
import { connectionState, openRealtime } from '../lib/socket.ts';

/** The menu brings its library with it, after the page itself is there. */
const PersonMenu = lazy(() => import('./person-menu.tsx').then((module) => ({ default: module.PersonMenu })));

/** The connection's library comes after the page itself is there. @returns takes it back */
function whenIdle(act: () => void): () => void {
  if (!('requestIdleCallback' in window)) {
    const timer = setTimeout(act, 200);
    return () => clearTimeout(timer);
  }
  const wish = requestIdleCallback(act, { timeout: 2000 });
  return () => cancelIdleCallback(wish);
}

/** "Not connected" is said only when it lasts: a page that has just opened is still connecting. */
const PATIENCE_MS = 4000;

function ConnectionLine() {
  const up = useSyncExternalStore(connectionState.subscribe, connectionState.get);
  const [late, setLate] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLate(!up), up ? 0 : PATIENCE_MS);
    return () => clearTimeout(timer);
  }, [up]);
  return !up && late ? (
    <Notice tone="brass">
      Not connected. What you write is kept, and sent when you try again after the connection is back.
    </Notice>
  ) : null;
}

function Search() {
  const [params] = useSearchParams();
  const navigate = useNavigate();
  const asked = params.get('search') ?? '';
  const field = useRef<HTMLInputElement>(null);
  useEffect(() => {
    if (field.current) field.current.value = asked;
  }, [asked]);
  const find = (): void => {
    const search = field.current?.value.trim() ?? '';
    void navigate({
      pathname: '/commissions',
      search: search === '' ? '' : new URLSearchParams({ search }).toString(),
    });
  };
  return (
    <form
      role="search"
      onSubmit={(event) => {
        event.preventDefault();
        find();
      }}
    >
      <input
        ref={field}
        type="search"
        name="search"
        defaultValue={asked}
        aria-label="Find a piece"
        placeholder="Find a piece, a client or a code"
        className="min-h-thumb w-full rounded border border-edge bg-bone px-3 text-body"
      />
    </form>
  );
}

function Unread() {
  // Not suspended: a bench that cannot be read must not take every other page along.
  const { data } = useQuery(benchQuery());
  return data && data.unreadThreads > 0 ? (
    <Link to="/#unread" className={stripLinkClass(false)}>
      Unread&nbsp;<strong>{data.unreadThreads}</strong>
    </Link>
  ) : null;
}

/** Rooms of one commission are one place: going from one to the next keeps what is around them. */
const placeOf = (pathname: string): string => pathname.split('/').slice(0, 3).join('/');

function Frame() {
  const { pathname } = useLocation();
  const { data: me } = useSuspenseQuery(meQuery());
  const isClientOnly = me.shops.length === 0 && !me.isSteward;
  useArrival();
  useEffect(() => whenIdle(() => void openRealtime()), []);
  return (
    <>
      <SkipLink target="page" />
      <TopStrip
        homeLink={(mark) => (
          <Link to="/" aria-label="Ferrule, to the bench">
            {mark}
          </Link>
        )}
        nav={
          <>
            <NavLink to="/" end className={({ isActive }) => stripLinkClass(isActive)}>
              {isClientOnly ? 'My pieces' : 'My bench'}
            </NavLink>
            <NavLink to="/commissions" className={({ isActive }) => stripLinkClass(isActive)}>
              Commissions
            </NavLink>
          </>
        }
        search={<Search />}
        notices={<Unread />}
        person={
          <Suspense fallback={<span className={stripLinkClass(false)}>{me.displayName}</span>}>
            <PersonMenu />
          </Suspense>
        }
      />
      <ConnectionLine />
      <Suspense
        key={placeOf(pathname)}
        fallback={
          <div className="p-6">
            <Skeleton label="Fetching the page" lines={5} />
          </div>
        }
      >
        <Outlet />
      </Suspense>
    </>
  );
}

/** The frame of every page behind the sign-in. Who is not signed in is on the way to the sign-in page already. */
export function SignedInShell() {
  const { error } = useQuery(meQuery());
  if (isProblem(error, 'not-signed-in')) return null;
  return (
    <Suspense
      fallback={
        <div className="p-6">
          <BrandMark />
        </div>
      }
    >
      <Frame />
    </Suspense>
  );
}
