import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bandModel } from '../../../shared/engines/band/band-model.ts';
import { placeLabels, type WantedLabel } from '../../../shared/engines/band/place-labels.ts';
import type { BandHandoff, BandInput, BandLabel, BandLeg } from '../../../shared/engines/band/band-types.ts';
import { addDays } from '../../../shared/units/calendar-day.ts';

const ACROSS = 90;

/** Where a label begins and ends, in characters. */
const spanOf = (label: BandLabel): { from: number; to: number } => {
  const from = label.x * ACROSS;
  return { from, to: from + `${label.strong} ${label.plain}`.trim().length };
};

function expectApart(labels: readonly BandLabel[]): void {
  for (const [at, label] of labels.entries()) {
    const { from, to } = spanOf(label);
    expect(from).toBeGreaterThanOrEqual(0);
    expect(to).toBeLessThanOrEqual(ACROSS + 1e-9);
    for (const other of labels.slice(at + 1)) {
      if (other.lane !== label.lane) continue;
      const { from: otherFrom, to: otherTo } = spanOf(other);
      expect(to < otherFrom || otherTo < from, `${label.full} and ${other.full}`).toBe(true);
    }
  }
}

describe('labels of one row', () => {
  const words = fc.string({ maxLength: 60, unit: fc.constantFrom('a', 'b', 'n', 'w', ' ') }).map((text) => text.trim());
  const wanted: fc.Arbitrary<WantedLabel> = fc.record({
    x: fc.double({ min: 0, max: 1, noNaN: true }),
    strong: words.filter((text) => text !== ''),
    plain: words,
    tone: fc.constantFrom('plain', 'held', 'expected'),
  });

  it('never meet, stay inside the width, and none is lost', () => {
    fc.assert(
      fc.property(fc.array(wanted, { maxLength: 14 }), (labels) => {
        const placed = placeLabels(labels, ACROSS);
        expectApart(placed);
        expect(placed.map((label) => label.full).sort()).toEqual(
          labels.map((label) => `${label.strong} ${label.plain}`.trim()).sort(),
        );
        // A name that is there in full or shortened with its mark, but never gone.
        for (const label of placed) expect(label.strong).not.toBe('');
      }),
    );
  });

  it('are written in full while there is a lane for them', () => {
    const labels = [0, 0.02, 0.04].map((x) => ({
      x,
      strong: 'Aldgrove Turning',
      plain: 'machining',
      tone: 'plain' as const,
    }));
    const placed = placeLabels(labels, ACROSS);
    expect(placed.map((label) => label.lane)).toEqual([0, 1, 2]);
    expect(placed.map((label) => label.plain)).toEqual(['machining', 'machining', 'machining']);
  });

  it('at the right edge begin further left, and push nothing away', () => {
    const [short, long] = placeLabels(
      [
        { x: 0.5, strong: 'Marrow', plain: 'patina', tone: 'plain' },
        { x: 0.95, strong: 'Tinder Lane Electrics', plain: 'bench test with a long name', tone: 'plain' },
      ],
      ACROSS,
    );
    expect([short?.strong, short?.plain]).toEqual(['Marrow', 'patina']);
    expect(long && spanOf(long).to).toBeCloseTo(ACROSS, 9);
  });
});

const FIRST = '2026-02-02';

const day = fc.integer({ min: 0, max: 120 }).map((count) => addDays(FIRST, count));

const legs: fc.Arbitrary<BandLeg[]> = fc
  .array(
    fc.record({
      partId: fc.constantFrom('blade', 'chassis', 'hilt'),
      state: fc.constantFrom('planned', 'under-way', 'finished'),
      startDay: day,
      length: fc.integer({ min: 0, max: 30 }),
      held: fc.option(fc.record({ sinceDay: day, words: fc.constant('pommel will not draw') })),
    }),
    { maxLength: 8 },
  )
  .map((drawn) =>
    drawn.map(({ length, ...leg }, index) => ({
      ...leg,
      id: `leg-${index}`,
      shopName: `Shop ${index}`,
      work: 'finishing',
      endDay: addDays(leg.startDay, length),
      held: leg.state === 'finished' ? null : leg.held,
      afterLegIds: index > 0 ? [`leg-${index - 1}`] : [],
    })),
  );

const handoffs: fc.Arbitrary<BandHandoff[]> = fc
  .array(
    fc.record({
      fromLegId: fc.constantFrom('leg-0', 'leg-1', null),
      toLegId: fc.constantFrom('leg-2', 'leg-3', null),
      day: fc.option(day),
      state: fc.constantFrom('open', 'from-agrees', 'to-agrees', 'agreed', 'done'),
    }),
    { maxLength: 5 },
  )
  .map((drawn) =>
    drawn.map((handoff, index) => ({
      ...handoff,
      id: `handoff-${index}`,
      partIds: ['hilt'],
      fromName: 'Aldgrove Turning',
      toName: 'Marrow & Vale',
    })),
  );

const anyBand: fc.Arbitrary<BandInput> = fc.record({
  todayIso: day,
  parts: fc.constant([
    { id: 'hilt', name: 'Hilt' },
    { id: 'chassis', name: 'Chassis' },
    { id: 'blade', name: 'Blade' },
  ]),
  legs,
  handoffs,
  expected: fc.option(fc.tuple(day, fc.nat(20)).map(([fromDay, more]) => ({ fromDay, toDay: addDays(fromDay, more) }))),
  deliveredOn: fc.option(day),
});

