import { addDays, dayRange, daysBetween, shortDay, type IsoDay } from '../../units/calendar-day.ts';
import type { BandCollar, BandHandoff, BandInput, BandLeg, BandModel, BandRow, BandStep } from './band-types.ts';
import { placeLabels, type WantedLabel } from './place-labels.ts';

const least = (days: readonly IsoDay[]): IsoDay => days.reduce((one, other) => (other < one ? other : one));
const greatest = (days: readonly IsoDay[]): IsoDay => days.reduce((one, other) => (other > one ? other : one));

/** Ticks fall on Mondays and there are at most about a dozen of them. */
function ticksOf(firstDay: IsoDay, span: number): { day: IsoDay }[] {
  const everyDays = 7 * Math.max(1, Math.ceil(span / 7 / 12));
  const weekday = new Date(`${firstDay}T00:00:00Z`).getUTCDay();
  const ticks: { day: IsoDay }[] = [];
  for (let at = (8 - weekday) % 7; at <= span; at += everyDays) ticks.push({ day: addDays(firstDay, at) });
  return ticks;
}

/**
 * Lays the relay band out: a row per part, a tube per leg to the scale of time, rings where parts change hands, the bead
 * where a part is, and labels that never overlap. Pure; the drawing multiplies fractions by its width.
 *
 * @param charactersAcross characters of label text that fit the width
 */
export function bandModel(input: BandInput, charactersAcross: number): BandModel {
  const days = [
    input.todayIso,
    ...input.legs.flatMap((leg) => [leg.startDay, leg.endDay]),
    ...input.handoffs.flatMap((handoff) => (handoff.day ? [handoff.day] : [])),
    ...(input.expected ? [input.expected.fromDay, input.expected.toDay] : []),
    ...(input.deliveredOn ? [input.deliveredOn] : []),
  ];
  const firstDay = addDays(least(days), -2);
  const lastDay = addDays(greatest(days), 3);
  const span = Math.max(1, daysBetween(firstDay, lastDay));
  const x = (day: IsoDay): number => daysBetween(firstDay, day) / span;
  const legsOf = (partId: string): BandLeg[] =>
    input.legs
      .filter((leg) => leg.partId === partId)
      .sort((one, other) => (one.startDay + one.id < other.startDay + other.id ? -1 : 1));
  const drawn = input.parts.filter((part) => legsOf(part.id).length > 0);
  const rowOf = new Map(drawn.map((part, index) => [part.id, index]));
  const legById = new Map(input.legs.map((leg) => [leg.id, leg]));
  const fadeRow = mainRow(input, rowOf);

  const rows = drawn.map((part, index): BandRow => {
    const legs = legsOf(part.id);
    const rings = input.handoffs.filter((handoff) => ringRow(handoff, legById, rowOf) === index);
    const labels: WantedLabel[] = legs.flatMap((leg) => [
      { x: x(leg.startDay), strong: leg.shopName, plain: leg.work, tone: 'plain' as const },
      ...(leg.held
        ? [{ x: cutOf(leg, x) ?? 0, strong: `Held: ${leg.held.words}`, plain: '', tone: 'held' as const }]
        : []),
    ]);
    if (input.expected && !input.deliveredOn && index === fadeRow)
      labels.push({
        x: x(input.expected.fromDay),
        strong: `likely ${dayRange(input.expected.fromDay, input.expected.toDay)}`,
        plain: '',
        tone: 'expected',
      });
    const placed = placeLabels(labels, charactersAcross);
    return {
      partId: part.id,
      name: part.name,
      tubes: legs.map((leg) => ({
        legId: leg.id,
        x0: x(leg.startDay),
        x1: x(addDays(leg.endDay, 1)),
        state: leg.state,
        cutX: cutOf(leg, x),
      })),
      rods: legs.slice(1).flatMap((leg, at) => {
        const before = legs[at];
        const x0 = before ? x(addDays(before.endDay, 1)) : 0;
        return before && x(leg.startDay) > x0 ? [{ x0, x1: x(leg.startDay), certain: leg.state !== 'planned' }] : [];
      }),
      rings: rings.map((handoff) => ({
        handoffId: handoff.id,
        x: x(ringDay(handoff, legById, input)),
        state: handoff.state,
        words: ringWords(handoff),
      })),
      beadX: beadOf(legs, input, x),
      labels: placed,
      lanes: Math.max(1, ...placed.map((label) => label.lane + 1)),
    };
  });
  return {
    firstDay,
    lastDay,
    todayX: x(input.todayIso),
    todayWords: shortDay(input.todayIso),
    ticks: ticksOf(firstDay, span).map(({ day }) => ({
      x: x(day),
      words: shortDay(day).split(' ').slice(1).join(' '),
    })),
    rows,
    collars: collarsOf(input, rowOf, legById, x),
    fade:
      input.expected && !input.deliveredOn
        ? {
            x0: x(input.expected.fromDay),
            x1: x(addDays(input.expected.toDay, 1)),
            words: `likely ${dayRange(input.expected.fromDay, input.expected.toDay)}`,
          }
        : null,
    steps: stepsOf(input, legById),
  };
}

/** The saw cut goes through the tube also where a leg is held since before it begins. */
const cutOf = (leg: BandLeg, x: (day: IsoDay) => number): number | null =>
  leg.held ? Math.min(Math.max(x(leg.held.sinceDay), x(leg.startDay)), x(addDays(leg.endDay, 1))) : null;

/** The row the delivery fades out of: that of the last leg. */
function mainRow(input: BandInput, rowOf: ReadonlyMap<string, number>): number {
  const last = [...input.legs].sort((one, other) => (one.endDay + one.id > other.endDay + other.id ? -1 : 1))[0];
  return last ? (rowOf.get(last.partId) ?? 0) : 0;
}

