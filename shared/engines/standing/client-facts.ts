import type { IsoDay } from '../../units/calendar-day.ts';

export type LegKind = 'machining' | 'finishing' | 'chassis' | 'wiring' | 'blade' | 'bench-test' | 'other';
export type LegState = 'planned' | 'under-way' | 'finished' | 'dropped';

/** Everything the merged status may be computed from: what a client may know, and nothing else. */
export interface ClientFacts {
  pieceTitle: string;
  code: string;
  clientName: string | null;
  parts: { id: string; name: string; holderName: string; sinceDay: IsoDay | null }[];
  legs: ClientLeg[];
  handoffs: {
    id: string;
    partIds: string[];
    fromName: string;
    toName: string;
    agreedOn: IsoDay | null;
    doneOn: IsoDay | null;
  }[];
  waitingOnClient: { kind: 'consent' | 'handoff-day'; refId: string; words: string; sinceDay: IsoDay }[];
  waitingOnOthers: { who: string; forWhat: string }[];
  /** Likely range of the delivery, and the one told before it where that differs. */
  expected: { fromDay: IsoDay; toDay: IsoDay; previousFromDay: IsoDay | null; previousToDay: IsoDay | null } | null;
  deliveredOn: IsoDay | null;
}

export interface ClientLeg {
  id: string;
  kind: LegKind;
  title: string;
  shopName: string;
  shopCraft: string;
  partId: string;
  state: LegState;
  startedOn: IsoDay | null;
  finishedOn: IsoDay | null;
  plannedStartOn: IsoDay | null;
  plannedFinishOn: IsoDay | null;
  held: { sinceDay: IsoDay; clientWords: string; consentAsked: boolean; willShow: boolean | null } | null;
}
