import { randomUUID } from 'node:crypto';
import { mkdir, rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { createTransport } from 'nodemailer';
import { compose } from './compose.ts';
import type { Mail, Mailer } from './mailer.ts';

const fileNameOf = (mail: Mail, now: Date): string => {
  const stamp = now.toISOString().replace(/[:.]/g, '-');
  const to = mail.to.replace(/[^a-zA-Z0-9@._-]/g, '_').slice(0, 80);
  return `${stamp}-${to}-${randomUUID().slice(0, 8)}.eml`;
};

/**
 * Writes each letter into a folder as a file that mail programs open, instead of sending it. A file appears whole: it
 * is written under another name first, so that whoever watches the folder never reads half a letter.
 */
export function createCatcherMailer(folder: string, from: string, clock: () => Date = () => new Date()): Mailer {
  const transport = createTransport({ streamTransport: true, buffer: true });
  return {
    async send(mail) {
      const { message } = await transport.sendMail(compose(mail, from));
      if (!Buffer.isBuffer(message)) throw new Error('The letter was not written out.');
      await mkdir(folder, { recursive: true, mode: 0o700 });
      const path = join(folder, fileNameOf(mail, clock()));
      await writeFile(`${path}.part`, message, { mode: 0o600, flag: 'wx' });
      await rename(`${path}.part`, path);
    },
    close: () => transport.close(),
  };
}

/** Keeps letters in memory, for tests. */
export class MemoryMailer implements Mailer {
  readonly sent: Mail[] = [];

  send(mail: Mail): Promise<void> {
    this.sent.push(mail);
    return Promise.resolve();
  }

  close(): void {
    this.sent.length = 0;
  }
}
