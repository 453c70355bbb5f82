import { DEMO_PASSWORD, DEMO_PEOPLE, DEMO_SHOPS } from '../db/seeds/demo-people.ts';

/** Prints who may sign in to the demo, a line each, for the start script to show. */
const placeOf = (key: string): string => {
  for (const shop of DEMO_SHOPS)
    for (const [member, role] of shop.members) if (member === key) return `${role}, ${shop.name}`;
  return key === 'steward' ? 'steward of this installation' : 'client';
};

const width = Math.max(...DEMO_PEOPLE.map(({ email }) => email.length));
const lines = DEMO_PEOPLE.map(
  ({ key, email, displayName }) => `  ${email.padEnd(width)}  ${displayName} (${placeOf(key)})`,
);
process.stdout.write(`${lines.join('\n')}\n  Password of each: ${DEMO_PASSWORD}\n`);
