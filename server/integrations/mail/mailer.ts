/** One letter to one person, written out. */
export interface Mail {
  /** Address of the recipient, without a name. */
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  /** HTML with everything that people typed escaped (see `safeHtml`); made from `text` when left out. */
  readonly html?: string;
  /** Same for each try at one letter: it becomes the Message-ID, so that a mailbox can tell a repeat. */
  readonly id?: string;
  /** A date to enter in a calendar, as an iCalendar text. */
  readonly calendar?: { readonly method: 'REQUEST' | 'CANCEL' | 'PUBLISH'; readonly content: string };
}

export interface Mailer {
  /** Resolves when the next server has taken the letter. @throws where it was not; nothing is tried again here. */
  send(mail: Mail): Promise<void>;
  close(): void;
}
