import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { detectMediaType } from '../../../server/integrations/images/detect-media-type.ts';
import { FileRefusedError } from '../../../server/integrations/images/file-refused-error.ts';
import { ACCEPTED_MEDIA, isShownInline } from '../../../server/integrations/images/media-types.ts';
import { ftyp } from '../../fixtures/files/boxes.ts';
import { binaryStl, heic, mov, mp3, mp4, ogg, pdf, TEXT_STL, wav, webm, zip } from '../../fixtures/files/media.ts';
import { PLAIN } from '../../fixtures/files/pictures.ts';

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'ferrule-detect-'));
});
afterAll(() => rm(folder, { recursive: true }));

/** The name says PNG whatever the content is. */
async function detect(content: string | Uint8Array): Promise<{ mediaType: string; kind: string }> {
  const path = join(folder, 'picture.png');
  await writeFile(path, content);
  return detectMediaType(path);
}

const codeOf = (content: string | Uint8Array): Promise<string> =>
  detect(content).then(
    ({ mediaType }) => `taken as ${mediaType}`,
    (error: unknown) => (error instanceof FileRefusedError ? error.code : String(error)),
  );

describe('what is taken, by content alone', () => {
  it.each(Object.entries(PLAIN))('%s', async (format, make) => {
    expect(await detect(await make())).toEqual({ mediaType: `image/${format}`, kind: 'image' });
  });

  it.each<[string, Uint8Array | string, string]>([
    ['MP4', mp4(), 'video/mp4'],
    ['MP4 for phones', Buffer.concat([ftyp('M4V '), mp4().subarray(20)]), 'video/mp4'],
    ['MOV', mov(), 'video/quicktime'],
    ['WebM', webm(), 'video/webm'],
    ['WAV', wav(), 'audio/wav'],
    ['OGG', ogg(), 'audio/ogg'],
    ['MP3', mp3(), 'audio/mpeg'],
    ['MP3 with a tag', Buffer.concat([Buffer.from('ID3\x03\0\0\0\0\0\0', 'latin1'), mp3()]), 'audio/mpeg'],
    ['a note that begins like a tag', 'ID3 is the third idea for the hilt\n', 'text/plain'],
    ['PDF', pdf(), 'application/pdf'],
    ['ZIP', zip(), 'application/zip'],
    ['binary STL', binaryStl(12), 'model/stl'],
    ['binary STL that begins like the text form', binaryStl(12, 'solid pommel'), 'model/stl'],
    ['text STL', TEXT_STL, 'model/stl'],
    ['a note about solid brass', 'solid brass, two coats of lacquer\n', 'text/plain'],
    ['JSON', '{"leds": 132, "board": "rev C"}', 'application/json'],
    ['what only begins like JSON', '[blade]\nleds=132\n', 'text/plain'],
    ['CSV', 'part,diameter\nspigot,31.6\nbore,31.65\n', 'text/csv'],
    ['CSV with semicolons and quotes', 'part;size\n"bore; front";31,65\nspigot;31,6\n', 'text/csv'],
    ['text in many scripts', 'Länge 31,6 mm — 長さ\n', 'text/plain'],
    ['text with a byte order mark', '\uFEFFleds=132\n', 'text/plain'],
    ['a comparison', 'gap < 0.05 and wall > 1\n', 'text/plain'],
    ['markup in the middle of a text', 'see <b>here</b>\n', 'text/plain'],
  ])('%s', async (_case, content, mediaType) => {
    expect((await detect(content)).mediaType).toBe(mediaType);
  });
});

describe('what is refused', () => {
  const SVG = '<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>';
  it.each<[string, Uint8Array | string]>([
    ['SVG', SVG],
    ['SVG behind an XML declaration', `<?xml version="1.0"?>\n${SVG}`],
    ['SVG behind a byte order mark and blanks', `\uFEFF \n\t${SVG}`],
    ['SVG behind a comment of 3 KB', `<!-- ${'x'.repeat(3000)} -->${SVG}`],
    ['SVG behind 2 KB of blanks', ' '.repeat(2000) + SVG],
    ['HTML', '<!DOCTYPE html><script>alert(1)</script>'],
    ['HTML without a head', '  <ScRiPt>alert(1)</ScRiPt>'],
    ['HTML that is also the header of a binary STL', binaryStl(3, '<html><script>alert(1)</script>')],
    ['a text with a NUL after 200 KB', Buffer.concat([Buffer.alloc(200_000, 'a'), Buffer.from([0])])],
    ['a text that is not UTF-8 after 200 KB', Buffer.concat([Buffer.alloc(200_000, 'a'), Buffer.from([0xc3, 0x28])])],
    ['a text that ends in half a character', Buffer.from([0x61, 0xe2, 0x82])],
    ['UTF-16', Buffer.from('\uFEFFleds=132', 'utf16le')],
    ['one frame header and nothing behind it', Buffer.concat([Buffer.from([0xff, 0xfb, 0x90, 0]), Buffer.alloc(900)])],
    ['HEIC', heic()],
    ['Matroska', webm('matroska')],
    ['a Windows program', Buffer.concat([Buffer.from('MZ'), Buffer.alloc(200, 1)])],
    ['a Linux program', Buffer.concat([Buffer.from('\x7fELF\x02\x01\x01'), Buffer.alloc(200)])],
    ['gzip', Buffer.from('1f8b0800000000000003', 'hex')],
    ['a binary STL that is one byte short', binaryStl(4).subarray(1)],
    ['a Java archive', zip('META-INF/MANIFEST.MF')],
  ])('%s', async (_case, content) => {
    expect(await codeOf(content)).toBe('type-not-accepted');
  });

  it('an empty file, with a code of its own', async () => {
    expect(await codeOf('')).toBe('empty');
  });

  it('says what to do with a HEIC photograph and with markup', async () => {
    await expect(detect(heic())).rejects.toMatchObject({
      words: expect.stringMatching(/HEIC.*Nothing of it was kept.*JPEG/) as string,
    });
    await expect(detect(SVG)).rejects.toMatchObject({
      words: expect.stringMatching(/Nothing of it was kept.*ZIP/) as string,
    });
  });
});

describe('files of two kinds at once', () => {
  it('are what their first bytes say, and never shown as anything else', async () => {
    const html = Buffer.from('<html><script>alert(1)</script>');
    expect((await detect(Buffer.concat([await PLAIN.gif(), html]))).mediaType).toBe('image/gif');
    expect((await detect(Buffer.concat([await PLAIN.jpeg(), zip()]))).mediaType).toBe('image/jpeg');
    expect((await detect(Buffer.concat([pdf(), html]))).mediaType).toBe('application/pdf');
    expect((await detect('GIF89a=1;alert(1)//'.padEnd(40))).mediaType).toBe('image/gif');
  });
});

describe('the list', () => {
  it('has no media type that a browser runs, and shows only pictures, videos and sounds in the page', () => {
    for (const mediaType of [
      'image/svg+xml',
      'text/html',
      'application/xhtml+xml',
      'application/xml',
      'text/javascript',
    ])
      expect(ACCEPTED_MEDIA).not.toHaveProperty([mediaType]);
    const shown = Object.keys(ACCEPTED_MEDIA).filter(isShownInline);
    expect(shown.every((mediaType) => /^(image|video|audio)\//.test(mediaType))).toBe(true);
    expect(isShownInline('application/pdf')).toBe(false);
  });
});
