import { relativeDay } from '../../../shared/units/calendar-day.ts';
import { dayInWords } from './day-words.ts';

export interface RelativeDayProps {
  /** Calendar day, 'YYYY-MM-DD'. */
  day: string;
  /** The reader's today, 'YYYY-MM-DD'. */
  today: string;
  form?: 'long' | 'short';
  /** Leaves the bracket out where the column is narrow. */
  withoutRelative?: boolean;
}

/** "Thursday 12 March (in 3 days)": the date can be checked against a calendar, the bracket saves doing so. */
export function RelativeDay({ day, today, form = 'long', withoutRelative = false }: RelativeDayProps) {
  return (
    <time dateTime={day}>
      {dayInWords(day, today, form)}
      {!withoutRelative && <span className="text-lead-grey"> ({relativeDay(day, today)})</span>}
    </time>
  );
}
