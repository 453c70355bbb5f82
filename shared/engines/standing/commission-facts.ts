import type { IsoDay } from '../../units/calendar-day.ts';
import type { ReportState } from '../reports/report-states.ts';
import type { LegKind, LegState } from './client-facts.ts';

/** All that is known of a commission, secrets of the makers included; `clientFactsFrom` takes from it what a client may know. */
export interface CommissionFacts {
  title: string;
  code: string;
  brief: string;
  budgetMinor: number | null;
  deliveredOn: IsoDay | null;
  told: { fromDay: IsoDay; toDay: IsoDay } | null;
  expected: { fromDay: IsoDay; toDay: IsoDay } | null;
  parties: { id: string; name: string; craft: string; isClient: boolean }[];
  parts: { id: string; name: string; position: number; holderPartyId: string; holderSince: IsoDay }[];
  legs: {
    id: string;
    partyId: string;
    partId: string;
    kind: LegKind;
    title: string;
    state: LegState;
    plannedStartOn: IsoDay | null;
    startedOn: IsoDay | null;
    finishedOn: IsoDay | null;
    /** From the plan. */
    likelyStartOn: IsoDay | null;
    likelyFinishOn: IsoDay | null;
    hopefulDays: number;
    likelyDays: number;
    badDays: number;
    privateNote: string;
  }[];
  reports: {
    id: string;
    title: string;
    plainWords: string;
    state: ReportState;
    blocking: boolean;
    heldLegId: string | null;
    raisedOn: IsoDay;
    raisedByPartyId: string;
    answerPartyId: string;
    /** Released by the lead; empty until then. */
    clientWords: string;
    note: {
      id: string;
      agreed: boolean;
      method: string;
      removeOnDiameterUm: number;
      risk: string;
      shows: boolean;
      costMinor: number;
      costBorneByPartyId: string | null;
      consent: 'asked' | 'given' | 'refused' | null;
      consentAskedOn: IsoDay | null;
    } | null;
  }[];
  handoffs: {
    id: string;
    fromPartyId: string;
    toPartyId: string;
    partIds: string[];
    agreedOn: IsoDay | null;
    doneOn: IsoDay | null;
    standingOffer: { byPartyId: string; onDay: IsoDay; words: string; offeredOn: IsoDay } | null;
  }[];
  threads: { audience: string; lastMessage: string }[];
}
