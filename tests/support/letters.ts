import { readdir, readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { simpleParser, type ParsedMail } from 'mailparser';
import { vi } from 'vitest';
import type { TestApp } from './test-app.ts';

/** Letters the application sent to an address so far, oldest first. */
export async function lettersTo(app: TestApp, email: string): Promise<ParsedMail[]> {
  const names = await readdir(app.mailDir).catch(() => []);
  const files = names.filter((name) => name.endsWith('.eml')).sort();
  const letters = await Promise.all(files.map(async (name) => simpleParser(await readFile(join(app.mailDir, name)))));
  return letters.filter((letter) => [letter.to].flat().some((to) => to?.value.some((one) => one.address === email)));
}

/** Waits for the letter with this number (1 is the first), since letters leave after the answer. */
export const letterTo = (app: TestApp, email: string, number = 1): Promise<ParsedMail> =>
  vi.waitFor(
    async () => {
      const letter = (await lettersTo(app, email))[number - 1];
      if (!letter) throw new Error(`No letter ${number} to ${email} yet`);
      return letter;
    },
    { timeout: 8000, interval: 40 },
  );

/** The token behind the hash sign of the letter's link. */
export function tokenIn(letter: ParsedMail): string {
  const token = /#token=([\w-]+)/.exec(letter.text ?? '')?.[1];
  if (!token) throw new Error('The letter has no link');
  return token;
}
