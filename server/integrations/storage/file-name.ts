import { ACCEPTED_MEDIA } from '../images/media-types.ts';

const NAME_MAX = 120;
const EXTENSION_MAX = 12;
const NAMELESS = 'file';

/** Control characters, line and paragraph separators, and marks that are invisible or turn the reading direction. */
const UNSEEN =
  /[\p{Cc}\p{Zl}\p{Zp}\u00AD\u061C\u180E\u200B\u200E\u200F\u202A-\u202E\u2060-\u2064\u2066-\u206F\uFEFF\uFFF9-\uFFFB]/gu;
const LONE_SURROGATES = /\p{Surrogate}/gu;
/** Not allowed in names on one system or another. */
const FORBIDDEN = /[<>:"|?*]/g;
/** Names of devices, with or without an ending. */
const DEVICE = /^(con|prn|aux|nul|com[0-9¹²³]|lpt[0-9¹²³])(\.|$)/i;

/** The ending of a name, with its dot; empty where there is none. */
function extensionOf(name: string): string {
  const at = name.lastIndexOf('.');
  return at > 0 && name.length - at <= EXTENSION_MAX + 1 ? name.slice(at) : '';
}

function shorten(name: string): string {
  const characters = [...name];
  if (characters.length <= NAME_MAX) return name;
  const extension = [...extensionOf(name)];
  return [...characters.slice(0, NAME_MAX - extension.length), ...extension].join('');
}

/**
 * A name as it may be shown and saved: the last part of a path, nothing unseen, at most 120 characters. It is never
 * used to find anything on this side.
 */
export function cleanFileName(received: string): string {
  const last = received.split(/[/\\]/).pop() ?? '';
  const seen = last.replace(UNSEEN, '').replace(LONE_SURROGATES, '').replace(FORBIDDEN, '-').normalize('NFC');
  const trimmed = shorten(seen.replace(/^[\s.]+|[\s.]+$/g, '')).trim();
  if (trimmed === '') return NAMELESS;
  return DEVICE.test(trimmed) ? `_${trimmed}` : trimmed;
}

/** The name a file is saved under: its ending says what it is, so `plan.png.html` that is a picture becomes `plan.png.html.webp`. */
export function downloadName(name: string, mediaType: string): string {
  const known = ACCEPTED_MEDIA[mediaType]?.extensions ?? ['bin'];
  const extension = extensionOf(name).slice(1).toLowerCase();
  return known.includes(extension) ? name : `${name}.${known[0]}`;
}
