import type { PartyView } from '../../../shared/contracts/commissions.ts';
import type { Audience } from '../../../shared/contracts/vocabulary.ts';

/** Who reads a thread, in words; it is on screen all the time while someone writes. The lead reads named threads too. */
export function audienceWords(
  thread: { audience: Audience; partyIds: readonly string[] },
  parties: readonly PartyView[],
): string {
  const names = (list: readonly PartyView[]): string => list.map((party) => party.displayName).join(' + ');
  switch (thread.audience) {
    case 'everyone':
      return 'Everyone, the client too';
    case 'makers':
      return 'All makers, not the client';
    case 'own-shop':
      return `${names(parties.filter((party) => thread.partyIds.includes(party.id)))} only`;
    case 'named': {
      const named = parties.filter((party) => thread.partyIds.includes(party.id));
      const lead = parties.filter((party) => party.roles.includes('lead') && !thread.partyIds.includes(party.id));
      return `${names([...named, ...lead])} only`;
    }
  }
}

/** Parties whose people may be named in a thread. */
export function readersOf(
  thread: { audience: Audience; partyIds: readonly string[] },
  parties: readonly PartyView[],
): PartyView[] {
  return parties.filter((party) => {
    if (party.roles.includes('guest')) return false;
    if (thread.audience === 'everyone') return true;
    if (thread.audience === 'makers') return !party.roles.includes('client');
    return thread.partyIds.includes(party.id) || (thread.audience === 'named' && party.roles.includes('lead'));
  });
}
