import { addDays, daysBetween, type IsoDay } from '../../units/calendar-day.ts';

/** Whether work is done on a day; a shop's own calendar can stand here. */
export type WorkingDay = (day: IsoDay) => boolean;

/** A search for a working day gives up here: a calendar that never works is a mistake. */
const LONGEST_CLOSURE_DAYS = 400;

/**
 * Counts working days from an origin. Number 0 is the first working day on or after the origin; the number of a day that
 * is not worked is that of the next one that is.
 */
export class WorkingDays {
  readonly #isWorking: WorkingDay;
  readonly #days: IsoDay[] = [];
  #next: IsoDay;

  constructor(origin: IsoDay, isWorking: WorkingDay) {
    this.#isWorking = isWorking;
    this.#next = origin;
  }

  /** The day with a number; fractions belong to the day they fall in. */
  dayOf(number: number): IsoDay {
    const index = Math.max(0, Math.floor(number));
    while (this.#days.length <= index) this.#grow();
    return this.#days[index] ?? this.#next;
  }

  numberOf(day: IsoDay): number {
    while ((this.#days.at(-1) ?? '') < day) this.#grow();
    // Binary search for the first working day on or after it.
    let low = 0;
    let high = this.#days.length - 1;
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((this.#days[middle] ?? '') < day) low = middle + 1;
      else high = middle;
    }
    return low;
  }

  #grow(): void {
    const from = this.#next;
    let day = from;
    while (!this.#isWorking(day)) {
      day = addDays(day, 1);
      if (daysBetween(from, day) > LONGEST_CLOSURE_DAYS) throw new RangeError('The calendar has no working day');
    }
    this.#days.push(day);
    this.#next = addDays(day, 1);
  }
}
