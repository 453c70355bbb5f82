const ESCAPES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (character) => ESCAPES[character] ?? '');

/** Markup that is safe to put into other markup; only `safeHtml` makes it. */
export class SafeHtml {
  readonly markup: string;

  constructor(markup: string) {
    this.markup = markup;
  }

  toString(): string {
    return this.markup;
  }
}

type Filling = string | number | SafeHtml | readonly SafeHtml[];

function fill(value: Filling): string {
  if (value instanceof SafeHtml) return value.markup;
  if (typeof value === 'object') return value.map((part) => part.markup).join('');
  return escapeHtml(String(value));
}

/** Template tag: what is filled in is escaped, unless it came from `safeHtml` itself. */
export const safeHtml = (markup: TemplateStringsArray, ...fillings: Filling[]): SafeHtml =>
  new SafeHtml(markup.reduce((written, piece, at) => written + fill(fillings[at - 1] ?? '') + piece));

const ADDRESS = /(https?:\/\/[^\s<>"']+)/;

const withLinks = (line: string): SafeHtml[] =>
  line
    .split(ADDRESS)
    .map((piece, at) => (at % 2 === 1 ? safeHtml`<a href="${piece}">${piece}</a>` : safeHtml`${piece}`));

/** A plain letter as HTML: paragraphs at empty lines, addresses as links. */
export function textAsHtml(text: string): string {
  const paragraphs = text.trim().split(/\n\s*\n/);
  const written = paragraphs.map((paragraph) => {
    const lines = paragraph
      .split('\n')
      .map((line, at) => safeHtml`${at === 0 ? [] : [safeHtml`<br>`]}${withLinks(line)}`);
    return safeHtml`<p>${lines}</p>`;
  });
  return safeHtml`<!doctype html><html><body style="font-family: sans-serif; line-height: 1.5">${written}</body></html>`
    .markup;
}
