import type { Request } from 'express';
import type { z } from 'zod';
import type { AnyRoute, ParsedInput } from '../../shared/contracts/route.ts';
import type { ProblemError } from '../../shared/problems/problems.ts';
import { InputInvalid, NotFound } from '../errors.ts';

const escapePointer = (segment: PropertyKey): string => String(segment).replaceAll('~', '~0').replaceAll('/', '~1');

/** Zod issues as JSON Pointers (RFC 6901) below `/body`, `/query` or `/params`. */
export const pointersOf = (place: string, issues: readonly z.core.$ZodIssue[]): ProblemError[] =>
  issues.map((issue) => ({
    pointer: ['', place, ...issue.path.map(escapePointer)].join('/'),
    message: issue.message,
  }));

/** Parses params, query and body by the contract and collects every issue. An id that is no id is simply not found. */
export function parseInput<T extends AnyRoute>(route: T, req: Request): ParsedInput<T> {
  const params = route.params.safeParse(req.params);
  if (!params.success) throw new NotFound();
  const query = route.query.safeParse(req.query);
  const body = route.body.safeParse(req.body ?? {});
  const errors = [
    ...(query.success ? [] : pointersOf('query', query.error.issues)),
    ...(body.success ? [] : pointersOf('body', body.error.issues)),
  ];
  if (errors.length > 0) throw new InputInvalid(errors);
  return { params: params.data, query: query.data, body: body.data } as ParsedInput<T>;
}
