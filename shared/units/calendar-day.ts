import { addDays as addDaysToDate, differenceInCalendarDays, formatISO, parseISO } from 'date-fns';

/**
 * Calendar days are ISO 8601 texts `YYYY-MM-DD`. They have no time zone: both ends of a sum are read and written in the
 * same zone, so the answer is a day again wherever it runs.
 */
export type IsoDay = string;

const asDate = (day: IsoDay): Date => parseISO(day);
const asDay = (date: Date): IsoDay => formatISO(date, { representation: 'date' });

export const addDays = (day: IsoDay, count: number): IsoDay => asDay(addDaysToDate(asDate(day), count));

/** Days from `from` to `to`; negative when `to` is earlier. */
export const daysBetween = (from: IsoDay, to: IsoDay): number => differenceInCalendarDays(asDate(to), asDate(from));

const WEEKDAYS = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'] as const;
const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;

const parts = (day: IsoDay): { weekday: string; date: number; month: string; year: number } => {
  const date = asDate(day);
  return {
    weekday: WEEKDAYS[date.getDay()] ?? '',
    date: date.getDate(),
    month: MONTHS[date.getMonth()] ?? '',
    year: date.getFullYear(),
  };
};

/** "Thursday 12 March". */
export function weekdayDayMonth(day: IsoDay): string {
  const { weekday, date, month } = parts(day);
  return `${weekday} ${date} ${month}`;
}

/** "Thu 12 Mar". */
export function shortDay(day: IsoDay): string {
  const { weekday, date, month } = parts(day);
  return `${weekday.slice(0, 3)} ${date} ${month.slice(0, 3)}`;
}

/** "12 March 2026". */
export function dayMonthYear(day: IsoDay): string {
  const { date, month, year } = parts(day);
  return `${date} ${month} ${year}`;
}

/** "13–20 April", or "28 April – 3 May" over a month's end. */
export function dayRange(from: IsoDay, to: IsoDay): string {
  const start = parts(from);
  const end = parts(to);
  if (from === to) return `${start.date} ${start.month}`;
  if (start.month === end.month && start.year === end.year) return `${start.date}–${end.date} ${end.month}`;
  return `${start.date} ${start.month} – ${end.date} ${end.month}`;
}

const counted = (count: number, one: string): string => `${count} ${count === 1 ? one : `${one}s`}`;

/** "today", "tomorrow", "in 3 days", "2 weeks ago". */
export function relativeDay(day: IsoDay, today: IsoDay): string {
  const days = daysBetween(today, day);
  if (days === 0) return 'today';
  if (days === 1) return 'tomorrow';
  if (days === -1) return 'yesterday';
  const size = Math.abs(days);
  const span = size < 14 ? counted(size, 'day') : counted(Math.round(size / 7), 'week');
  return days > 0 ? `in ${span}` : `${span} ago`;
}

/** Monday to Friday. */
export function isWorkingDay(day: IsoDay): boolean {
  const weekday = asDate(day).getDay();
  return weekday !== 0 && weekday !== 6;
}
