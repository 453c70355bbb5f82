import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { randomUUID } from 'node:crypto';
import { expect, type APIResponse, type Browser, type Page } from '@playwright/test';
import { simpleParser } from 'mailparser';
import { API_BASE, type AnyRoute, type RouteInput, type RouteOutput } from '../../shared/contracts/route.ts';
import { DEMO_PASSWORD } from '../../server/db/seeds/demo-people.ts';

const origin = (): string => process.env['FERRULE_E2E_ORIGIN'] ?? '';

/** One person in a browser of their own, signed in through the page as they would. */
export async function signIn(
  browser: Browser,
  email: string,
  options: Parameters<Browser['newContext']>[0] = {},
): Promise<Page> {
  const context = await browser.newContext({ baseURL: origin(), viewport: { width: 1440, height: 1000 }, ...options });
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => url.pathname === '/');
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  return page;
}

/** Calls the API with the cookies of a page's person. */
export async function call<T extends AnyRoute>(page: Page, route: T, input: RouteInput<T>): Promise<RouteOutput<T>> {
  const response = await tryCall(page, route, input);
  if (!response.ok()) throw new Error(`${route.method} ${route.path}: ${response.status()} ${await response.text()}`);
  return route.response.parse(response.status() === 204 ? {} : await response.json()) as RouteOutput<T>;
}

export function tryCall<T extends AnyRoute>(page: Page, route: T, input: RouteInput<T>): Promise<APIResponse> {
  const { params = {}, body } = input as { params?: Record<string, string>; body?: unknown };
  const path = route.path.replace(/:(\w+)/g, (_whole, name: string) => params[name] ?? '');
  return page.request.fetch(`${API_BASE}${path}`, {
    method: route.method,
    headers: {
      origin: origin(),
      'content-type': 'application/json',
      ...(route.keyed ? { 'idempotency-key': randomUUID() } : {}),
    },
    ...(route.method === 'GET' ? {} : { data: JSON.stringify(body ?? {}) }),
  });
}

/** The token of the newest letter to an address whose text speaks of something. */
export async function tokenFor(email: string, about: string): Promise<string> {
  const folder = process.env['FERRULE_E2E_MAIL_DIR'] ?? '';
  let found: string | undefined;
  await expect(async () => {
    const letters = await Promise.all(
      (await readdir(folder))
        .filter((name) => name.endsWith('.eml'))
        .map(async (name) => simpleParser(await readFile(join(folder, name)))),
    );
    const mine = letters.filter((letter) => JSON.stringify(letter.to).includes(email) && letter.text?.includes(about));
    mine.sort((one, other) => Number(one.date ?? 0) - Number(other.date ?? 0));
    found = /#token=([\w-]+)/.exec(mine.at(-1)?.text ?? '')?.[1];
    expect(found).toBeTruthy();
  }).toPass({ timeout: 15_000 });
  return found ?? '';
}
