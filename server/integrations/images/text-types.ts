import { createReadStream } from 'node:fs';

/** Text below this many bytes is parsed to tell JSON from other text; longer text is plain text. */
const PARSED_BYTES = 4 * 1024 * 1024;

const withoutLead = (text: string): string => text.replace(/^[\s\uFEFF]+/, '');

/** Whether a browser that sniffs would take the text for markup: HTML, SVG, or any other XML. */
export const startsAsMarkup = (text: string): boolean => /^<[a-z!?/]/i.test(withoutLead(text));

function isJson(text: string): boolean {
  if (!/^[[{]/.test(withoutLead(text))) return false;
  try {
    JSON.parse(withoutLead(text));
    return true;
  } catch {
    return false;
  }
}

/** Comma, semicolon or tab separated: at least two of the first lines, all with the same number of separators. */
function isCsv(text: string): boolean {
  const lines = text.split(/\r?\n/).slice(0, 20);
  const whole = lines.slice(0, Math.max(1, lines.length - 1)).filter((line) => line !== '');
  if (whole.length < 2) return false;
  return [',', ';', '\t'].some((separator) => {
    const counts = new Set(whole.map((line) => line.replace(/"[^"]*"/g, '').split(separator).length - 1));
    return counts.size === 1 && !counts.has(0);
  });
}

/** `solid name`, then facets: the text form of a triangle mesh. */
const isTextStl = (text: string): boolean => /^\s*solid\b[^\n]*\n\s*facet\s+normal\b/i.test(text);

/**
 * What kind of text a file is; null when it is not text: a NUL or a byte sequence that is not UTF-8 anywhere in it. The
 * whole file is read, in pieces, since a program may hide behind a page of words.
 */
export async function detectText(
  filePath: string,
): Promise<'markup' | 'model/stl' | 'application/json' | 'text/csv' | 'text/plain' | null> {
  const decoder = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });
  let text = '';
  let complete = true;
  try {
    for await (const chunk of createReadStream(filePath) as AsyncIterable<Buffer>) {
      if (chunk.includes(0)) return null;
      const piece = decoder.decode(chunk, { stream: true });
      if (text.length < PARSED_BYTES) text += piece;
      else complete = false;
    }
    decoder.decode();
  } catch (error) {
    if (error instanceof TypeError) return null;
    throw error;
  }
  if (startsAsMarkup(text)) return 'markup';
  if (isTextStl(text)) return 'model/stl';
  if (complete && isJson(text)) return 'application/json';
  return isCsv(text) ? 'text/csv' : 'text/plain';
}
