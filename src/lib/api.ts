import { API_BASE, type AnyRoute, type RouteInput, type RouteOutput } from '../../shared/contracts/route.ts';
import { pointersOf } from '../../shared/problems/pointers.ts';
import {
  PROBLEMS,
  problemSchema,
  problemType,
  type Problem,
  type ProblemCode,
  type ProblemError,
} from '../../shared/problems/problems.ts';

/** A refusal as the server tells it (RFC 9457), or one made here when no server answered. */
export class ApiProblem extends Error {
  readonly problem: Problem;

  constructor(problem: Problem) {
    super(problem.detail ?? problem.title);
    this.problem = problem;
  }

  get code(): ProblemCode {
    return this.problem.code;
  }
}

export const isProblem = (thrown: unknown, code?: ProblemCode): thrown is ApiProblem =>
  thrown instanceof ApiProblem && (code === undefined || thrown.code === code);

/** A refusal made on this side, for what the server did not get to see. */
export const ownProblem = (code: ProblemCode, detail: string, errors?: readonly ProblemError[]): ApiProblem =>
  new ApiProblem({
    type: problemType(code),
    ...PROBLEMS[code],
    detail,
    instance: 'urn:local',
    code,
    ...(errors ? { errors: [...errors] } : {}),
  });

const unreachable = (): ApiProblem =>
  ownProblem('upstream-unavailable', 'What you wrote is kept. Try again when the connection is back.');

export interface CallOptions {
  signal?: AbortSignal;
  /** For acts that make something: the same key again gives the first answer and does nothing twice. */
  idempotencyKey?: string;
}

interface AnyInput {
  params?: Record<string, string>;
  query?: Record<string, string | number | boolean | null | undefined>;
  body?: unknown;
}

/** Address of a route with its parameters and query filled in. */
export function addressOf<T extends AnyRoute>(route: T, input: RouteInput<T>): string {
  const { params = {}, query = {} } = input as AnyInput;
  const path = route.path.replace(/:(\w+)/g, (_whole, name: string) => encodeURIComponent(params[name] ?? ''));
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query))
    if (value !== undefined && value !== null) search.set(name, String(value));
  return `${API_BASE}${path}${search.size > 0 ? `?${search.toString()}` : ''}`;
}

/** Reads a refusal; an answer that is not ours (a proxy's page) counts as no answer. */
export async function problemOf(response: { json: () => Promise<unknown> }): Promise<ApiProblem> {
  const parsed = problemSchema.safeParse(await response.json().catch(() => null));
  return parsed.success ? new ApiProblem(parsed.data) : unreachable();
}

/**
 * Calls a route of the contracts: what is sent is checked by them first, since JSON would turn a figure that is none into
 * an empty one, and what comes back after. Throws `ApiProblem`; it never shows or redirects anything.
 */
export async function api<T extends AnyRoute>(
  route: T,
  input: RouteInput<T>,
  options: CallOptions = {},
): Promise<RouteOutput<T>> {
  const { body = {} } = input as AnyInput;
  const checked = route.body.safeParse(body);
  if (!checked.success)
    throw ownProblem('input-invalid', 'Nothing was sent yet.', pointersOf('body', checked.error.issues));
  const response = await fetch(addressOf(route, input), {
    method: route.method,
    credentials: 'same-origin',
    headers: {
      accept: 'application/json',
      ...(route.method === 'GET' ? {} : { 'content-type': 'application/json' }),
      ...(route.keyed ? { 'idempotency-key': options.idempotencyKey ?? crypto.randomUUID() } : {}),
    },
    ...(route.method === 'GET' ? {} : { body: JSON.stringify(body) }),
    ...(options.signal ? { signal: options.signal } : {}),
  }).catch((error: unknown) => {
    if (options.signal?.aborted) throw error;
    throw unreachable();
  });
  if (!response.ok) throw await problemOf(response);
  const answered: unknown = response.status === 204 ? {} : await response.json().catch(() => null);
  const parsed = route.response.safeParse(answered);
  if (!parsed.success) throw unreachable();
  return parsed.data as RouteOutput<T>;
}
