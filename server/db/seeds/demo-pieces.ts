import type {
  Audience,
  CommissionState,
  ConsentState,
  Currency,
  FilePurpose,
  JointKind,
  JointSide,
  LegKind,
  LegState,
  NoteState,
  OfferState,
  PartKind,
  PartyRole,
  ReportState,
} from '../../../shared/contracts/vocabulary.ts';
import type { PersonKey, ShopKey } from './demo-people.ts';

/** Days are counted from the day the demo is made, in working life's direction: minus is past. */
export interface DemoPiece {
  pictureKey: 'salt-lantern' | 'heron' | 'second-winter' | 'cartographer';
  title: string;
  brief: string;
  state: CommissionState;
  dateWantedIn: number | null;
  budgetMinor: number;
  currency: Currency;
  lead: ShopKey;
  client: PersonKey;
  shops: readonly (readonly [ShopKey, readonly PartyRole[]])[];
  guest?: PersonKey;
  told?: readonly [from: number, to: number];
  deliveredIn?: number;
  parts: readonly { key: string; name: string; kind: PartKind; holder: ShopKey | 'client'; since: number }[];
  legs: readonly {
    key: string;
    shop: ShopKey;
    part: string;
    kind: LegKind;
    title: string;
    state: LegState;
    days: readonly [number, number, number];
    planned: number;
    started?: number;
    finished?: number;
    after: readonly string[];
    privateNote?: string;
  }[];
  joints: readonly {
    key: string;
    name: string;
    kind: JointKind;
    hole: readonly [part: string, shop: ShopKey];
    shaft: readonly [part: string, shop: ShopKey];
    nominalMm: number;
    clearanceUm: readonly [number, number];
    holeClass?: string;
    shaftClass?: string;
    handFit?: string;
    engagementMm?: number;
    hiddenLengthMm?: number;
    note?: string;
    sets: readonly {
      side: JointSide;
      by: PersonKey;
      shop: ShopKey;
      day: number;
      resolutionUm: number;
      gauge: string;
      values: readonly string[];
    }[];
  }[];
  reports: readonly {
    joint: string;
    title: string;
    plainWords: string;
    state: ReportState;
    heldLeg: string | null;
    raisedBy: PersonKey;
    raisedShop: ShopKey;
    answerShop: ShopKey;
    day: number;
    clientWords: string;
    note?: {
      by: PersonKey;
      day: number;
      state: NoteState;
      method: string;
      cutSide: JointSide;
      removeUm: number;
      overMm: number | null;
      risk: string;
      shows: boolean;
      whereItShows: string;
      costMinor: number;
      costBorneBy: ShopKey | 'client';
      effectDays: number;
      consent?: ConsentState;
    };
    history: readonly (readonly [
      act: string,
      from: ReportState | null,
      to: ReportState,
      by: PersonKey,
      day: number,
      words: string,
    ])[];
    pictures: readonly FilePurpose[];
  }[];
  handoffs: readonly {
    from: ShopKey;
    to: ShopKey | 'client';
    parts: readonly string[];
    fromLeg: string | null;
    toLeg: string | null;
    transitDays: number;
    carriage: string;
    agreedIn?: number;
    doneIn?: number;
    offers?: readonly {
      by: ShopKey | 'client';
      person: PersonKey;
      onDayIn: number;
      words: string;
      state: OfferState;
      day: number;
      reason?: string;
      answeredBy?: PersonKey;
    }[];
  }[];
  threads: readonly {
    subject: 'commission' | readonly ['joint' | 'leg' | 'report', string];
    title: string;
    audience: Audience;
    named?: readonly ShopKey[];
    openedBy: ShopKey;
    messages: readonly { by: PersonKey; day: number; body: string; mentions?: readonly PersonKey[]; picture?: true }[];
  }[];
}

