import {
  dayRange,
  daysBetween,
  relativeDay,
  shortDay,
  weekdayDayMonth,
  type IsoDay,
} from '../../units/calendar-day.ts';
import type { ClientFacts, ClientLeg } from './client-facts.ts';
import { LEG_WORDS } from './leg-words.ts';

export interface TimelineStep {
  id: string;
  state: 'done' | 'now' | 'held' | 'next';
  title: string;
  words: string;
  day: IsoDay | null;
}

/** The one answer that a client gets, and the same parts for every other reader. */
export interface Standing {
  headline: string;
  waitsOnYou: ClientFacts['waitingOnClient'];
  waitsOnOthers: string[];
  whereEachPartIs: { partId: string; words: string }[];
  held: { legId: string; words: string; sinceDay: IsoDay }[];
  /** Work going on now, in parallel too. */
  now: { legId: string; words: string }[];
  nextAgreedDate: { handoffId: string; day: IsoDay; words: string } | null;
  expected: { fromDay: IsoDay; toDay: IsoDay; words: string } | null;
  timeline: TimelineStep[];
}

const startLower = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1);
const startUpper = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
const joined = (texts: readonly string[]): string =>
  texts.length < 2 ? (texts[0] ?? '') : `${texts.slice(0, -1).join(', ')} and ${texts.at(-1)}`;

const heldLegs = (facts: ClientFacts): (ClientLeg & { held: NonNullable<ClientLeg['held']> })[] =>
  facts.legs.filter((leg): leg is ClientLeg & { held: NonNullable<ClientLeg['held']> } => leg.held !== null);

function holdSentence(leg: ClientLeg & { held: NonNullable<ClientLeg['held']> }, today: IsoDay): string {
  const { held } = leg;
  const shows =
    held.willShow === null
      ? ''
      : held.willShow
        ? held.consentAsked
          ? ' It will show, and waits for your consent.'
          : ' It will show.'
        : ' Nothing will show.';
  return `Held at ${leg.shopName} since ${sinceWords(held.sinceDay, today)} for a small correction: ${startLower(held.clientWords)}.${shows}`;
}

/** A weekday serves within a week; later the date is said. */
const sinceWords = (day: IsoDay, today: IsoDay): string => {
  const age = daysBetween(day, today);
  if (age <= 0) return 'today';
  if (age < 7) return weekdayDayMonth(day).split(' ')[0] ?? day;
  return weekdayDayMonth(day);
};

function movedWords(expected: NonNullable<ClientFacts['expected']>): string {
  if (!expected.previousToDay) return '';
  const days = daysBetween(expected.previousToDay, expected.toDay);
  if (days === 0) return '';
  const size = Math.abs(days);
  return `, ${size === 1 ? 'one day' : `${size} days`} ${days > 0 ? 'later' : 'earlier'} than last told`;
}

function headlineOf(facts: ClientFacts, today: IsoDay): string {
  if (facts.deliveredOn) return `Delivered on ${weekdayDayMonth(facts.deliveredOn)}.`;
  const sentences: string[] = [];
  if (facts.waitingOnClient.length > 0)
    sentences.push(
      `Waiting on ${facts.clientName ?? 'the client'}: ${joined(facts.waitingOnClient.map((wait) => startLower(wait.words)))}.`,
    );
  const held = heldLegs(facts);
  for (const leg of held) sentences.push(holdSentence(leg, today));
  const going = facts.legs.filter((leg) => leg.state === 'under-way' && !leg.held);
  if (going.length > 0)
    sentences.push(`${startUpper(joined(going.map((leg) => `${LEG_WORDS[leg.kind].now} at ${leg.shopName}`)))}.`);
  if (held.length === 0 && going.length === 0) sentences.push(idleSentence(facts, today));
  if (facts.expected)
    sentences.push(`Expected ${dayRange(facts.expected.fromDay, facts.expected.toDay)}${movedWords(facts.expected)}.`);
  return sentences.filter(Boolean).join(' ');
}

function idleSentence(facts: ClientFacts, today: IsoDay): string {
  if (facts.legs.length === 0) return 'The brief is being settled; no work is planned yet.';
  if (facts.legs.every((leg) => leg.state === 'finished'))
    return 'All work is finished; it is on its way to being handed over.';
  const next = facts.legs.find((leg) => leg.state === 'planned');
  if (!next) return '';
  const when = next.plannedStartOn
    ? `, planned for ${weekdayDayMonth(next.plannedStartOn)} (${relativeDay(next.plannedStartOn, today)})`
    : '';
  return `Between benches. Next: ${startLower(LEG_WORDS[next.kind].next)} at ${next.shopName}${when}.`;
}

