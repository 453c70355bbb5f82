import type { Request } from 'express';
import { unstorableIn } from './unstorable.ts';
import type { AnyRoute, ParsedInput } from '../../shared/contracts/route.ts';
import { pointersOf } from '../../shared/problems/pointers.ts';
import { InputInvalid, NotFound } from '../errors.ts';

/** Parses params, query and body by the contract and collects every issue. An id that is no id is simply not found. */
export function parseInput<T extends AnyRoute>(route: T, req: Request): ParsedInput<T> {
  const params = route.params.safeParse(req.params);
  if (!params.success) throw new NotFound();
  const query = route.query.safeParse(req.query);
  const body = route.body.safeParse(req.body ?? {});
  const errors = [
    ...unstorableIn('query', req.query),
    ...unstorableIn('body', req.body),
    ...(query.success ? [] : pointersOf('query', query.error.issues)),
    ...(body.success ? [] : pointersOf('body', body.error.issues)),
  ];
  const firstAt = new Map(errors.toReversed().map((error) => [error.pointer, error]));
  if (errors.length > 0) throw new InputInvalid(errors.filter((error) => firstAt.get(error.pointer) === error));
  return { params: params.data, query: query.data, body: body.data } as ParsedInput<T>;
}