const saltLantern: DemoPiece = {
  pictureKey: 'salt-lantern',
  title: 'The Salt Lantern',
  brief:
    'A sea-watch hilt in brass with a walnut grip, worn as if it had hung by a harbour door for sixty years. Warm white blade with a slow swell, one switch, sound kept low. The pommel comes off by hand for charging.',
  state: 'at-work',
  dateWantedIn: 45,
  budgetMinor: 248000,
  currency: 'EUR',
  lead: 'tinder',
  client: 'orla',
  guest: 'hana',
  shops: [
    ['tinder', ['lead', 'installer']],
    ['aldgrove', ['maker']],
    ['marrow', ['finisher']],
    ['colm', ['maker']],
  ],
  told: [20, 27],
  parts: [
    { key: 'hilt', name: 'Hilt', kind: 'hilt', holder: 'tinder', since: -4 },
    { key: 'pommel', name: 'Pommel', kind: 'pommel', holder: 'tinder', since: -4 },
    { key: 'chassis', name: 'Chassis', kind: 'chassis', holder: 'tinder', since: -20 },
    { key: 'blade', name: 'Blade', kind: 'blade', holder: 'colm', since: -3 },
  ],
  legs: [
    {
      key: 'machining',
      shop: 'aldgrove',
      part: 'hilt',
      kind: 'machining',
      title: 'Turn and hollow the hilt',
      state: 'finished',
      days: [8, 10, 15],
      planned: -36,
      started: -36,
      finished: -21,
      after: [],
      privateNote: 'Blank was the last of the 40 mm bar; order more before the next one.',
    },
    {
      key: 'patina',
      shop: 'marrow',
      part: 'hilt',
      kind: 'finishing',
      title: 'Harbour patina',
      state: 'finished',
      days: [4, 6, 9],
      planned: -17,
      started: -17,
      finished: -8,
      after: ['machining'],
    },
    {
      key: 'chassis',
      shop: 'tinder',
      part: 'chassis',
      kind: 'chassis',
      title: 'Chassis',
      state: 'finished',
      days: [5, 7, 10],
      planned: -24,
      started: -24,
      finished: -10,
      after: [],
    },
    {
      key: 'wiring',
      shop: 'tinder',
      part: 'hilt',
      kind: 'wiring',
      title: 'Wire and fit',
      state: 'under-way',
      days: [6, 9, 14],
      planned: -4,
      started: -4,
      after: ['patina', 'chassis'],
      privateNote: 'Speaker spare is in the left drawer.',
    },
    {
      key: 'blade',
      shop: 'colm',
      part: 'blade',
      kind: 'blade',
      title: 'Blade, 7/8 inch',
      state: 'under-way',
      days: [8, 12, 18],
      planned: -3,
      started: -3,
      after: [],
    },
    {
      key: 'bench',
      shop: 'tinder',
      part: 'hilt',
      kind: 'bench-test',
      title: 'Bench test',
      state: 'planned',
      days: [1, 2, 4],
      planned: 14,
      after: ['wiring', 'blade'],
    },
  ],
  joints: [
    {
      key: 'spigot',
      name: 'Pommel spigot in hilt bore',
      kind: 'spigot-in-bore',
      hole: ['hilt', 'aldgrove'],
      shaft: ['pommel', 'tinder'],
      nominalMm: 32,
      clearanceUm: [50, 100],
      holeClass: 'H8',
      shaftClass: 'f7',
      handFit: 'hand slip',
      engagementMm: 16,
      hiddenLengthMm: 14.5,
      note: 'Drawn by hand for charging, so it has to slip and still not rattle. The last 1.5 mm shows as a bright line when closed.',
      sets: [
        {
          side: 'hole',
          by: 'joss',
          shop: 'tinder',
          day: -2,
          resolutionUm: 10,
          gauge: 'Bore gauge and micrometer',
          values: ['32.031', '32.018', '32.012', '32.026', '32.009', '32.015'],
        },
        {
          side: 'shaft',
          by: 'joss',
          shop: 'tinder',
          day: -2,
          resolutionUm: 10,
          gauge: 'Digital caliper',
          values: ['32.022', '32.031', '32.044', '32.038', '32.052', '32.047'],
        },
      ],
    },
    {
      key: 'cavity',
      name: 'Chassis in cavity',
      kind: 'chassis-in-cavity',
      hole: ['hilt', 'aldgrove'],
      shaft: ['chassis', 'tinder'],
      nominalMm: 28,
      clearanceUm: [150, 400],
      engagementMm: 140,
      sets: [
        {
          side: 'hole',
          by: 'wilf',
          shop: 'aldgrove',
          day: -22,
          resolutionUm: 10,
          gauge: 'Telescoping gauge',
          values: ['28.05', '28.06', '28.04', '28.05'],
        },
        {
          side: 'shaft',
          by: 'joss',
          shop: 'tinder',
          day: -10,
          resolutionUm: 10,
          gauge: 'Digital caliper',
          values: ['27.80', '27.82', '27.81', '27.80'],
        },
      ],
    },
    {
      key: 'holder',
      name: 'Blade in holder',
      kind: 'blade-in-holder',
      hole: ['hilt', 'aldgrove'],
      shaft: ['blade', 'colm'],
      nominalMm: 22.225,
      clearanceUm: [60, 200],
      handFit: 'slides by hand',
      engagementMm: 45,
      sets: [
        {
          side: 'hole',
          by: 'wilf',
          shop: 'aldgrove',
          day: -22,
          resolutionUm: 10,
          gauge: 'Telescoping gauge',
          values: ['22.33', '22.34', '22.33'],
        },
      ],
    },
  ],
  reports: [
    {
      joint: 'spigot',
      title: 'Pommel will not draw',
      plainWords:
        'Moves 2 mm and binds. A strap wrench gets it off, a hand does not. Rub mark on one side of the bore.',
      state: 'answered',
      heldLeg: 'wiring',
      raisedBy: 'joss',
      raisedShop: 'tinder',
      answerShop: 'aldgrove',
      day: -2,
      clientWords: 'The end cap was too tight',
      note: {
        by: 'ines',
        day: -1,
        state: 'offered',
        method:
          'Bore eased with 320 paper first, no gain. Will turn the spigot 0.12 on diameter over 14.5, one finishing pass, and stop before the bright metal shows when closed. At our cost.',
        cutSide: 'shaft',
        removeUm: 120,
        overMm: 14.5,
        risk: 'Thin wall at the thread relief; will go in soft jaws.',
        shows: false,
        whereItShows: '',
        costMinor: 4500,
        costBorneBy: 'aldgrove',
        effectDays: 3,
      },
      history: [
        ['raise', null, 'raised', 'joss', -2, 'Third try with the strap wrench and I stopped.'],
        ['answer', 'raised', 'answered', 'ines', -1, 'Will turn the spigot 0.12 on diameter over 14.5.'],
      ],
      pictures: ['before', 'before'],
    },
  ],
  handoffs: [
    {
      from: 'aldgrove',
      to: 'marrow',
      parts: ['hilt', 'pommel'],
      fromLeg: 'machining',
      toLeg: 'patina',
      transitDays: 2,
      carriage: 'Courier',
      agreedIn: -18,
      doneIn: -17,
    },
    {
      from: 'marrow',
      to: 'tinder',
      parts: ['hilt', 'pommel'],
      fromLeg: 'patina',
      toLeg: 'wiring',
      transitDays: 2,
      carriage: 'Courier',
      agreedIn: -5,
      doneIn: -4,
    },
    {
      from: 'tinder',
      to: 'aldgrove',
      parts: ['pommel'],
      fromLeg: null,
      toLeg: null,
      transitDays: 1,
      carriage: 'Post, tracked',
      offers: [
        {
          by: 'aldgrove',
          person: 'ines',
          onDayIn: 2,
          words: 'I have the lathe free that afternoon.',
          state: 'standing',
          day: -1,
        },
      ],
    },
    {
      from: 'colm',
      to: 'tinder',
      parts: ['blade'],
      fromLeg: 'blade',
      toLeg: 'bench',
      transitDays: 4,
      carriage: 'Air post',
      agreedIn: 16,
      offers: [{ by: 'colm', person: 'colm', onDayIn: 16, words: '', state: 'accepted', day: -6, answeredBy: 'sefa' }],
    },
    {
      from: 'tinder',
      to: 'client',
      parts: ['hilt', 'pommel', 'chassis', 'blade'],
      fromLeg: 'bench',
      toLeg: null,
      transitDays: 2,
      carriage: 'Courier, signed for',
    },
  ],
  threads: [
    {
      subject: 'commission',
      title: 'With Orla',
      audience: 'everyone',
      openedBy: 'tinder',
      messages: [
        {
          by: 'sefa',
          day: -40,
          body: 'Welcome, Orla. Everything that needs you will be on this page, and you can write here to all of us.',
        },
        { by: 'orla', day: -39, body: 'Thank you. Could the swell be slower than in the sketch, more like breathing?' },
        { by: 'sefa', day: -39, body: 'Yes. I will send a recording from the bench when the board is in.' },
        { by: 'maud', day: -9, body: 'The patina has settled. Here it is in daylight.', picture: true },
        { by: 'orla', day: -8, body: 'That is exactly it. It looks as if it had always been there.' },
      ],
    },
    {
      subject: 'commission',
      title: 'Makers',
      audience: 'makers',
      openedBy: 'tinder',
      messages: [
        { by: 'sefa', day: -38, body: 'Plan is up. Maud, the hilt reaches you on the Thursday if the post behaves.' },
        { by: 'maud', day: -37, body: 'Good. Keep threads masked, please; the liver of sulphur gets everywhere.' },
        { by: 'wilf', day: -22, body: 'Cavity came out at 28.05, even along the length.', mentions: ['joss'] },
        { by: 'colm', day: -6, body: 'Blade tube is here, 7/8 on the nose. I can post in sixteen days.' },
      ],
    },
    {
      subject: ['report', 'spigot'],
      title: 'Pommel will not draw',
      audience: 'named',
      named: ['aldgrove', 'tinder'],
      openedBy: 'tinder',
      messages: [
        {
          by: 'joss',
          day: -2,
          body: 'Third try with the strap wrench and I stopped. It moves 2 mm and binds. Readings are on the joint.',
          picture: true,
        },
        {
          by: 'ines',
          day: -1,
          body: 'Same here before plating. Bore is out of round by 0.022, I will not chase it with paper.',
          mentions: ['joss'],
        },
        { by: 'joss', day: -1, body: 'Agreed. If you take it off the spigot, stop short of the shoulder.' },
      ],
    },
    {
      subject: ['joint', 'spigot'],
      title: 'Bench notes',
      audience: 'own-shop',
      named: ['aldgrove'],
      openedBy: 'aldgrove',
      messages: [{ by: 'wilf', day: -1, body: 'Soft jaws are bored to 36 already from the last one.' }],
    },
  ],
};

