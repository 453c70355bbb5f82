import type { GuestSight, PartyRole, ShopRole } from '../contracts/vocabulary.ts';

/** What a person is in one commission, through a shop or in their own name. Ended parts are not in the list. */
export interface Membership {
  readonly commissionId: string;
  readonly partyId: string;
  readonly roles: readonly PartyRole[];
  readonly shopId: string | null;
  /** Their role in that shop; null when the party is the person. */
  readonly shopRole: ShopRole | null;
  readonly guestSees: readonly GuestSight[];
}

/** The signed-in person with the memberships that the request at hand concerns. */
export interface Actor {
  readonly accountId: string;
  readonly isSteward: boolean;
  readonly shops: readonly { readonly shopId: string; readonly role: ShopRole }[];
  readonly memberships: readonly Membership[];
}

/** The keys under which a person is found in a commission's `memberKeys`: the account and each of its shops. */
export const memberKeysOf = (actor: Actor): string[] => [actor.accountId, ...actor.shops.map((shop) => shop.shopId)];
