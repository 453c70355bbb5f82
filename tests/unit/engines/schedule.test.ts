import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findLoop } from '../../../shared/engines/schedule/find-loop.ts';
import { drivingPath, forwardPass, ScheduleLoopError } from '../../../shared/engines/schedule/forward-pass.ts';
import { planOf, planWithDay, type PlanInput, type PlanLeg } from '../../../shared/engines/schedule/plan.ts';
import { pertMean, pertVariance } from '../../../shared/engines/schedule/three-point.ts';
import {
  addDays,
  dayRange,
  daysBetween,
  isWorkingDay,
  relativeDay,
  weekdayDayMonth,
} from '../../../shared/units/calendar-day.ts';

const activity = (id: string, duration: number, ...after: string[]) => ({
  id,
  duration,
  after: after.map((before) => ({ id: before, lag: 0 })),
});

describe('forward pass', () => {
  // Worked by hand, critical path method: ES/EF of eight activities, length 19, path A B D G H.
  const network = [
    activity('A', 3),
    activity('B', 4, 'A'),
    activity('C', 2, 'A'),
    activity('D', 5, 'B'),
    activity('E', 1, 'C'),
    activity('F', 2, 'C'),
    activity('G', 4, 'D', 'E'),
    activity('H', 3, 'F', 'G'),
  ];

  it('gives the published earliest times', () => {
    const timings = forwardPass(network);
    const times = Object.fromEntries([...timings].map(([id, { start, finish }]) => [id, [start, finish]]));
    expect(times).toEqual({
      A: [0, 3],
      B: [3, 7],
      C: [3, 5],
      D: [7, 12],
      E: [5, 6],
      F: [5, 7],
      G: [12, 16],
      H: [16, 19],
    });
    expect(drivingPath(timings)).toEqual(['A', 'B', 'D', 'G', 'H']);
  });

  it('names a loop by its path', () => {
    expect(() => forwardPass([activity('A', 1, 'C'), activity('B', 1, 'A'), activity('C', 1, 'B')])).toThrow(
      ScheduleLoopError,
    );
    expect(
      findLoop(
        new Map([
          ['A', ['C']],
          ['B', ['A']],
          ['C', ['B']],
        ]),
      ),
    ).toEqual(['A', 'C', 'B', 'A']);
  });

  it('finds a loop exactly when no order exists', () => {
    const graphs = fc.array(fc.tuple(fc.nat(7), fc.nat(7)), { maxLength: 14 });
    fc.assert(
      fc.property(graphs, (edges) => {
        const waits = new Map(
          Array.from({ length: 8 }, (_one, id) => [
            String(id),
            edges.filter(([from]) => from === id).map(([, to]) => String(to)),
          ]),
        );
        // Kahn's sorting, as an independent answer.
        const left = new Map([...waits].map(([id, before]) => [id, new Set(before)]));
        for (let moved = true; moved;) {
          moved = false;
          for (const [id, before] of left)
            if ([...before].every((one) => !left.has(one))) moved = left.delete(id) || moved;
        }
        expect(findLoop(waits) === null).toBe(left.size === 0);
      }),
    );
  });
});

// PERT, Malcolm, Roseboom, Clark and Fazar 1959: mean (a + 4m + b) / 6, variance ((b - a) / 6)^2.
it('three-point estimates', () => {
  expect(pertMean({ hopeful: 2, likely: 5, bad: 14 })).toBe(6);
  expect(pertVariance({ hopeful: 2, likely: 5, bad: 14 })).toBe(4);
  expect(() => pertMean({ hopeful: 3, likely: 2, bad: 4 })).toThrow(RangeError);
});

const MONDAY = '2026-03-02';

const leg = (id: string, days: number, changes: Partial<PlanLeg> = {}): PlanLeg => ({
  id,
  afterLegIds: [],
  state: 'planned',
  hopefulDays: days,
  likelyDays: days,
  badDays: days,
  plannedStartOn: null,
  startedOn: null,
  finishedOn: null,
  heldSince: null,
  ...changes,
});

