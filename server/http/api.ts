import type { IRouter, Request, Response } from 'express';
import { Router } from 'express';
import type { z } from 'zod';
import { abilityFor } from '../../shared/abilities/ability.ts';
import type { AnyRoute, ParsedInput } from '../../shared/contracts/route.ts';
import { UnitOfWork } from '../db/unit-of-work.ts';
import { AppError } from '../errors.ts';
import { loadActor } from '../policies/load-actor.ts';
import type { Services } from '../services.ts';
import type { OpenContext, RequestContext } from './context.ts';
import { claimKey, hashRequest, keepAnswer, readIdempotencyKey } from './idempotency.ts';
import { parseInput } from './parse-input.ts';
import { requestIdOf } from './request-id.ts';

type Handler<C, T extends AnyRoute> = (ctx: C, input: ParsedInput<T>) => Promise<z.input<T['response']>>;

/** Mounts contracts on an Express router and remembers which, so that a test can hold them against the list of all. */
export class Api {
  readonly router: IRouter = Router();
  readonly mounted: AnyRoute[] = [];
  readonly services: Services;

  constructor(services: Services) {
    this.services = services;
  }

  /** A route for anyone. */
  open<T extends AnyRoute & { access: 'anyone' }>(route: T, handle: Handler<OpenContext, T>): void {
    this.#mount(route, async (req, res) => {
      const input = parseInput(route, req);
      answer(route, res, await handle(this.#openContext(req, res), input));
    });
  }

  /** A route for signed-in people; what they may do in it is asked of `ctx.ability`. */
  signedIn<T extends AnyRoute & { access: 'signed-in' }>(route: T, handle: Handler<RequestContext, T>): void {
    this.#mount(route, async (req, res) => {
      const ctx = await this.#signedInContext(req, res);
      if (route.keyed) return this.#answerKeyed(route, ctx, handle);
      answer(route, res, await handle(ctx, parseInput(route, req)));
    });
  }

  /** A route that takes a file or answers bytes: the handler writes the response itself. */
  bytes(route: AnyRoute & { access: 'signed-in' }, handle: (ctx: RequestContext) => Promise<void>): void {
    this.#mount(route, async (req, res) => handle(await this.#signedInContext(req, res)));
  }

  #mount(route: AnyRoute, handle: (req: Request, res: Response) => Promise<void>): void {
    this.mounted.push(route);
    const verb = route.method.toLowerCase() as 'get' | 'post' | 'patch' | 'delete';
    this.router[verb](route.path, handle);
  }

  #openContext(req: Request, res: Response): OpenContext {
    const { db, clock, wakeRelay } = this.services;
    return {
      db,
      manager: db.manager,
      uow: null,
      services: this.services,
      requestId: requestIdOf(req),
      now: clock(),
      sessionAccountId: req.session.accountId ?? null,
      req,
      res,
      wakeRelay,
    };
  }

  async #signedInContext(req: Request, res: Response): Promise<RequestContext> {
    const open = this.#openContext(req, res);
    if (!open.sessionAccountId) throw new AppError('not-signed-in');
    const commissionId = typeof req.params['commissionId'] === 'string' ? req.params['commissionId'] : null;
    const known = await loadActor(open.db, open.sessionAccountId, { commissionId });
    if (!known) throw new AppError('not-signed-in');
    if (req.method !== 'GET') await this.services.limits.takeWrite(known.person.accountId);
    return { ...open, ...known, ability: abilityFor(known.actor), todayIso: dayIn(known.person.timeZone, open.now) };
  }

  async #answerKeyed<T extends AnyRoute>(
    route: T,
    ctx: RequestContext,
    handle: Handler<RequestContext, T>,
  ): Promise<void> {
    const key = readIdempotencyKey(ctx.req.get('idempotency-key'));
    const input = parseInput(route, ctx.req);
    const hash = hashRequest(route.method, ctx.req.originalUrl, input.body);
    const kept = await ctx.db.transaction(async (manager) => {
      const earlier = await claimKey(manager, ctx.actor.accountId, key, hash);
      if (earlier) return earlier;
      const uow = new UnitOfWork(manager);
      const response = route.response.parse(await handle({ ...ctx, manager, uow }, input));
      await uow.flush();
      const first = { status: route.status, response };
      await keepAnswer(manager, ctx.actor.accountId, key, first);
      return first;
    });
    ctx.wakeRelay();
    ctx.res.status(kept.status).json(kept.response);
  }
}

function answer(route: AnyRoute, res: Response, result: unknown): void {
  if (route.status === 204) return void res.status(204).end();
  res.status(route.status).json(route.response.parse(result)); // fields that the contract does not list end here
}

/** The calendar day (ISO 8601) it is at an instant in a time zone; `en-CA` writes days as ISO does. */
export const dayIn = (timeZone: string, instant: Date): string =>
  new Intl.DateTimeFormat('en-CA', { timeZone, year: 'numeric', month: '2-digit', day: '2-digit' }).format(instant);
