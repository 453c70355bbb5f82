import { useSuspenseQuery } from '@tanstack/react-query';
import { abilityFor, type AppAbility } from '../../shared/abilities/ability.ts';
import type { Membership } from '../../shared/abilities/actor.ts';
import type { PartyRole } from '../../shared/contracts/vocabulary.ts';
import { commissionQueries } from '../lib/queries/commissions.ts';
import { meQuery } from '../lib/queries/me.ts';

export interface Sight {
  ability: AppAbility;
  memberships: readonly Membership[];
  roles: ReadonlySet<PartyRole>;
  /** Parties in whose name the reader acts here. */
  mine: ReadonlySet<string>;
  isClient: boolean;
}

/** What the reader is in this commission, with the ability that the server also works by; here it only says what to offer. */
export function useSight(commissionId: string): Sight {
  const { data: me } = useSuspenseQuery(meQuery());
  const { data: commission } = useSuspenseQuery(commissionQueries.detail(commissionId));
  const { memberships } = commission;
  // Who keeps a shop's books has no part in its work.
  const working = memberships.filter((membership) => membership.shopRole !== 'bookkeeper');
  const roles = new Set(working.flatMap((membership) => membership.roles));
  return {
    ability: abilityFor({ accountId: me.id, isSteward: me.isSteward, shops: me.shops, memberships }),
    memberships,
    roles,
    mine: new Set(working.map((membership) => membership.partyId)),
    isClient: roles.has('client') && roles.size === 1,
  };
}
