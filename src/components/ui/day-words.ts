/** Days are ISO calendar days ('YYYY-MM-DD') without a zone; they are read as UTC so that no zone moves them. */
const DAY = /^(\d{4})-(\d{2})-(\d{2})$/;
const MS_PER_DAY = 86_400_000;

/** Milliseconds of the day's start in UTC, or null when the text is not a day that exists. */
function utcMsOf(isoDay: string): number | null {
  const match = DAY.exec(isoDay);
  if (!match) return null;
  const ms = Date.UTC(Number(match[1]), Number(match[2]) - 1, Number(match[3]));
  return new Date(ms).toISOString().startsWith(isoDay) ? ms : null;
}

const withForm = (options: Intl.DateTimeFormatOptions) => {
  const format = new Intl.DateTimeFormat('en-GB', { ...options, timeZone: 'UTC' });
  return (isoDay: string): string => {
    const ms = utcMsOf(isoDay);
    return ms === null ? '' : format.format(ms).replace(',', '');
  };
};

/** "Thursday"; empty for what is not a day. */
export const weekdayOf = withForm({ weekday: 'long' });

const long = withForm({ weekday: 'long', day: 'numeric', month: 'long' });
const short = withForm({ weekday: 'short', day: 'numeric', month: 'short' });

/** "Thursday 12 March", short "Thu 12 Mar"; the year is added when it is not today's. */
export function dayInWords(isoDay: string, todayIso: string, form: 'long' | 'short' = 'long'): string {
  const words = (form === 'long' ? long : short)(isoDay);
  return words && isoDay.slice(0, 4) !== todayIso.slice(0, 4) ? `${words} ${isoDay.slice(0, 4)}` : words;
}

/** "today", "in 3 days", "2 weeks ago"; empty when either is not a day. */
export function relativeInWords(isoDay: string, todayIso: string): string {
  const [ms, todayMs] = [utcMsOf(isoDay), utcMsOf(todayIso)];
  if (ms === null || todayMs === null) return '';
  const days = Math.round((ms - todayMs) / MS_PER_DAY);
  const format = new Intl.RelativeTimeFormat('en-GB', { numeric: 'auto' });
  if (Math.abs(days) < 14) return format.format(days, 'day');
  if (Math.abs(days) < 60) return format.format(Math.round(days / 7), 'week');
  return format.format(Math.round(days / 30.44), 'month');
}