const heron: DemoPiece = {
  pictureKey: 'heron',
  title: 'Heron at Dusk',
  brief:
    'A slender hilt in blackened steel with one copper band, for stage use. Cold blue blade. It must take knocks; marks are welcome.',
  state: 'at-work',
  dateWantedIn: 30,
  budgetMinor: 189000,
  currency: 'EUR',
  lead: 'aldgrove',
  client: 'teodor',
  shops: [
    ['aldgrove', ['lead', 'maker']],
    ['marrow', ['finisher']],
    ['tinder', ['installer']],
  ],
  told: [20, 26],
  parts: [
    { key: 'hilt', name: 'Hilt', kind: 'hilt', holder: 'marrow', since: -6 },
    { key: 'emitter', name: 'Emitter', kind: 'emitter', holder: 'aldgrove', since: -15 },
    { key: 'chassis', name: 'Chassis', kind: 'chassis', holder: 'tinder', since: -12 },
  ],
  legs: [
    {
      key: 'machining',
      shop: 'aldgrove',
      part: 'hilt',
      kind: 'machining',
      title: 'Turn the hilt and band',
      state: 'finished',
      days: [6, 8, 12],
      planned: -20,
      started: -20,
      finished: -9,
      after: [],
    },
    {
      key: 'blackening',
      shop: 'marrow',
      part: 'hilt',
      kind: 'finishing',
      title: 'Blackening and wax',
      state: 'under-way',
      days: [3, 5, 8],
      planned: -6,
      started: -6,
      after: ['machining'],
    },
    {
      key: 'chassis',
      shop: 'tinder',
      part: 'chassis',
      kind: 'chassis',
      title: 'Chassis',
      state: 'under-way',
      days: [4, 6, 9],
      planned: -12,
      started: -12,
      after: [],
    },
    {
      key: 'wiring',
      shop: 'tinder',
      part: 'hilt',
      kind: 'wiring',
      title: 'Wire and fit',
      state: 'planned',
      days: [5, 7, 11],
      planned: 5,
      after: ['blackening', 'chassis'],
    },
    {
      key: 'bench',
      shop: 'tinder',
      part: 'hilt',
      kind: 'bench-test',
      title: 'Bench test',
      state: 'planned',
      days: [1, 2, 3],
      planned: 14,
      after: ['wiring'],
    },
  ],
  joints: [
    {
      key: 'emitter',
      name: 'Emitter spigot in hilt',
      kind: 'spigot-in-bore',
      hole: ['hilt', 'marrow'],
      shaft: ['emitter', 'aldgrove'],
      nominalMm: 30,
      clearanceUm: [20, 60],
      handFit: 'firm push',
      engagementMm: 12,
      hiddenLengthMm: 11,
      sets: [
        {
          side: 'hole',
          by: 'maud',
          shop: 'marrow',
          day: -4,
          resolutionUm: 1,
          gauge: 'Inside micrometer',
          values: ['29.991', '29.988', '29.990', '29.986'],
        },
        {
          side: 'shaft',
          by: 'ines',
          shop: 'aldgrove',
          day: -4,
          resolutionUm: 1,
          gauge: 'Micrometer',
          values: ['29.994', '29.996', '29.995', '29.993'],
        },
      ],
    },
  ],
  reports: [
    {
      joint: 'emitter',
      title: 'Emitter tight after blackening',
      plainWords: 'Coating closed the mouth of the bore. It starts and stops at 3 mm.',
      state: 'agreed',
      heldLeg: 'blackening',
      raisedBy: 'maud',
      raisedShop: 'marrow',
      answerShop: 'aldgrove',
      day: -4,
      clientWords: 'The front piece is eased so that it seats fully',
      note: {
        by: 'ines',
        day: -3,
        state: 'agreed',
        method:
          'Turn the emitter spigot 0.048 on diameter over 11 mm. The shoulder edge is broken by 0.3, which shows as a fine bright ring.',
        cutSide: 'shaft',
        removeUm: 48,
        overMm: 11,
        risk: 'None to speak of',
        shows: true,
        whereItShows: 'A fine bright ring where the front piece meets the hilt',
        costMinor: 3000,
        costBorneBy: 'aldgrove',
        effectDays: 2,
        consent: 'asked',
      },
      history: [
        ['raise', null, 'raised', 'maud', -4, 'Starts and stops at 3 mm.'],
        ['answer', 'raised', 'answered', 'ines', -3, 'Turn the emitter spigot 0.048 on diameter.'],
        ['agree', 'answered', 'agreed', 'maud', -2, ''],
      ],
      pictures: ['before'],
    },
  ],
  handoffs: [
    {
      from: 'aldgrove',
      to: 'marrow',
      parts: ['hilt'],
      fromLeg: 'machining',
      toLeg: 'blackening',
      transitDays: 2,
      carriage: 'Courier',
      agreedIn: -7,
      doneIn: -6,
    },
    {
      from: 'marrow',
      to: 'tinder',
      parts: ['hilt'],
      fromLeg: 'blackening',
      toLeg: 'wiring',
      transitDays: 2,
      carriage: 'Courier',
      agreedIn: 4,
      offers: [{ by: 'marrow', person: 'maud', onDayIn: 4, words: '', state: 'accepted', day: -5, answeredBy: 'joss' }],
    },
    {
      from: 'tinder',
      to: 'client',
      parts: ['hilt', 'emitter', 'chassis'],
      fromLeg: 'bench',
      toLeg: null,
      transitDays: 3,
      carriage: 'Courier, signed for',
    },
  ],
  threads: [
    {
      subject: 'commission',
      title: 'With Teodor',
      audience: 'everyone',
      openedBy: 'aldgrove',
      messages: [
        { by: 'ines', day: -21, body: 'Steel is on the lathe today. First picture at the end of the week.' },
        { by: 'teodor', day: -20, body: 'Looking forward. The theatre opens in seven weeks, so there is air.' },
        { by: 'ines', day: -10, body: 'Turned, with the copper band shrunk on.', picture: true },
      ],
    },
    {
      subject: 'commission',
      title: 'Makers',
      audience: 'makers',
      openedBy: 'aldgrove',
      messages: [
        { by: 'maud', day: -5, body: 'Blackening takes well. I mask the bore mouth next time.' },
        { by: 'joss', day: -5, body: 'Chassis will be ready before the hilt is.' },
      ],
    },
  ],
};

