import { useSuspenseQuery } from '@tanstack/react-query';
import { lazy, Suspense, useEffect, useState, useSyncExternalStore } from 'react';
import { Form, Link, NavLink, Outlet, ScrollRestoration, useSearchParams } from 'react-router-dom';
import { BrandMark } from '../components/ui/brand-mark.tsx';
import { Notice } from '../components/ui/notice.tsx';
import { Skeleton } from '../components/ui/skeleton.tsx';
import { SkipLink, stripLinkClass, TopStrip } from '../components/ui/top-strip.tsx';
import { useArrival } from '../hooks/use-arrival.ts';
import { benchQuery } from '../lib/queries/commissions.ts';
import { meQuery } from '../lib/queries/me.ts';
import { connectionState, openRealtime } from '../lib/socket.ts';

/** The menu brings its library with it, after the page itself is there. */
const PersonMenu = lazy(() => import('./person-menu.tsx').then((module) => ({ default: module.PersonMenu })));

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
  const asked = params.get('search') ?? '';
  return (
    <Form action="/commissions" role="search">
      <input
        key={asked}
        type="search"
        name="search"
        defaultValue={asked}
        aria-label="Find a piece"
        placeholder="Find a piece, a client or a code"
        className="min-h-thumb w-full rounded border border-edge bg-bone px-3 text-body"
      />
    </Form>
  );
}

function Unread() {
  const { data } = useSuspenseQuery(benchQuery());
  return data.unreadThreads > 0 ? (
    <Link to="/" className={stripLinkClass(false)}>
      Unread <strong>{data.unreadThreads}</strong>
    </Link>
  ) : null;
}

function Frame() {
  const { data: me } = useSuspenseQuery(meQuery());
  const isClientOnly = me.shops.length === 0 && !me.isSteward;
  useArrival();
  useEffect(() => void openRealtime(), []);
  return (
    <>
      <ScrollRestoration />
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
        notices={
          <Suspense fallback={null}>
            <Unread />
          </Suspense>
        }
        person={
          <Suspense fallback={<span className={stripLinkClass(false)}>{me.displayName}</span>}>
            <PersonMenu />
          </Suspense>
        }
      />
      <ConnectionLine />
      <Suspense
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

/** The frame of every page behind the sign-in. */
export function SignedInShell() {
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
