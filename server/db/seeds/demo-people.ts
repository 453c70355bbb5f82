import type { ShopRole, ShopTint } from '../../../shared/contracts/vocabulary.ts';

/** One password for every demo account; the start script prints it. It is public and for the demo alone. */
export const DEMO_PASSWORD = 'salt lantern oil and brass';

export interface DemoPerson {
  key: string;
  email: string;
  displayName: string;
  timeZone: string;
  isSteward?: true;
  preferredUnit?: 'inch';
}

/** All invented. */
export const DEMO_PEOPLE = [
  { key: 'ines', email: 'ines@aldgrove.example', displayName: 'Ines Aldgrove', timeZone: 'Europe/London' },
  { key: 'wilf', email: 'wilf@aldgrove.example', displayName: 'Wilf Carrow', timeZone: 'Europe/London' },
  { key: 'sefa', email: 'sefa@tinderlane.example', displayName: 'Sefa Tindall', timeZone: 'Europe/Dublin' },
  { key: 'joss', email: 'joss@tinderlane.example', displayName: 'Joss Imber', timeZone: 'Europe/Dublin' },
  { key: 'petra', email: 'petra@tinderlane.example', displayName: 'Petra Lunde', timeZone: 'Europe/Dublin' },
  { key: 'maud', email: 'maud@marrowvale.example', displayName: 'Maud Vale', timeZone: 'Europe/Berlin' },
  {
    key: 'colm',
    email: 'colm@colmferry.example',
    displayName: 'Colm Ferry',
    timeZone: 'America/New_York',
    preferredUnit: 'inch',
  },
  { key: 'orla', email: 'orla@penhallow.example', displayName: 'Orla Penhallow', timeZone: 'Europe/London' },
  { key: 'teodor', email: 'teodor@brask.example', displayName: 'Teodor Brask', timeZone: 'Europe/Stockholm' },
  { key: 'hana', email: 'hana@weir.example', displayName: 'Hana Weir', timeZone: 'Europe/London' },
  { key: 'steward', email: 'steward@ferrule.example', displayName: 'Rowan Keel', timeZone: 'UTC', isSteward: true },
] as const satisfies readonly DemoPerson[];

export type PersonKey = (typeof DEMO_PEOPLE)[number]['key'];

export interface DemoShop {
  key: string;
  name: string;
  craft: string;
  country: string;
  timeZone: string;
  tint: ShopTint;
  members: readonly (readonly [PersonKey, ShopRole])[];
}

export const DEMO_SHOPS = [
  {
    key: 'aldgrove',
    name: 'Aldgrove Turning',
    craft: 'Hilts in brass, steel and wood',
    country: 'GB',
    timeZone: 'Europe/London',
    tint: 'verdigris',
    members: [
      ['ines', 'owner'],
      ['wilf', 'hand'],
    ],
  },
  {
    key: 'tinder',
    name: 'Tinder Lane Electrics',
    craft: 'Chassis, wiring and sound',
    country: 'IE',
    timeZone: 'Europe/Dublin',
    tint: 'brass',
    members: [
      ['sefa', 'owner'],
      ['joss', 'hand'],
      ['petra', 'bookkeeper'],
    ],
  },
  {
    key: 'marrow',
    name: 'Marrow & Vale',
    craft: 'Patina, plating and weathering',
    country: 'DE',
    timeZone: 'Europe/Berlin',
    tint: 'oxide',
    members: [['maud', 'owner']],
  },
  {
    key: 'colm',
    name: 'Colm Ferry Blades',
    craft: 'Lit blades',
    country: 'US',
    timeZone: 'America/New_York',
    tint: 'gun-blue',
    members: [['colm', 'owner']],
  },
] as const satisfies readonly DemoShop[];

export type ShopKey = (typeof DEMO_SHOPS)[number]['key'];
