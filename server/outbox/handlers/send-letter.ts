import type { Env } from '../../config/env.ts';
import { safeHtml } from '../../integrations/mail/html.ts';
import type { Mailer } from '../../integrations/mail/mailer.ts';
import type { Letter } from '../letters.ts';
import type { OutgoingMessage } from '../relay.ts';

interface WrittenLetter {
  subject: string;
  lines: string[];
  link: { address: string; words: string };
}

/** The token sits behind the hash sign: a fragment is sent to no server, so it reaches no log and no referrer. */
const linkTo = (origin: string, page: string, token: string): string => `${origin}/${page}#token=${token}`;

function write(letter: Exclude<Letter, { letter: 'none' }>, origin: string): WrittenLetter {
  switch (letter.letter) {
    case 'password-reset':
      return {
        subject: 'Set a new password for Ferrule',
        lines: [
          `Hello ${letter.displayName},`,
          'someone asked for a new password for your account. If that was not you, leave this letter; nothing changes.',
          'The link works once, for one hour.',
        ],
        link: { address: linkTo(origin, 'reset', letter.token), words: 'Set a new password' },
      };
    case 'shop-invitation':
      return {
        subject: `${letter.invitedBy} invites you into ${letter.shopName}`,
        lines: [
          `${letter.invitedBy} invites you into the shop ${letter.shopName} on Ferrule, as ${letter.role}.`,
          'The link works once, for 14 days.',
        ],
        link: { address: linkTo(origin, 'invitation', letter.token), words: 'Look at the invitation' },
      };
    case 'commission-invitation':
      return {
        subject: `${letter.invitedBy} invites you to ${letter.commissionTitle}`,
        lines: [
          `${letter.invitedBy} invites you to take part in the commission ${letter.commissionTitle} on Ferrule, as ${letter.roles.join(', ')}.`,
          'The link works once, for 14 days.',
        ],
        link: { address: linkTo(origin, 'invitation', letter.token), words: 'Look at the invitation' },
      };
  }
}

/** Outbox handler: writes a letter and hands it to the mailer under an id that stays the same over every try. */
export async function sendLetter(
  mailer: Mailer,
  env: Pick<Env, 'PUBLIC_ORIGIN'>,
  message: OutgoingMessage,
): Promise<void> {
  const letter = message.payload as unknown as Letter;
  if (letter.letter === 'none') return;
  const { subject, lines, link } = write(letter, env.PUBLIC_ORIGIN);
  await mailer.send({
    to: letter.to,
    subject,
    text: [...lines, '', `${link.words}:`, link.address].join('\n'),
    html: safeHtml`${lines.map((line) => safeHtml`<p>${line}</p>`)}<p><a href="${link.address}">${link.words}</a></p>`.toString(),
    id: `outbox-${message.id}`,
  });
}
