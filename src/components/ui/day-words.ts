import { shortDay, weekdayDayMonth } from '../../../shared/units/calendar-day.ts';

/** A native date field holds either nothing or a whole day. */
const WHOLE_DAY = /^\d{4}-\d{2}-\d{2}$/;

/** "Thursday"; empty while no whole day is given. */
export const weekdayOf = (isoDay: string): string =>
  WHOLE_DAY.test(isoDay) ? (weekdayDayMonth(isoDay).split(' ')[0] ?? '') : '';

/** "Thursday 12 March", short "Thu 12 Mar"; the year is said when it is not today's. */
export function dayInWords(isoDay: string, todayIso: string, form: 'long' | 'short' = 'long'): string {
  const words = form === 'long' ? weekdayDayMonth(isoDay) : shortDay(isoDay);
  return isoDay.slice(0, 4) === todayIso.slice(0, 4) ? words : `${words} ${isoDay.slice(0, 4)}`;
}
