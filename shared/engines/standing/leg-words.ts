import type { LegKind } from './client-facts.ts';

/** How each kind of work reads to a client: done, going on, and to come. */
export const LEG_WORDS: Readonly<Record<LegKind, { done: string; now: string; next: string; short: string }>> = {
  machining: {
    done: 'Turned and hollowed',
    now: 'being turned and hollowed',
    next: 'Turning and hollowing',
    short: 'Turning',
  },
  finishing: {
    done: 'Finished on the outside',
    now: 'being finished on the outside',
    next: 'Surface finish',
    short: 'Finish',
  },
  chassis: { done: 'Chassis made', now: 'having its chassis made', next: 'Chassis', short: 'Chassis' },
  wiring: { done: 'Wired', now: 'being wired', next: 'Wiring', short: 'Wiring' },
  blade: { done: 'Blade made', now: 'having its blade made', next: 'Blade', short: 'Blade' },
  'bench-test': { done: 'Tested', now: 'being tested', next: 'Bench test', short: 'Bench test' },
  other: { done: 'Work done', now: 'being worked on', next: 'Further work', short: 'Work' },
};
