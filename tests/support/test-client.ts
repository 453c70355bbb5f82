import { randomUUID } from 'node:crypto';
import { expect } from 'vitest';
import { API_BASE, type AnyRoute, type RouteInput, type RouteOutput } from '../../shared/contracts/route.ts';
import { problemSchema, type Problem, type ProblemCode } from '../../shared/problems/problems.ts';
import type { TestApp } from './test-app.ts';

/** Problems that any route may answer with, whatever its contract lists. */
const ANYWHERE: readonly ProblemCode[] = [
  'input-invalid',
  'malformed-request',
  'not-signed-in',
  'origin-refused',
  'busy',
  'too-many-tries',
  'too-large',
];

/** Problems that any keyed route may answer with. */
const KEYED: readonly ProblemCode[] = ['idempotency-key-missing', 'idempotency-key-reused'];

export type Outcome<T extends AnyRoute> =
  { ok: true; status: number; body: RouteOutput<T> } | { ok: false; status: number; problem: Problem };

/** Speaks to a test application as a browser of one person would: keeps the cookie, sends the origin. */
export class TestClient {
  readonly #app: TestApp;
  cookie = '';

  constructor(app: TestApp) {
    this.#app = app;
  }

  get baseUrl(): string {
    return `http://127.0.0.1:${this.#app.port}`;
  }

  /** Calls a route and fails the test when a problem's code is not listed in its contract. */
  async try<T extends AnyRoute>(
    route: T,
    input: RouteInput<T> = {} as RouteInput<T>,
    headers: Record<string, string> = {},
  ): Promise<Outcome<T>> {
    const {
      params = {},
      query = {},
      body,
    } = input as { params?: Record<string, string>; query?: Record<string, unknown>; body?: unknown };
    const path = route.path.replace(/:(\w+)/g, (_whole, name: string) => encodeURIComponent(params[name] ?? 'missing'));
    const search = new URLSearchParams(
      Object.entries(query)
        .filter(([, value]) => value !== undefined)
        .map(([name, value]) => [name, String(value)]),
    );
    const response = await fetch(`${this.baseUrl}${API_BASE}${path}${search.size > 0 ? `?${search}` : ''}`, {
      method: route.method,
      headers: {
        origin: this.#app.origin,
        ...(this.cookie ? { cookie: this.cookie } : {}),
        ...(route.method === 'GET' ? {} : { 'content-type': 'application/json' }),
        ...(route.keyed ? { 'idempotency-key': randomUUID() } : {}),
        ...headers,
      },
      ...(route.method === 'GET' ? {} : { body: JSON.stringify(body ?? {}) }),
    });
    const set = response.headers.getSetCookie().find((line) => line.startsWith('ferrule='));
    if (set) this.cookie = set.split(';')[0] ?? '';
    if (!response.ok) {
      expect(response.headers.get('content-type')).toContain('application/problem+json');
      const problem = problemSchema.parse(await response.json());
      expect(
        [...route.problems, ...ANYWHERE, ...(route.keyed ? KEYED : [])],
        `${route.method} ${route.path} answered ${problem.code}`,
      ).toContain(problem.code);
      return { ok: false, status: response.status, problem };
    }
    const answered: unknown = response.status === 204 ? {} : await response.json();
    return { ok: true, status: response.status, body: route.response.parse(answered) as RouteOutput<T> };
  }

  /** Calls a route that must succeed. */
  async call<T extends AnyRoute>(route: T, input: RouteInput<T> = {} as RouteInput<T>): Promise<RouteOutput<T>> {
    const outcome = await this.try(route, input);
    if (!outcome.ok)
      throw new Error(`${route.method} ${route.path}: ${outcome.status} ${JSON.stringify(outcome.problem)}`);
    return outcome.body;
  }

  /** Calls a route that must be refused, and gives the problem. */
  async refused<T extends AnyRoute>(route: T, input: RouteInput<T> = {} as RouteInput<T>): Promise<Problem> {
    const outcome = await this.try(route, input);
    if (outcome.ok)
      throw new Error(`${route.method} ${route.path} was expected to be refused and answered ${outcome.status}`);
    return outcome.problem;
  }
}
