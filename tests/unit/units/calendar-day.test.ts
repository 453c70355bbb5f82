import fc from 'fast-check';
import { afterEach, describe, expect, it } from 'vitest';
import { WorkingDays } from '../../../shared/engines/schedule/working-days.ts';
import {
  addDays,
  dayMonthYear,
  dayRange,
  daysBetween,
  isWorkingDay,
  relativeDay,
  shortDay,
  weekdayDayMonth,
} from '../../../shared/units/calendar-day.ts';

const MS_PER_DAY = 86_400_000;

/** The same sum in UTC by the language's own dates, as an independent answer. */
const inUtc = (day: string, count: number): string =>
  new Date(Date.parse(`${day}T00:00:00Z`) + count * MS_PER_DAY).toISOString().slice(0, 10);

const machineZone = process.env['TZ'];
afterEach(() => {
  if (machineZone === undefined) delete process.env['TZ'];
  else process.env['TZ'] = machineZone;
});

describe('calendar days in words', () => {
  it('name the weekday, the day and the month', () => {
    expect(weekdayDayMonth('2026-03-12')).toBe('Thursday 12 March');
    expect(shortDay('2026-03-12')).toBe('Thu 12 Mar');
    expect(dayMonthYear('2026-03-12')).toBe('12 March 2026');
  });

  it('give a range over the ends of months and years, and one day as one', () => {
    expect(dayRange('2026-04-13', '2026-04-20')).toBe('13–20 April');
    expect(dayRange('2026-04-28', '2026-05-03')).toBe('28 April – 3 May');
    expect(dayRange('2026-12-29', '2027-01-04')).toBe('29 December – 4 January');
    expect(dayRange('2026-04-13', '2026-04-13')).toBe('13 April');
  });

  it.each([
    ['2026-03-10', 'today'],
    ['2026-03-11', 'tomorrow'],
    ['2026-03-09', 'yesterday'],
    ['2026-03-13', 'in 3 days'],
    ['2026-03-23', 'in 13 days'],
    ['2026-03-24', 'in 2 weeks'],
    ['2026-02-17', '3 weeks ago'],
  ])('%s is %s from Tuesday 10 March 2026', (day, words) => expect(relativeDay(day, '2026-03-10')).toBe(words));
});

// Zones where a day is easily lost: far from UTC, half an hour off, summer time at midnight (Beirut, Cairo, Santiago).
describe.each([
  ['Pacific/Kiritimati', -840],
  ['America/St_Johns', 210],
  ['UTC', 0],
  ['Europe/Berlin', -60],
  ['Asia/Beirut', -120],
  ['Africa/Cairo', -120],
  ['America/Santiago', 180],
])('in %s', (zone, winterOffsetMinutes) => {
  const days = fc
    .tuple(fc.integer({ min: 0, max: 3650 }), fc.integer({ min: -800, max: 800 }))
    .map(([from, count]) => ({ from: inUtc('2020-01-01', from), count }));

  it('sums, names and weekdays are those of the calendar', () => {
    process.env['TZ'] = zone;
    // January in the south is summer: Santiago is three hours behind UTC then.
    expect(new Date('2026-01-15T12:00:00Z').getTimezoneOffset()).toBe(winterOffsetMinutes);
    fc.assert(
      fc.property(days, ({ from, count }) => {
        const to = addDays(from, count);
        expect(to).toBe(inUtc(from, count));
        expect(daysBetween(from, to)).toBe(count);
        const weekday = new Date(`${to}T00:00:00Z`).getUTCDay();
        expect(isWorkingDay(to)).toBe(weekday >= 1 && weekday <= 5);
        expect(dayMonthYear(to).startsWith(`${Number(to.slice(8))} `)).toBe(true);
      }),
    );
  });

  it('the days on which summer time begins and ends are days like others', () => {
    process.env['TZ'] = zone;
    for (const day of [
      '2026-03-08',
      '2026-03-29',
      '2026-04-05',
      '2026-04-24',
      '2026-09-06',
      '2026-10-25',
      '2026-11-01',
    ])
      expect([addDays(day, 1), addDays(day, -1), daysBetween(addDays(day, -1), addDays(day, 1))]).toEqual([
        inUtc(day, 1),
        inUtc(day, -1),
        2,
      ]);
  });
});

describe('working days', () => {
  it('count Monday to Friday, and a weekend as the Monday after it', () => {
    const days = new WorkingDays('2026-03-02', isWorkingDay);
    expect(
      ['2026-03-02', '2026-03-06', '2026-03-07', '2026-03-08', '2026-03-09'].map((day) => days.numberOf(day)),
    ).toEqual([0, 4, 5, 5, 5]);
    expect([0, 4, 5, 5.9, 10].map((number) => days.dayOf(number))).toEqual([
      '2026-03-02',
      '2026-03-06',
      '2026-03-09',
      '2026-03-09',
      '2026-03-16',
    ]);
  });

  it('day and number go back and forth, in whatever order they are asked for', () => {
    fc.assert(
      fc.property(fc.array(fc.nat(900), { minLength: 1, maxLength: 20 }), (numbers) => {
        const days = new WorkingDays('2026-03-04', isWorkingDay);
        for (const number of numbers) {
          const day = days.dayOf(number);
          expect(isWorkingDay(day)).toBe(true);
          expect(days.numberOf(day)).toBe(number);
        }
      }),
    );
  });

  it('follow the calendar they are given', () => {
    const shut = new Set(['2026-03-03', '2026-03-04']);
    const days = new WorkingDays('2026-03-02', (day) => isWorkingDay(day) && !shut.has(day));
    expect(days.dayOf(1)).toBe('2026-03-05');
    expect(days.numberOf('2026-03-03')).toBe(1);
  });

  it('refuse a calendar that never works instead of searching for ever', () => {
    expect(() => new WorkingDays('2026-03-02', () => false).dayOf(0)).toThrow(RangeError);
  });
});