function stepOf(leg: ClientLeg): TimelineStep {
  const words = LEG_WORDS[leg.kind];
  if (leg.state === 'finished')
    return {
      id: leg.id,
      state: 'done',
      title: words.done,
      words: leg.finishedOn ? `done ${shortDay(leg.finishedOn)}` : 'done',
      day: leg.finishedOn,
    };
  if (leg.held)
    return {
      id: leg.id,
      state: 'held',
      title: `${words.next}, paused for a correction`,
      words: startLower(leg.held.clientWords),
      day: leg.held.sinceDay,
    };
  if (leg.state === 'under-way')
    return {
      id: leg.id,
      state: 'now',
      title: words.next,
      words: `at ${leg.shopName}${leg.startedOn ? ` since ${shortDay(leg.startedOn)}` : ''}`,
      day: leg.startedOn,
    };
  return {
    id: leg.id,
    state: 'next',
    title: words.next,
    words: leg.plannedStartOn ? `likely from ${shortDay(leg.plannedStartOn)}` : 'to come',
    day: leg.plannedStartOn,
  };
}

function nextAgreed(facts: ClientFacts, today: IsoDay): Standing['nextAgreedDate'] {
  const partNames = new Map(facts.parts.map((part) => [part.id, part.name]));
  const [next] = facts.handoffs
    .filter((handoff) => handoff.agreedOn && !handoff.doneOn)
    .sort((one, other) => ((one.agreedOn ?? '') + one.id < (other.agreedOn ?? '') + other.id ? -1 : 1));
  if (!next?.agreedOn) return null;
  const what = joined(
    next.partIds
      .map((id) => partNames.get(id) ?? '')
      .filter(Boolean)
      .sort(),
  );
  return {
    handoffId: next.id,
    day: next.agreedOn,
    words: `${what} from ${next.fromName} to ${next.toName} on ${weekdayDayMonth(next.agreedOn)} (${relativeDay(next.agreedOn, today)})`,
  };
}

/**
 * The merged status: one sentence, and what stands behind it. Pure, run on server and browser alike, and given only what
 * a client may know.
 *
 * @param today the calendar day in the reader's time zone
 */
export function standingFor(facts: ClientFacts, today: IsoDay): Standing {
  const over = facts.deliveredOn !== null;
  const steps = facts.legs.map(stepOf);
  const last: TimelineStep = over
    ? {
        id: 'delivery',
        state: 'done',
        title: 'Handed over',
        words: facts.deliveredOn ? `on ${shortDay(facts.deliveredOn)}` : '',
        day: facts.deliveredOn,
      }
    : {
        id: 'delivery',
        state: 'next',
        title: 'Then handed over',
        words: facts.expected ? `likely ${dayRange(facts.expected.fromDay, facts.expected.toDay)}` : 'no date yet',
        day: facts.expected?.fromDay ?? null,
      };
  return {
    headline: headlineOf(facts, today),
    waitsOnYou: over ? [] : facts.waitingOnClient,
    waitsOnOthers: over ? [] : facts.waitingOnOthers.map((wait) => `${wait.who}, for ${wait.forWhat}`),
    whereEachPartIs: facts.parts.map((part) => ({
      partId: part.id,
      words: `${part.name}: with ${part.holderName}${part.sinceDay ? ` since ${shortDay(part.sinceDay)}` : ''}`,
    })),
    held: heldLegs(facts).map((leg) => ({
      legId: leg.id,
      words: holdSentence(leg, today),
      sinceDay: leg.held.sinceDay,
    })),
    now: facts.legs
      .filter((leg) => leg.state === 'under-way' && !leg.held)
      .map((leg) => ({ legId: leg.id, words: `${startUpper(LEG_WORDS[leg.kind].now)} at ${leg.shopName}` })),
    nextAgreedDate: over ? null : nextAgreed(facts, today),
    expected:
      over || !facts.expected
        ? null
        : {
            fromDay: facts.expected.fromDay,
            toDay: facts.expected.toDay,
            words: `${dayRange(facts.expected.fromDay, facts.expected.toDay)}${movedWords(facts.expected)}`,
          },
    timeline: [...steps, last],
  };
}
