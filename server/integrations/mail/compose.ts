import type { SendMailOptions } from 'nodemailer';
import { textAsHtml } from './html.ts';
import type { Mail } from './mailer.ts';

/** Letters of a program: mailboxes do not answer these with "out of office" (RFC 3834). */
const HEADERS = { 'Auto-Submitted': 'auto-generated' };

const domainOf = (from: string): string => /@([A-Za-z0-9.-]+)/.exec(from)?.[1] ?? 'localhost';

/** One plain address: no name, no list, no quoting, no line break. */
const ONE_ADDRESS = /^[^\s<>",;:()[\]\\@]+@[^\s<>",;:()[\]\\@]+$/;

export class MailAddressInvalid extends Error {}

const messageIdOf = (id: string, from: string): string => `<${id.replace(/[^\w.-]/g, '-')}@${domainOf(from)}>`;

/**
 * What nodemailer sends for a letter; it may neither read files nor fetch addresses that a letter names.
 * @throws MailAddressInvalid unless `to` is one plain address
 */
export function compose(mail: Mail, from: string): SendMailOptions {
  if (!ONE_ADDRESS.test(mail.to)) throw new MailAddressInvalid('A letter goes to one plain address.');
  return {
    from,
    to: { name: '', address: mail.to },
    subject: mail.subject,
    text: mail.text,
    html: mail.html ?? textAsHtml(mail.text),
    headers: HEADERS,
    disableFileAccess: true,
    disableUrlAccess: true,
    ...(mail.id === undefined ? {} : { messageId: messageIdOf(mail.id, from) }),
    ...(mail.calendar === undefined
      ? {}
      : { icalEvent: { method: mail.calendar.method, content: mail.calendar.content } }),
  };
}