const secondWinter: DemoPiece = {
  pictureKey: 'second-winter',
  title: 'Second Winter',
  brief:
    'Bead-blasted aluminium with bone-coloured resin rings. White blade that starts like frost. A pair to an older piece of mine, so the length must match: 282 mm.',
  state: 'at-work',
  dateWantedIn: 90,
  budgetMinor: 210000,
  currency: 'EUR',
  lead: 'tinder',
  client: 'teodor',
  shops: [
    ['tinder', ['lead', 'installer']],
    ['aldgrove', ['maker']],
    ['marrow', ['finisher']],
  ],
  parts: [
    { key: 'hilt', name: 'Hilt', kind: 'hilt', holder: 'aldgrove', since: -5 },
    { key: 'pommel', name: 'Pommel', kind: 'pommel', holder: 'aldgrove', since: -5 },
  ],
  legs: [
    {
      key: 'machining',
      shop: 'aldgrove',
      part: 'hilt',
      kind: 'machining',
      title: 'Turn and hollow',
      state: 'under-way',
      days: [7, 9, 14],
      planned: -3,
      started: -3,
      after: [],
    },
    {
      key: 'blasting',
      shop: 'marrow',
      part: 'hilt',
      kind: 'finishing',
      title: 'Bead blasting and seal',
      state: 'planned',
      days: [2, 3, 5],
      planned: 12,
      after: ['machining'],
    },
    {
      key: 'wiring',
      shop: 'tinder',
      part: 'hilt',
      kind: 'wiring',
      title: 'Wire and fit',
      state: 'planned',
      days: [6, 8, 12],
      planned: 20,
      after: ['blasting'],
    },
    {
      key: 'bench',
      shop: 'tinder',
      part: 'hilt',
      kind: 'bench-test',
      title: 'Bench test',
      state: 'planned',
      days: [1, 2, 3],
      planned: 32,
      after: ['wiring'],
    },
  ],
  joints: [
    {
      key: 'pommel',
      name: 'Pommel spigot in hilt bore',
      kind: 'spigot-in-bore',
      hole: ['hilt', 'aldgrove'],
      shaft: ['pommel', 'aldgrove'],
      nominalMm: 30,
      clearanceUm: [20, 74],
      holeClass: 'H8',
      shaftClass: 'f7',
      engagementMm: 14,
      sets: [],
    },
  ],
  reports: [],
  handoffs: [
    {
      from: 'aldgrove',
      to: 'marrow',
      parts: ['hilt', 'pommel'],
      fromLeg: 'machining',
      toLeg: 'blasting',
      transitDays: 2,
      carriage: 'Courier',
      offers: [
        {
          by: 'aldgrove',
          person: 'wilf',
          onDayIn: 14,
          words: 'Allows for a second pass on the bore.',
          state: 'countered',
          day: -2,
          answeredBy: 'maud',
        },
        {
          by: 'marrow',
          person: 'maud',
          onDayIn: 11,
          words: 'The cabinet is booked from the 14th day on; could it be earlier?',
          state: 'standing',
          day: -1,
        },
      ],
    },
    {
      from: 'marrow',
      to: 'tinder',
      parts: ['hilt', 'pommel'],
      fromLeg: 'blasting',
      toLeg: 'wiring',
      transitDays: 2,
      carriage: 'Courier',
    },
    {
      from: 'tinder',
      to: 'client',
      parts: ['hilt', 'pommel'],
      fromLeg: 'bench',
      toLeg: null,
      transitDays: 3,
      carriage: 'Courier, signed for',
    },
  ],
  threads: [
    {
      subject: 'commission',
      title: 'With Teodor',
      audience: 'everyone',
      openedBy: 'tinder',
      messages: [
        { by: 'teodor', day: -6, body: 'The older piece is 282 mm over all. I measured it three times.' },
        { by: 'sefa', day: -5, body: 'Noted in the brief, and Aldgrove has it on the drawing.', picture: true },
      ],
    },
  ],
};

