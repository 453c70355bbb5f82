import { open } from 'node:fs/promises';
import { FileTypeParser } from 'file-type/node';
import { FileRefusedError } from './file-refused-error.ts';
import { isMp3 } from './is-mp3.ts';
import { ACCEPTED_MEDIA, type MediaKind } from './media-types.ts';
import { detectText, startsAsMarkup } from './text-types.ts';

export interface DetectedMedia {
  readonly mediaType: string;
  readonly kind: MediaKind;
}

const DETECT_MS = 5000;
const HEAD_BYTES = 4096;
const STL_HEADER_BYTES = 84;
const STL_TRIANGLE_BYTES = 50;
const TAKEN =
  'Ferrule takes photographs (JPEG, PNG, WebP, AVIF, GIF), videos (MP4, MOV, WebM), sounds (WAV, OGG, MP3), PDF, text, CSV, JSON, STL and ZIP.';

/** Names that the detector uses for what we call otherwise. */
const ALIASES: Readonly<Record<string, string>> = {
  'image/apng': 'image/png',
  'video/x-m4v': 'video/mp4',
  'audio/ogg; codecs=opus': 'audio/ogg',
};

const refused = (what: string, remedy: string): FileRefusedError =>
  new FileRefusedError('type-not-accepted', `${what} Nothing of it was kept. ${remedy}`);

/** Refusals that can say more than "not one of these". */
function refusalOf(mediaType: string): FileRefusedError {
  if (
    mediaType === 'image/heic' ||
    mediaType === 'image/heif' ||
    mediaType === 'image/heic-sequence' ||
    mediaType === 'image/heif-sequence'
  )
    return refused('This is a HEIC photograph, which Ferrule cannot read.', 'Save it as JPEG and send that.');
  return refused('This is not a kind of file that Ferrule takes.', `${TAKEN} Put anything else into a ZIP.`);
}

const markupRefused = (): FileRefusedError =>
  refused(
    'This file holds HTML, SVG or other markup, which can run in a reader’s browser.',
    'Send a picture of it as PNG, or put it into a ZIP.',
  );

async function readHead(filePath: string): Promise<{ head: Buffer; byteSize: number }> {
  const handle = await open(filePath, 'r');
  try {
    const { size } = await handle.stat();
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(HEAD_BYTES), 0, HEAD_BYTES, 0);
    return { head: buffer.subarray(0, bytesRead), byteSize: size };
  } finally {
    await handle.close();
  }
}

/** Binary triangle mesh: 80 free bytes, a count, and exactly that many triangles. */
function isBinaryStl(head: Buffer, byteSize: number): boolean {
  if (head.length < STL_HEADER_BYTES) return false;
  const triangles = head.readUInt32LE(STL_HEADER_BYTES - 4);
  return triangles > 0 && byteSize === STL_HEADER_BYTES + triangles * STL_TRIANGLE_BYTES;
}

/** What the first bytes say. A file on which the detector stumbles or dawdles is a file of no known kind. */
async function sniff(filePath: string): Promise<string | undefined> {
  try {
    const found = await new FileTypeParser({ signal: AbortSignal.timeout(DETECT_MS) }).fromFile(filePath);
    return found ? (ALIASES[found.mime] ?? found.mime) : undefined;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).syscall !== undefined) throw error;
    return undefined;
  }
}

/**
 * What a file is, by its content; its name and what its sender called it do not count.
 * @throws FileRefusedError `empty` or `type-not-accepted`
 */
export async function detectMediaType(filePath: string): Promise<DetectedMedia> {
  const { head, byteSize } = await readHead(filePath);
  if (byteSize === 0)
    throw new FileRefusedError('empty', 'This file is empty, so nothing was kept. Choose it again or send another.');
  if (startsAsMarkup(head.toString('latin1').replace(/^\u00EF\u00BB\u00BF/, ''))) throw markupRefused();
  const sniffed = await sniff(filePath);
  // The detector calls any text that begins with "solid" a mesh and any eleven set bits a sound.
  const isGuess = sniffed === 'model/stl' || (sniffed === 'audio/mpeg' && !isMp3(head));
  const byStart = isGuess ? undefined : sniffed;
  const mediaType = byStart ?? (isBinaryStl(head, byteSize) ? 'model/stl' : await detectText(filePath));
  if (mediaType === 'markup' || mediaType === 'application/xml' || mediaType === 'text/html') throw markupRefused();
  const facts = mediaType === null ? undefined : ACCEPTED_MEDIA[mediaType];
  if (mediaType === null || !facts) throw refusalOf(mediaType ?? '');
  return { mediaType, kind: facts.kind };
}
