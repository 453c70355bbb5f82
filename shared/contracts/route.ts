import { z } from 'zod';
import type { ProblemCode } from '../problems/problems.ts';

/** Who may call a route at all; what a signed-in person may do there is the ability's business. */
export type Access = 'anyone' | 'signed-in';

export interface AnyRoute {
  readonly method: 'GET' | 'POST' | 'PATCH' | 'DELETE';
  /** Express path below the API base, parameters as `:name`. */
  readonly path: string;
  readonly status: 200 | 201 | 202 | 204;
  readonly access: Access;
  readonly summary: string;
  readonly params: z.ZodObject;
  readonly query: z.ZodObject;
  readonly body: z.ZodType;
  readonly response: z.ZodType;
  readonly problems: readonly ProblemCode[];
  /** The caller must send an Idempotency-Key header; the first answer is kept for 72 hours. */
  readonly keyed?: boolean;
  /** The body is multipart/form-data; `body` describes its text fields, the file sits in `file`. */
  readonly multipart?: boolean;
  /** The answer is bytes and not JSON. */
  readonly raw?: boolean;
}

export const API_BASE = '/api/v1';

export const nothing = z.object({});

/** Declares a route once: server, browser client, tests and the OpenAPI document all read this value. */
export const defineRoute = <const T extends AnyRoute>(route: T): T => route;

type Part<K extends string, S extends z.ZodType> =
  Record<never, never> extends z.input<S> ? { [k in K]?: z.input<S> } : { [k in K]: z.input<S> };

export type RouteInput<T extends AnyRoute> = Part<'params', T['params']> &
  Part<'query', T['query']> &
  Part<'body', T['body']>;

export interface ParsedInput<T extends AnyRoute> {
  params: z.output<T['params']>;
  query: z.output<T['query']>;
  body: z.output<T['body']>;
}

export type RouteOutput<T extends AnyRoute> = z.output<T['response']>;