const cartographer: DemoPiece = {
  pictureKey: 'cartographer',
  title: 'The Cartographer',
  brief: 'Bronze, patinated, with contour lines engraved round the body. Amber blade. A retirement gift.',
  state: 'delivered',
  dateWantedIn: -10,
  budgetMinor: 265000,
  currency: 'EUR',
  lead: 'aldgrove',
  client: 'orla',
  deliveredIn: -12,
  shops: [
    ['aldgrove', ['lead', 'maker']],
    ['marrow', ['finisher']],
    ['tinder', ['installer']],
  ],
  parts: [
    { key: 'hilt', name: 'Hilt', kind: 'hilt', holder: 'client', since: -12 },
    { key: 'pommel', name: 'Pommel', kind: 'pommel', holder: 'client', since: -12 },
  ],
  legs: [
    {
      key: 'machining',
      shop: 'aldgrove',
      part: 'hilt',
      kind: 'machining',
      title: 'Turn and engrave',
      state: 'finished',
      days: [10, 12, 18],
      planned: -80,
      started: -80,
      finished: -62,
      after: [],
    },
    {
      key: 'patina',
      shop: 'marrow',
      part: 'hilt',
      kind: 'finishing',
      title: 'Patina',
      state: 'finished',
      days: [4, 5, 8],
      planned: -58,
      started: -58,
      finished: -50,
      after: ['machining'],
    },
    {
      key: 'wiring',
      shop: 'tinder',
      part: 'hilt',
      kind: 'wiring',
      title: 'Wire and fit',
      state: 'finished',
      days: [6, 8, 12],
      planned: -46,
      started: -46,
      finished: -20,
      after: ['patina'],
    },
    {
      key: 'bench',
      shop: 'tinder',
      part: 'hilt',
      kind: 'bench-test',
      title: 'Bench test',
      state: 'finished',
      days: [1, 2, 3],
      planned: -18,
      started: -18,
      finished: -16,
      after: ['wiring'],
    },
  ],
  joints: [
    {
      key: 'pommel',
      name: 'Pommel spigot in hilt bore',
      kind: 'spigot-in-bore',
      hole: ['hilt', 'aldgrove'],
      shaft: ['pommel', 'tinder'],
      nominalMm: 31,
      clearanceUm: [40, 90],
      handFit: 'hand slip',
      engagementMm: 15,
      hiddenLengthMm: 14,
      sets: [
        {
          side: 'hole',
          by: 'joss',
          shop: 'tinder',
          day: -40,
          resolutionUm: 10,
          gauge: 'Bore gauge',
          values: ['31.02', '31.02', '31.03'],
        },
        {
          side: 'shaft',
          by: 'joss',
          shop: 'tinder',
          day: -40,
          resolutionUm: 10,
          gauge: 'Digital caliper',
          values: ['31.00', '31.01', '31.01'],
        },
        {
          side: 'shaft',
          by: 'joss',
          shop: 'tinder',
          day: -30,
          resolutionUm: 10,
          gauge: 'Digital caliper',
          values: ['30.95', '30.96', '30.95'],
        },
      ],
    },
  ],
  reports: [
    {
      joint: 'pommel',
      title: 'Pommel drags',
      plainWords: 'Comes off, but it drags and squeaks.',
      state: 'closed',
      heldLeg: null,
      raisedBy: 'joss',
      raisedShop: 'tinder',
      answerShop: 'aldgrove',
      day: -40,
      clientWords: 'The end cap was eased',
      note: {
        by: 'ines',
        day: -39,
        state: 'done',
        method: 'Turned 0.05 off the spigot, polished.',
        cutSide: 'shaft',
        removeUm: 50,
        overMm: 14,
        risk: '',
        shows: false,
        whereItShows: '',
        costMinor: 0,
        costBorneBy: 'aldgrove',
        effectDays: 4,
      },
      history: [
        ['raise', null, 'raised', 'joss', -40, 'Drags and squeaks.'],
        ['answer', 'raised', 'answered', 'ines', -39, 'Turn 0.05 off the spigot.'],
        ['agree', 'answered', 'agreed', 'joss', -39, ''],
        ['start-rework', 'agreed', 'being-reworked', 'ines', -35, ''],
        ['finish-rework', 'being-reworked', 'to-be-verified', 'ines', -33, 'Polished, on its way back.'],
        ['verify-pass', 'to-be-verified', 'closed', 'joss', -30, 'Slips by hand, no rattle.'],
      ],
      pictures: ['before', 'after'],
    },
  ],
  handoffs: [
    {
      from: 'aldgrove',
      to: 'marrow',
      parts: ['hilt', 'pommel'],
      fromLeg: 'machining',
      toLeg: 'patina',
      transitDays: 2,
      carriage: 'Courier',
      agreedIn: -60,
      doneIn: -59,
    },
    {
      from: 'marrow',
      to: 'tinder',
      parts: ['hilt', 'pommel'],
      fromLeg: 'patina',
      toLeg: 'wiring',
      transitDays: 2,
      carriage: 'Courier',
      agreedIn: -48,
      doneIn: -47,
    },
    {
      from: 'tinder',
      to: 'client',
      parts: ['hilt', 'pommel'],
      fromLeg: 'bench',
      toLeg: null,
      transitDays: 2,
      carriage: 'Courier, signed for',
      agreedIn: -13,
      doneIn: -12,
    },
  ],
  threads: [
    {
      subject: 'commission',
      title: 'With Orla',
      audience: 'everyone',
      openedBy: 'aldgrove',
      messages: [
        { by: 'ines', day: -14, body: 'It leaves Tinder Lane tomorrow, signed for.' },
        { by: 'orla', day: -11, body: 'He wept a little. Thank you, all of you.' },
      ],
    },
  ],
};

export const DEMO_PIECES: readonly DemoPiece[] = [saltLantern, heron, secondWinter, cartographer];
