import type { IsoDay } from '../../units/calendar-day.ts';

/** What the relay band is drawn from: a time-true picture of every part from brief to delivery. */
export interface BandInput {
  readonly todayIso: IsoDay;
  readonly parts: readonly { readonly id: string; readonly name: string }[];
  readonly legs: readonly BandLeg[];
  readonly handoffs: readonly BandHandoff[];
  readonly expected: { readonly fromDay: IsoDay; readonly toDay: IsoDay } | null;
  readonly deliveredOn: IsoDay | null;
}

export interface BandLeg {
  readonly id: string;
  readonly partId: string;
  readonly shopName: string;
  readonly work: string;
  readonly state: 'planned' | 'under-way' | 'finished';
  readonly startDay: IsoDay;
  /** Last day of the work, counted in. */
  readonly endDay: IsoDay;
  readonly held: { readonly sinceDay: IsoDay; readonly words: string } | null;
  readonly afterLegIds: readonly string[];
}

/** `open`: no day agreed; `from-agrees` and `to-agrees`: one side's offer stands; `agreed`: both; `done`: handed over. */
export type RingState = 'open' | 'from-agrees' | 'to-agrees' | 'agreed' | 'done';

export interface BandHandoff {
  readonly id: string;
  readonly partIds: readonly string[];
  readonly fromName: string;
  readonly toName: string;
  readonly fromLegId: string | null;
  readonly toLegId: string | null;
  readonly day: IsoDay | null;
  readonly state: RingState;
}

/** A label with its place: `x` and the lane above its row, so that no two meet whatever the days. */
export interface BandLabel {
  readonly x: number;
  /** 0 is next to the tube, higher lanes lie further from it. */
  readonly lane: number;
  /** Bold part (the shop) and plain part (the work), already shortened to what fits. */
  readonly strong: string;
  readonly plain: string;
  readonly tone: 'plain' | 'held' | 'expected';
  /** The words in full, for a title. */
  readonly full: string;
}

/** All `x` are fractions, 0 at the first day and 1 at the last. */
export interface BandTube {
  readonly legId: string;
  readonly x0: number;
  readonly x1: number;
  readonly state: 'planned' | 'under-way' | 'finished';
  /** Where the saw cut goes through, when the leg is held. */
  readonly cutX: number | null;
}

export interface BandRing {
  readonly handoffId: string;
  readonly x: number;
  readonly state: RingState;
  readonly words: string;
}

export interface BandRow {
  readonly partId: string;
  readonly name: string;
  readonly tubes: readonly BandTube[];
  /** Thin rods: time between legs. */
  readonly rods: readonly { readonly x0: number; readonly x1: number; readonly certain: boolean }[];
  readonly rings: readonly BandRing[];
  /** Present place of the part. */
  readonly beadX: number | null;
  readonly labels: readonly BandLabel[];
  readonly lanes: number;
}

/** A part that joins another: its row's end, and where it meets the other row. */
export interface BandCollar {
  readonly fromRow: number;
  readonly toRow: number;
  readonly x: number;
  readonly done: boolean;
}

/** One step of the band in words, for the vertical band and for those who hear it read. */
export interface BandStep {
  readonly id: string;
  readonly kind: 'leg' | 'handoff' | 'expected';
  readonly state: 'done' | 'now' | 'held' | 'next';
  readonly ring: RingState | null;
  readonly title: string;
  readonly words: string;
  readonly partName: string;
  /** The bead is here. */
  readonly here: boolean;
}

export interface BandModel {
  readonly firstDay: IsoDay;
  readonly lastDay: IsoDay;
  readonly todayX: number;
  readonly todayWords: string;
  readonly ticks: readonly { readonly x: number; readonly words: string }[];
  readonly rows: readonly BandRow[];
  readonly collars: readonly BandCollar[];
  readonly fade: { readonly x0: number; readonly x1: number; readonly words: string } | null;
  readonly steps: readonly BandStep[];
}