/** A ring sits on the row of the leg it leaves, or feeds, or else of its first part. */
function ringRow(
  handoff: BandHandoff,
  legById: ReadonlyMap<string, BandLeg>,
  rowOf: ReadonlyMap<string, number>,
): number | undefined {
  const leg = legById.get(handoff.fromLegId ?? '') ?? legById.get(handoff.toLegId ?? '');
  return rowOf.get(leg?.partId ?? handoff.partIds.find((id) => rowOf.has(id)) ?? '');
}

/** Where no day is known the ring stands midway between the two legs, or after the one it leaves. */
function ringDay(handoff: BandHandoff, legById: ReadonlyMap<string, BandLeg>, input: BandInput): IsoDay {
  if (handoff.day) return handoff.day;
  const from = legById.get(handoff.fromLegId ?? '');
  const to = legById.get(handoff.toLegId ?? '');
  if (from && to) return addDays(from.endDay, Math.max(1, Math.round(daysBetween(from.endDay, to.startDay) / 2)));
  if (from) return addDays(from.endDay, 1);
  return to ? addDays(to.startDay, -1) : input.todayIso;
}

const RING_WORDS = {
  open: 'no day agreed',
  'from-agrees': 'a day is offered',
  'to-agrees': 'a day is offered',
  agreed: 'agreed',
  done: 'handed over',
} as const;

const ringWords = (handoff: BandHandoff): string =>
  `${handoff.fromName} to ${handoff.toName}: ${RING_WORDS[handoff.state]}${handoff.day ? ` ${shortDay(handoff.day)}` : ''}`;

/** In the leg under way, at today or its end; else after the last finished leg. */
function beadOf(legs: readonly BandLeg[], input: BandInput, x: (day: IsoDay) => number): number | null {
  const now = legs.find((leg) => leg.state === 'under-way');
  if (now) return Math.max(x(now.startDay), Math.min(x(input.todayIso), x(addDays(now.endDay, 1))));
  const last = legs.filter((leg) => leg.state === 'finished').at(-1);
  return last
    ? Math.min(1, Math.max(x(addDays(last.endDay, 1)), Math.min(x(input.todayIso), x(addDays(last.endDay, 2)))))
    : null;
}

/** A part meets another where a leg on the other's row waits for the last leg of its own. */
function collarsOf(
  input: BandInput,
  rowOf: ReadonlyMap<string, number>,
  legById: ReadonlyMap<string, BandLeg>,
  x: (day: IsoDay) => number,
): BandCollar[] {
  return input.legs.flatMap((leg) =>
    leg.afterLegIds.flatMap((beforeId) => {
      const before = legById.get(beforeId);
      const fromRow = before ? rowOf.get(before.partId) : undefined;
      const toRow = rowOf.get(leg.partId);
      if (!before || fromRow === undefined || toRow === undefined || fromRow === toRow) return [];
      return [{ fromRow, toRow, x: x(leg.startDay), done: before.state === 'finished' && leg.state !== 'planned' }];
    }),
  );
}

function stepsOf(input: BandInput, legById: ReadonlyMap<string, BandLeg>): BandStep[] {
  const partName = new Map(input.parts.map((part) => [part.id, part.name]));
  const legs = input.legs.map((leg) => ({
    day: leg.startDay,
    order: 1,
    step: legStep(leg, partName.get(leg.partId) ?? ''),
  }));
  const rings = input.handoffs.map((handoff) => ({
    day: ringDay(handoff, legById, input),
    order: 0,
    step: {
      id: handoff.id,
      kind: 'handoff' as const,
      state: handoff.state === 'done' ? ('done' as const) : ('next' as const),
      ring: handoff.state,
      title: `${handoff.fromName} to ${handoff.toName}`,
      words: `${RING_WORDS[handoff.state]}${handoff.day ? ` ${shortDay(handoff.day)}` : ''}`,
      partName: handoff.partIds
        .map((id) => partName.get(id))
        .filter(Boolean)
        .join(', '),
      here: false,
    },
  }));
  const steps = [...legs, ...rings]
    .sort(
      (one, other) =>
        one.day.localeCompare(other.day) || one.order - other.order || one.step.id.localeCompare(other.step.id),
    )
    .map((one) => one.step);
  if (input.deliveredOn)
    steps.push({ ...endStep, state: 'done', title: 'Delivered', words: shortDay(input.deliveredOn) });
  else if (input.expected)
    steps.push({
      ...endStep,
      state: 'next',
      title: 'Delivery',
      words: `likely ${dayRange(input.expected.fromDay, input.expected.toDay)}`,
    });
  return steps;
}

const endStep = { id: 'delivery', kind: 'expected', ring: null, partName: '', here: false } as const;

function legStep(leg: BandLeg, partName: string): BandStep {
  const core = {
    id: leg.id,
    kind: 'leg' as const,
    ring: null,
    title: leg.work,
    partName,
    here: leg.state === 'under-way',
  };
  if (leg.state === 'finished')
    return { ...core, state: 'done', words: `${leg.shopName}, done ${shortDay(leg.endDay)}` };
  if (leg.held)
    return {
      ...core,
      state: 'held',
      words: `${leg.shopName}, held since ${shortDay(leg.held.sinceDay)}: ${leg.held.words}`,
    };
  if (leg.state === 'under-way')
    return {
      ...core,
      state: 'now',
      words: `${leg.shopName}, since ${shortDay(leg.startDay)}, likely done ${shortDay(leg.endDay)}`,
    };
  return { ...core, state: 'next', words: `${leg.shopName}, likely from ${shortDay(leg.startDay)}` };
}
