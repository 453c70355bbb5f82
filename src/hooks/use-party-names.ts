import { useSuspenseQuery } from '@tanstack/react-query';
import type { PartyView } from '../../shared/contracts/commissions.ts';
import { commissionQueries } from '../lib/queries/commissions.ts';

export interface PartyBook {
  parties: readonly PartyView[];
  nameOf: (partyId: string) => string;
}

/** The parties of a commission by id; a party that left is named so. */
export function usePartyBook(commissionId: string): PartyBook {
  const { data } = useSuspenseQuery(commissionQueries.parties(commissionId));
  const names = new Map(data.parties.map((party) => [party.id, party.displayName]));
  return { parties: data.parties, nameOf: (partyId) => names.get(partyId) ?? 'A party that left' };
}
