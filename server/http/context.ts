import type { Request, Response } from 'express';
import type { DataSource, EntityManager } from 'typeorm';
import type { AppAbility } from '../../shared/abilities/ability.ts';
import type { Actor } from '../../shared/abilities/actor.ts';
import type { LengthUnit } from '../../shared/contracts/vocabulary.ts';
import type { TransactionScope, UnitOfWork } from '../db/unit-of-work.ts';
import type { Services } from '../services.ts';

/** What a person's account says of how they read things. */
export interface Person {
  readonly accountId: string;
  readonly displayName: string;
  readonly email: string;
  readonly timeZone: string;
  readonly preferredUnit: LengthUnit;
}

/** A request before anyone is known. */
export interface OpenContext extends TransactionScope {
  readonly db: DataSource;
  /** The transaction's manager inside a keyed request, the pool's otherwise: every query goes through it. */
  readonly manager: EntityManager;
  readonly uow: UnitOfWork | null;
  readonly services: Services;
  readonly requestId: string;
  readonly now: Date;
  /** Account of the session, where there is one. */
  readonly sessionAccountId: string | null;
  readonly req: Request;
  readonly res: Response;
}

/** A request of a signed-in person, with the ability that their memberships give for this commission. */
export interface RequestContext extends OpenContext {
  readonly person: Person;
  readonly actor: Actor;
  readonly ability: AppAbility;
  /** The calendar day in the person's time zone. */
  readonly todayIso: string;
}