const plan = (legs: PlanLeg[], handoffs: PlanInput['handoffs'] = []) =>
  planOf({ legs, handoffs, todayIso: MONDAY, isWorkingDay });

describe('a plan in days', () => {
  it('works Monday to Friday: five days from Monday end on Friday, six on the next Monday', () => {
    expect(plan([leg('a', 5)]).legs.get('a')).toEqual({ startOn: MONDAY, finishOn: '2026-03-06' });
    expect(plan([leg('a', 6)]).legs.get('a')).toEqual({ startOn: MONDAY, finishOn: '2026-03-09' });
  });

  it('lets the next leg start the day after, and after the parcel has travelled', () => {
    const legs = [leg('a', 2), leg('b', 1, { afterLegIds: ['a'] })];
    expect(plan(legs).legs.get('b')?.startOn).toBe('2026-03-04');
    const travelling = [{ id: 'h', fromLegId: 'a', toLegId: 'b', transitDays: 3, agreedOn: null, doneOn: null }];
    expect(plan(legs, travelling).legs.get('b')?.startOn).toBe('2026-03-09');
  });

  it('takes what happened over what was estimated', () => {
    const done = leg('a', 20, { state: 'finished', startedOn: '2026-02-23', finishedOn: '2026-02-25' });
    expect(plan([done, leg('b', 1, { afterLegIds: ['a'] })]).legs.get('b')?.startOn).toBe(MONDAY);
  });

  it('a held leg pushes what hangs on it', () => {
    const started = { state: 'under-way' as const, startedOn: '2026-02-23' };
    const next = leg('b', 1, { afterLegIds: ['a'] });
    const free = plan([leg('a', 7, started), next]).expected;
    const held = plan([leg('a', 7, { ...started, heldSince: '2026-02-24' }), next]).expected;
    expect(daysBetween(free?.toDay ?? '', held?.toDay ?? '')).toBeGreaterThan(0);
  });

  it('walks dropped legs once each, however many ways there are through them', () => {
    const layers = Array.from({ length: 30 }, (_, layer) =>
      ['x', 'y', 'z'].map((name) =>
        leg(`${name}${layer}`, 1, {
          state: 'dropped',
          afterLegIds: layer === 0 ? ['a'] : ['x', 'y', 'z'].map((before) => `${before}${layer - 1}`),
        }),
      ),
    ).flat();
    const last = leg('end', 2, { afterLegIds: ['x29', 'y29', 'z29'] });
    const straight = plan([leg('a', 3), leg('end', 2, { afterLegIds: ['a'] })]).legs.get('end');
    expect(plan([leg('a', 3), ...layers, last]).legs.get('end')).toEqual(straight);
  });

  it('what waited for a dropped leg waits for what that one waited for', () => {
    const dropped = leg('b', 4, { afterLegIds: ['a'], state: 'dropped' });
    const legs = [leg('a', 3), dropped, leg('c', 1, { afterLegIds: ['b'] })];
    expect(plan(legs).legs.get('c')?.startOn).toBe('2026-03-05');
    expect([...plan(legs).legs.keys()]).toEqual(['a', 'c']);
  });

  it('expects the delivery between the tenth and the ninetieth of a hundred cases, by the sum along the driving path', () => {
    const wide = (id: string, after: string[]) =>
      leg(id, 0, { afterLegIds: after, hopefulDays: 2, likelyDays: 5, badDays: 14 });
    // Two legs of mean 6 and variance 4 (three-point formulas): mean 12, sigma the root of 8.
    const { expected, meanDays, sigmaDays, path } = plan([wide('a', []), wide('b', ['a'])]);
    expect([meanDays, path]).toEqual([12, ['a', 'b']]);
    expect(sigmaDays).toBeCloseTo(Math.sqrt(8), 12);
    // 12 - 1.2816 x 2.828 = 8.38 and 12 + 3.62 = 15.62: the 9th and the 16th working day from Monday 2 March.
    expect(expected).toEqual({ fromDay: '2026-03-12', toDay: '2026-03-23' });
  });

  it('refuses legs that wait for each other, with the way round', () => {
    const attempt = () => plan([leg('a', 1, { afterLegIds: ['b'] }), leg('b', 1, { afterLegIds: ['a'] })]);
    expect(attempt).toThrow(expect.objectContaining({ path: ['a', 'b', 'a'] }) as Error);
  });

  it('starts no leg before those it waits for have ended, in any plan without loops', () => {
    const someLegs = fc.array(
      fc.record({ days: fc.integer({ min: 1, max: 12 }), after: fc.array(fc.nat(9), { maxLength: 3 }) }),
      { minLength: 1, maxLength: 10 },
    );
    fc.assert(
      fc.property(someLegs, (drawn) => {
        // A leg waits only for earlier ones of the list, so that there is no loop.
        const legs = drawn.map(({ days, after }, index) =>
          leg(String(index), days, { afterLegIds: after.filter((before) => before < index).map(String) }),
        );
        const planned = plan(legs);
        for (const { id, afterLegIds } of legs)
          for (const before of afterLegIds)
            expect((planned.legs.get(id)?.startOn ?? '') > (planned.legs.get(before)?.finishOn ?? '9999')).toBe(true);
        const last = [...planned.legs.values()]
          .map((one) => one.finishOn)
          .sort()
          .at(-1);
        expect(planned.expected).toEqual({ fromDay: last, toDay: last });
      }),
    );
  });

  it('an agreed day holds the next leg back, and the effect of another day is known before it is agreed', () => {
    const input: PlanInput = {
      legs: [leg('a', 2), leg('b', 1, { afterLegIds: ['a'] })],
      handoffs: [{ id: 'h', fromLegId: 'a', toLegId: 'b', transitDays: 1, agreedOn: null, doneOn: null }],
      todayIso: MONDAY,
      isWorkingDay,
    };
    expect(planWithDay(input, 'h', '2026-03-20').expected?.toDay).toBe('2026-03-20');
    expect(planWithDay(input, 'h', '2026-03-03').expected).toEqual(planOf(input).expected);
  });

  it('adding work never brings the delivery forward', () => {
    const days = fc.tuple(
      fc.integer({ min: 1, max: 9 }),
      fc.integer({ min: 1, max: 9 }),
      fc.integer({ min: 1, max: 9 }),
    );
    fc.assert(
      fc.property(days, fc.integer({ min: 1, max: 9 }), ([one, two, three], more) => {
        const at = (extra: number) =>
          plan([
            leg('a', one),
            leg('b', two + extra, { afterLegIds: ['a'] }),
            leg('c', three, { afterLegIds: ['a'] }),
            leg('d', 1, { afterLegIds: ['b', 'c'] }),
          ]).expected?.toDay ?? '';
        expect(at(more) >= at(0)).toBe(true);
      }),
    );
  });
});

describe('calendar days', () => {
  it('are written as people say them', () => {
    expect(weekdayDayMonth('2026-03-12')).toBe('Thursday 12 March');
    expect(dayRange('2026-04-13', '2026-04-20')).toBe('13–20 April');
    expect(dayRange('2026-04-28', '2026-05-03')).toBe('28 April – 3 May');
    expect([
      relativeDay('2026-03-03', MONDAY),
      relativeDay('2026-03-05', MONDAY),
      relativeDay('2026-03-01', MONDAY),
      relativeDay('2026-03-30', MONDAY),
    ]).toEqual(['tomorrow', 'in 3 days', 'yesterday', 'in 4 weeks']);
  });

  it('step over the hour that summer time takes, in any zone', () => {
    // 2026-03-29 is the change in Europe; 2026-03-08 in North America.
    for (const day of ['2026-03-28', '2026-03-29', '2026-03-07', '2026-03-08', '2026-10-24', '2026-10-25'])
      expect(daysBetween(day, addDays(day, 1))).toBe(1);
  });
});