describe('the band of any commission', () => {
  it('lies inside its time, whatever the days', () => {
    fc.assert(
      fc.property(anyBand, (input) => {
        const model = bandModel(input, ACROSS);
        const all = [
          model.todayX,
          ...model.ticks.map((tick) => tick.x),
          ...model.collars.map((collar) => collar.x),
          ...(model.fade ? [model.fade.x0, model.fade.x1] : []),
          ...model.rows.flatMap((row) => [
            ...row.tubes.flatMap((tube) => [tube.x0, tube.x1, tube.cutX ?? tube.x0]),
            ...row.rods.flatMap((rod) => [rod.x0, rod.x1]),
            ...row.rings.map((ring) => ring.x),
            row.beadX ?? 0,
          ]),
        ];
        for (const x of all) expect(x >= 0 && x <= 1, String(x)).toBe(true);
        for (const tube of model.rows.flatMap((row) => row.tubes)) {
          expect(tube.x1).toBeGreaterThan(tube.x0);
          if (tube.cutX !== null) expect(tube.cutX >= tube.x0 && tube.cutX <= tube.x1).toBe(true);
        }
      }),
    );
  });

  it('has labels that never meet and lanes enough for them', () => {
    fc.assert(
      fc.property(anyBand, (input) => {
        for (const row of bandModel(input, ACROSS).rows) {
          expectApart(row.labels);
          for (const label of row.labels) expect(label.lane).toBeLessThan(row.lanes);
        }
      }),
    );
  });

  it('draws and lists every leg once, every handoff once, and the delivery at the end', () => {
    fc.assert(
      fc.property(anyBand, (input) => {
        const model = bandModel(input, ACROSS);
        const legIds = input.legs.map((leg) => leg.id).sort();
        expect(model.rows.flatMap((row) => row.tubes.map((tube) => tube.legId)).sort()).toEqual(legIds);
        const idsOf = (kind: string): string[] =>
          model.steps
            .filter((step) => step.kind === kind)
            .map((step) => step.id)
            .sort();
        expect(idsOf('leg')).toEqual(legIds);
        expect(idsOf('handoff')).toEqual(input.handoffs.map((handoff) => handoff.id).sort());
        const ends = input.deliveredOn !== null || input.expected !== null;
        expect(idsOf('expected')).toHaveLength(ends ? 1 : 0);
        if (ends) expect(model.steps.at(-1)?.kind).toBe('expected');
      }),
    );
  });

  it('is the same in whatever order its legs and handoffs come', () => {
    fc.assert(
      fc.property(anyBand, (input) => {
        const turned = { ...input, legs: [...input.legs].reverse(), handoffs: [...input.handoffs].reverse() };
        const [one, other] = [bandModel(input, ACROSS), bandModel(turned, ACROSS)];
        expect(other.steps).toEqual(one.steps);
        expect(other.rows.map((row) => row.tubes)).toEqual(one.rows.map((row) => row.tubes));
        expect(other.rows.map((row) => row.labels)).toEqual(one.rows.map((row) => row.labels));
      }),
    );
  });
});

it('marks weeks on Mondays, and fewer of them over a long time', () => {
  const leg = (startDay: string, endDay: string): BandLeg => ({
    id: 'leg',
    partId: 'hilt',
    shopName: 'Aldgrove Turning',
    work: 'machining',
    state: 'under-way',
    startDay,
    endDay,
    held: null,
    afterLegIds: [],
  });
  const band = (endDay: string) =>
    bandModel(
      {
        todayIso: '2026-03-10',
        parts: [{ id: 'hilt', name: 'Hilt' }],
        legs: [leg('2026-03-02', endDay)],
        handoffs: [],
        expected: null,
        deliveredOn: null,
      },
      ACROSS,
    );
  // 2026-03-02 is a Monday; the band begins two days before the first leg.
  expect(band('2026-03-20').ticks.map((tick) => tick.words)).toEqual(['2 Mar', '9 Mar', '16 Mar', '23 Mar']);
  expect(band('2027-03-20').ticks.length).toBeLessThanOrEqual(13);
});

it('says what stands, in the words of a list', () => {
  const model = bandModel(
    {
      todayIso: '2026-03-10',
      parts: [{ id: 'hilt', name: 'Hilt' }],
      legs: [
        {
          id: '1',
          partId: 'hilt',
          shopName: 'Aldgrove Turning',
          work: 'machining',
          state: 'finished',
          startDay: '2026-02-04',
          endDay: '2026-02-19',
          held: null,
          afterLegIds: [],
        },
        {
          id: '2',
          partId: 'hilt',
          shopName: 'Tinder Lane Electrics',
          work: 'wiring',
          state: 'under-way',
          startDay: '2026-03-07',
          endDay: '2026-03-31',
          held: { sinceDay: '2026-03-09', words: 'pommel will not draw' },
          afterLegIds: ['1'],
        },
      ],
      handoffs: [
        {
          id: 'h',
          partIds: ['hilt'],
          fromName: 'Aldgrove Turning',
          toName: 'Tinder Lane Electrics',
          fromLegId: '1',
          toLegId: '2',
          day: '2026-02-21',
          state: 'done',
        },
      ],
      expected: { fromDay: '2026-04-13', toDay: '2026-04-20' },
      deliveredOn: null,
    },
    ACROSS,
  );
  expect(model.steps.map((step) => `${step.title}: ${step.words}`)).toEqual([
    'machining: Aldgrove Turning, done Thu 19 Feb',
    'Aldgrove Turning to Tinder Lane Electrics: handed over Sat 21 Feb',
    'wiring: Tinder Lane Electrics, held since Mon 9 Mar: pommel will not draw',
    'Delivery: likely 13–20 April',
  ]);
});
