import { Suspense, type ComponentType, type ReactNode } from 'react';
import { ErrorBoundary, type FallbackProps } from 'react-error-boundary';
import { Route, Routes, useLocation } from 'react-router-dom';
import { COMMISSION, DOORS, PAGES, ROOMS, type LazyPage } from './pages.ts';
import { PageProblem, RoomProblem } from './route-problem.tsx';
import { SignedInShell } from './shell.tsx';

/** A page that fails says so in its own place; going elsewhere tries anew. */
function Guarded({ problem, children }: { problem: ComponentType<FallbackProps>; children: ReactNode }) {
  const { pathname } = useLocation();
  return (
    <ErrorBoundary FallbackComponent={problem} resetKeys={[pathname]}>
      {children}
    </ErrorBoundary>
  );
}

const routeOf =
  (problem: ComponentType<FallbackProps>) =>
  ({ path, Page }: LazyPage) => (
    <Route
      key={path}
      {...(path === '' ? { index: true } : { path })}
      element={
        <Guarded problem={problem}>
          <Page />
        </Guarded>
      }
    />
  );

/** Every address of the product. */
export function Router() {
  return (
    <Suspense fallback={null}>
      <Routes>
        {DOORS.map(routeOf(PageProblem))}
        <Route
          element={
            <Guarded problem={PageProblem}>
              <SignedInShell />
            </Guarded>
          }
        >
          {PAGES.map(routeOf(PageProblem))}
          <Route
            path={COMMISSION.path}
            element={
              <Guarded problem={PageProblem}>
                <COMMISSION.Page />
              </Guarded>
            }
          >
            {ROOMS.map(routeOf(RoomProblem))}
          </Route>
        </Route>
      </Routes>
    </Suspense>
  );
}
