import { AxeBuilder } from '@axe-core/playwright';
import { expect, test, type Browser, type Page } from '@playwright/test';
import { readdirSync } from 'node:fs';
import { signIn } from './people.ts';

/** A page of the product, and how its reader gets there. Every file of `src/app/routes` needs a line. */
interface Visit {
  route: string;
  who: string | null;
  path: (base: string, page: Page) => Promise<string> | string;
}

const LEAD = 'sefa@tinderlane.example';

const firstLink = async (page: Page, at: string, part: string): Promise<string> => {
  await page.goto(at);
  const href = await page.locator(`a[href*="${part}"]`).first().getAttribute('href');
  if (!href) throw new Error(`${at} has no link to ${part}`);
  return href;
};

const VISITS: readonly Visit[] = [
  { route: 'sign-in', who: null, path: () => '/sign-in' },
  { route: 'reset', who: null, path: () => '/reset' },
  { route: 'invitation', who: null, path: () => '/invitation' },
  { route: 'bench', who: LEAD, path: () => '/' },
  { route: 'commissions', who: LEAD, path: () => '/commissions' },
  { route: 'commission-new', who: LEAD, path: () => '/commissions/new' },
  { route: 'commission-layout', who: LEAD, path: (base) => base },
  { route: 'room', who: 'orla@penhallow.example', path: (base) => base },
  { route: 'plan', who: LEAD, path: (base) => `${base}/plan` },
  { route: 'parties', who: LEAD, path: (base) => `${base}/parties` },
  { route: 'joint', who: LEAD, path: (base, page) => firstLink(page, base, '/joints/') },
  { route: 'report', who: LEAD, path: (base, page) => firstLink(page, base, '/reports/') },
  { route: 'handoff', who: LEAD, path: (base, page) => firstLink(page, base, '/handoffs/') },
  { route: 'threads', who: LEAD, path: (base) => `${base}/threads` },
  { route: 'thread', who: LEAD, path: (base, page) => firstLink(page, `${base}/threads`, '/threads/') },
  { route: 'pictures', who: LEAD, path: (base) => `${base}/pictures` },
  { route: 'history', who: LEAD, path: (base) => `${base}/history` },
  { route: 'commission-edit', who: LEAD, path: (base) => `${base}/edit` },
  { route: 'account', who: LEAD, path: () => '/account' },
  { route: 'shop', who: LEAD, path: (_base, page) => shopAddress(page) },
  { route: 'shops', who: 'steward@ferrule.example', path: () => '/shops' },
  { route: 'api-reference', who: LEAD, path: () => '/api-reference' },
  { route: 'not-found', who: LEAD, path: () => '/no-such-page' },
];

async function shopAddress(page: Page): Promise<string> {
  const me = (await (await page.request.get('/api/v1/me')).json()) as { shops: { shopId: string }[] };
  return `/shops/${me.shops[0]?.shopId ?? ''}`;
}

const LOOKS = [
  { width: 1440, height: 1000, colorScheme: 'light' },
  { width: 360, height: 780, colorScheme: 'light' },
  { width: 1440, height: 1000, colorScheme: 'dark' },
  { width: 360, height: 780, colorScheme: 'dark' },
] as const;

async function openAs(browser: Browser, who: string | null): Promise<Page> {
  if (who) return signIn(browser, who);
  const context = await browser.newContext({ baseURL: process.env['FERRULE_E2E_ORIGIN'] });
  return context.newPage();
}

test('every page has its accessibility check', () => {
  const files = readdirSync('src/app/routes').map((name) => name.replace(/\.tsx$/, ''));
  expect(VISITS.map((visit) => visit.route).sort()).toEqual(files.sort());
});

for (const visit of VISITS) {
  test(`${visit.route}: axe finds nothing, nothing runs off sideways, the policy is kept, at 360 and 1440, light and dark`, async ({
    browser,
  }) => {
    const page = await openAs(browser, visit.who);
    const complaints: string[] = [];
    page.on('console', (message) => {
      if (/Content Security Policy|Refused to/i.test(message.text())) complaints.push(message.text());
    });
    page.on('pageerror', (error) => complaints.push(String(error)));
    let base = '';
    if (visit.who && visit.who !== 'steward@ferrule.example') {
      await page.goto('/commissions');
      base = (await page.getByRole('link', { name: 'The Salt Lantern' }).getAttribute('href')) ?? '';
    }
    await page.goto(await visit.path(base, page));
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    await page.waitForLoadState('networkidle');
    for (const { width, height, colorScheme } of LOOKS) {
      await page.setViewportSize({ width, height });
      await page.emulateMedia({ colorScheme });
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(
        violations.map((one) => `${one.id}: ${one.nodes.map((node) => node.html.slice(0, 160)).join(' | ')}`),
        `${width} ${colorScheme}`,
      ).toEqual([]);
      expect(
        await page.evaluate(() => document.documentElement.scrollWidth),
        `sideways at ${width}`,
      ).toBeLessThanOrEqual(width);
    }
    expect(complaints).toEqual([]);
    await page.context().close();
  });
}
