import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, type RenderResult } from '@testing-library/react';
import { createElement, Suspense, type ReactNode } from 'react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { vi } from 'vitest';
import { API_BASE, type AnyRoute } from '../../../shared/contracts/route.ts';
import { PROBLEMS, problemType, type Problem, type ProblemCode } from '../../../shared/problems/problems.ts';

export interface SeenRequest {
  method: string;
  path: string;
  body: unknown;
  headers: Headers;
}

/** What stands in for the server: an answer per request, in the order asked for. */
export type Answer = (request: SeenRequest) => Response | Promise<Response>;

export const json = (body: unknown, status = 200): Response =>
  new Response(status === 204 ? null : JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/json' },
  });

export const refusal = (code: ProblemCode, more: Partial<Problem> = {}): Response =>
  json({ type: problemType(code), ...PROBLEMS[code], code, instance: 'urn:test', ...more }, PROBLEMS[code].status);

const matches = (route: AnyRoute, request: SeenRequest): boolean =>
  route.method === request.method &&
  new RegExp(`^${API_BASE}${route.path.replace(/:\w+/g, '[^/]+')}$`).test(request.path);

/** Answers `fetch` by route of the contracts. A request that no answer is given for fails the test that made it. */
export function fakeServer(answers: readonly (readonly [AnyRoute, Answer])[]): SeenRequest[] {
  const seen: SeenRequest[] = [];
  vi.stubGlobal('fetch', (address: string, init: RequestInit = {}) => {
    const request: SeenRequest = {
      method: init.method ?? 'GET',
      path: address.split('?')[0] ?? '',
      body: typeof init.body === 'string' ? JSON.parse(init.body) : undefined,
      headers: new Headers(init.headers),
    };
    seen.push(request);
    const answer = answers.find(([route]) => matches(route, request))?.[1];
    if (!answer) throw new Error(`No answer for ${request.method} ${request.path}`);
    return Promise.resolve(answer(request));
  });
  return seen;
}

/** Gives one answer after the other, the last one for ever. */
export const inTurn = (...answers: readonly Answer[]): Answer => {
  let count = 0;
  return (request) => {
    const answer = answers[Math.min(count, answers.length - 1)];
    count += 1;
    if (!answer) throw new Error('No answers were given');
    return answer(request);
  };
};

export const newQueryClient = (): QueryClient => new QueryClient({ defaultOptions: { queries: { retry: false } } });

/** Renders as the application does, inside a query client and a router. */
export function renderPage(page: ReactNode, queryClient = newQueryClient()): RenderResult {
  const router = createMemoryRouter([{ path: '*', element: createElement(Suspense, { fallback: 'Fetching' }, page) }]);
  return render(createElement(QueryClientProvider, { client: queryClient }, createElement(RouterProvider, { router })));
}
