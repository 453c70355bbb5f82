// npm run screens -- http://127.0.0.1:4310: draws docs/pictures from a running Ferrule with the demo. It starts nothing.
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { chromium } from '@playwright/test';
import sharp from 'sharp';
import { DEMO_PASSWORD } from '../db/seeds/demo-people.ts';
import { findChromium } from './chromium.mjs';
import { CHECKOUT } from './folders.mjs';
import { Halt, say } from './halt.mjs';
import { DEFAULT_APP_PORT } from './ports.mjs';
import { runCommand } from './scope.mjs';

/** @typedef {import('@playwright/test').Page} Page */

const FOLDER = join(CHECKOUT, 'docs', 'pictures');
const COMMISSION = 'The Salt Lantern';
const LEAD = 'sefa@tinderlane.example';
const CLIENT = 'orla@penhallow.example';

/** What all pictures together may weigh: they are in every clone. */
const ALL_BYTES = 2.5 * 1024 * 1024;
/** Palettes tried from the finest on, until a picture is light enough. */
const PALETTES = [256, 128, 64, 32, 16];

const ROOMS = new Set(['report', 'joint', 'handoff']);

const SIZES = /** @type {const} */ ([
  { width: 1440, height: 1000 },
  { width: 360, height: 780 },
]);
const SCHEMES = /** @type {const} */ (['light', 'dark']);

/**
 * The first link of the commission's page to one of its records.
 * @param {string} part
 */
const firstLink = (part) => async (/** @type {Page} */ page, /** @type {string} */ commission) => {
  await page.goto(commission);
  return addressOf(page.locator(`a[href*="${part}"]`).first(), part);
};

/** @type {readonly { name: string, email: string, path: (page: Page, commission: string) => string | Promise<string> }[]} */
const SCREENS = [
  { name: 'bench', email: LEAD, path: () => '/' },
  { name: 'commission', email: LEAD, path: (_page, commission) => commission },
  { name: 'report', email: LEAD, path: firstLink('/reports/') },
  { name: 'joint', email: LEAD, path: firstLink('/joints/') },
  { name: 'handoff', email: LEAD, path: firstLink('/handoffs/') },
  { name: 'client', email: CLIENT, path: (_page, commission) => commission },
];

/**
 * @param {import('@playwright/test').Locator} link
 * @param {string} what
 */
async function addressOf(link, what) {
  const href = await link.getAttribute('href');
  if (!href) throw new Halt(`There is no link to ${what}. Is the demo laid out?`);
  return href;
}

/**
 * @param {import('@playwright/test').Browser} browser
 * @param {string} origin
 * @param {string} email
 */
async function signIn(browser, origin, email) {
  const context = await browser.newContext({ baseURL: origin, reducedMotion: 'reduce' });
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => url.pathname === '/');
  await page.goto('/commissions');
  return { page, commission: await addressOf(page.getByRole('link', { name: COMMISSION }), COMMISSION) };
}

/**
 * The screenshot in the finest palette that is light enough; the last palette is taken whatever it weighs.
 * @param {Buffer} shot
 * @param {number} limitBytes
 */
async function lighten(shot, limitBytes) {
  let small = shot;
  for (const colours of PALETTES) {
    small = await sharp(shot).png({ palette: true, colours, dither: 0.6, effort: 10, compressionLevel: 9 }).toBuffer();
    if (small.byteLength <= limitBytes) break;
  }
  return small;
}

/**
 * @param {Page} page
 * @param {string} path
 * @param {string} name
 * @returns {Promise<number>} bytes written
 */
async function draw(page, path, name) {
  let bytes = 0;
  for (const size of SIZES)
    for (const colorScheme of SCHEMES) {
      await page.setViewportSize(size);
      await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
      await page.goto(path);
      await page.getByRole('heading', { level: 1 }).waitFor();
      await page.waitForLoadState('networkidle');
      // Below what stands above every room of a commission.
      if (ROOMS.has(name)) await page.locator('[data-rooms]').evaluate((rooms) => rooms.scrollIntoView());
      const limit = ALL_BYTES / (SCREENS.length * SIZES.length * SCHEMES.length);
      const picture = await lighten(await page.screenshot({ animations: 'disabled' }), limit);
      writeFileSync(join(FOLDER, `${name}-${size.width}-${colorScheme}.png`), picture);
      bytes += picture.byteLength;
    }
  return bytes;
}

await runCommand(async (scope) => {
  const origin = process.argv[2] ?? `http://127.0.0.1:${DEFAULT_APP_PORT}`;
  const alive = await fetch(`${origin}/healthz`).catch(() => null);
  if (!alive?.ok) throw new Halt(`Nothing answers at ${origin}. Start Ferrule first and give its address.`);
  mkdirSync(FOLDER, { recursive: true });
  const browser = await chromium.launch({
    executablePath: findChromium(process.env) ?? '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-gpu'],
  });
  scope.add(() => browser.close());
  let bytes = 0;
  for (const email of [LEAD, CLIENT]) {
    const { page, commission } = await signIn(browser, origin, email);
    for (const screen of SCREENS.filter((one) => one.email === email))
      bytes += await draw(page, await screen.path(page, commission), screen.name);
  }
  say(`${SCREENS.length * SIZES.length * SCHEMES.length} pictures, ${Math.round(bytes / 1024)} kB, in ${FOLDER}`);
  return bytes > ALL_BYTES ? 1 : 0;
});
