import type { Audience, PartyRole } from '../contracts/vocabulary.ts';

/** The facts of each record that the rules look at. Column names follow them (`ability-to-sql.ts`). */
export interface SubjectFacts {
  Installation: Record<never, never>;
  Shop: { id: string };
  Commission: { id: string; memberKeys: readonly string[] };
  NewCommission: { leadShopId: string };
  Party: { commissionId: string; roles: readonly PartyRole[] };
  Part: { commissionId: string };
  Leg: { commissionId: string; partyId: string };
  Joint: { commissionId: string; holePartyId: string; shaftPartyId: string };
  FitReport: { commissionId: string; raisedByPartyId: string; answerPartyId: string };
  Consent: { commissionId: string };
  Handoff: { commissionId: string; fromPartyId: string; toPartyId: string };
  Thread: { commissionId: string; audience: Audience; partyIds: readonly string[] };
  Standing: { commissionId: string };
  /** Pictures of the commission itself: cover, brief, condition. */
  Pictures: { commissionId: string };
}

export type SubjectName = keyof SubjectFacts;
