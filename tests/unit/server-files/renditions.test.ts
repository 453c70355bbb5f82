import { createHash } from 'node:crypto';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import exifr from 'exifr';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AppError } from '../../../server/errors.ts';
import { FileRefusedError } from '../../../server/integrations/images/file-refused-error.ts';
import { makeRenditions, type Rendition } from '../../../server/integrations/images/renditions.ts';
import { takeTurns } from '../../../server/integrations/images/take-turns.ts';
import { FILE_LIMITS } from '../../../shared/contracts/files.ts';
import { declaredJpeg, declaredPng, manyFrames, phonePhotograph, PLAIN } from '../../fixtures/files/pictures.ts';

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'ferrule-renditions-'));
});
afterAll(() => rm(folder, { recursive: true }));

async function render(content: Uint8Array | string): Promise<Record<'thumb' | 'screen' | 'full', Rendition>> {
  const path = join(folder, 'upload');
  await writeFile(path, content);
  return makeRenditions(path);
}

const codeOf = (content: Uint8Array | string): Promise<string> =>
  render(content).then(
    () => 'taken',
    (error: unknown) => (error instanceof FileRefusedError ? error.code : String(error)),
  );

/** Names of the chunks of a WebP file (RFC 9649). */
function webpChunks(bytes: Buffer): string[] {
  const names: string[] = [];
  for (let at = 12; at + 8 <= bytes.length;) {
    names.push(bytes.toString('latin1', at, at + 4));
    const length = bytes.readUInt32LE(at + 4);
    at += 8 + length + (length % 2);
  }
  return names;
}

async function colourAt(bytes: Buffer, left: number, top: number): Promise<[number, number, number]> {
  const { data, info } = await sharp(bytes).removeAlpha().raw().toBuffer({ resolveWithObject: true });
  const at = (top * info.width + left) * info.channels;
  return [data[at] ?? 0, data[at + 1] ?? 0, data[at + 2] ?? 0];
}

const isRed = ([r, , b]: readonly number[]): boolean => (r ?? 0) > 180 && (b ?? 0) < 80;
const isBlue = ([r, , b]: readonly number[]): boolean => (r ?? 0) < 80 && (b ?? 0) > 180;

describe('sizes', () => {
  it('keeps the longest side at 320, 1280 and 2560 and the proportions', async () => {
    const large = await sharp({ create: { width: 3000, height: 1500, channels: 3, background: '#888888' } })
      .jpeg()
      .toBuffer();
    const { thumb, screen, full } = await render(large);
    expect([thumb, screen, full].map(({ width, height }) => [width, height])).toEqual([
      [320, 160],
      [1280, 640],
      [2560, 1280],
    ]);
    for (const { bytes, byteSize, sha256, width } of [thumb, screen, full]) {
      expect(byteSize).toBe(bytes.length);
      expect(sha256).toBe(createHash('sha256').update(bytes).digest('hex'));
      expect(await sharp(bytes).metadata()).toMatchObject({ format: 'webp', width });
    }
  });

  it('makes a small picture no larger', async () => {
    const sizes = Object.values(await render(await PLAIN.png()));
    expect(sizes.map(({ width, height }) => [width, height])).toEqual([
      [60, 30],
      [60, 30],
      [60, 30],
    ]);
  });

  it.each(Object.entries(PLAIN))('shows %s as it is', async (_format, make) => {
    const { full } = await render(await make());
    expect(isRed(await colourAt(full.bytes, 5, 15))).toBe(true);
    expect(isBlue(await colourAt(full.bytes, 54, 15))).toBe(true);
  });

  it('takes grey, sixteen-bit, transparent and four-colour pictures', async () => {
    const plain = sharp({
      create: { width: 20, height: 10, channels: 4, background: { r: 255, g: 0, b: 0, alpha: 0.5 } },
    });
    const made = [
      plain.clone().toColourspace('b-w').png(),
      plain.clone().toColourspace('rgb16').png(),
      plain.clone().webp(),
      plain.clone().flatten().toColourspace('cmyk').jpeg(),
    ];
    for (const picture of made)
      expect((await render(await picture.toBuffer())).full).toMatchObject({ width: 20, height: 10 });
    const { full } = await render(await plain.png().toBuffer());
    expect((await sharp(full.bytes).metadata()).hasAlpha).toBe(true);
  });
});

describe('a photograph from a phone', () => {
  it('is turned upright and keeps nothing but pixels', async () => {
    const photograph = await phonePhotograph();
    const before = (await exifr.parse(photograph, true)) as Record<string, unknown>;
    expect(before['latitude']).toBeCloseTo(48.8583, 3);
    expect(before['SerialNumber'] ?? before['BodySerialNumber']).toBe('SERIAL-4711');
    expect((await sharp(photograph).metadata()).xmp?.toString()).toContain('GPSLatitude');

    const sizes = await render(photograph);
    for (const { bytes, width, height } of Object.values(sizes)) {
      expect([width, height]).toEqual([30, 60]);
      // Orientation 6 turns the left edge to the top.
      expect(isRed(await colourAt(bytes, 15, 5))).toBe(true);
      expect(isBlue(await colourAt(bytes, 15, 54))).toBe(true);
      expect(webpChunks(bytes)).toEqual(['VP8 ']);
      const after = await sharp(bytes).metadata();
      expect([after.exif, after.xmp, after.iptc, after.icc, after.orientation]).toEqual(Array(5).fill(undefined));
      for (const secret of ['SERIAL-4711', 'Owner Of The Bench', 'GPS', 'Exif', 'xmpmeta'])
        expect(bytes.includes(secret)).toBe(false);
      // The metadata reader does not read WebP, so the same pixels go through it as the JPEG that they came as.
      const asJpeg = await sharp(bytes).keepMetadata().jpeg().toBuffer();
      expect(await exifr.gps(asJpeg)).toBeUndefined();
      expect(await exifr.thumbnail(asJpeg)).toBeUndefined();
    }
  });
});

describe('what is refused', () => {
  it.each([
    ['30,000 x 30,000 declared in a PNG', () => declaredPng(30_000, 30_000)],
    ['65,500 x 65,500 declared in a JPEG, the decoder’s own limit', () => declaredJpeg(65_500, 65_500)],
    ['one row more than 50 million pixels', () => declaredPng(10_000, 5001)],
  ])('%s, at once and with the size said', async (_case, make) => {
    const started = Date.now();
    const content = await make();
    expect(content.length).toBeLessThan(2000);
    await expect(render(content)).rejects.toMatchObject({
      code: 'image-too-large',
      words: expect.stringMatching(/^This picture has \d+ x \d+ pixels.*Nothing of it was kept/) as string,
    });
    expect(Date.now() - started).toBeLessThan(2000);
  });

  it('a header that promises more than there is', async () => {
    expect(await codeOf(declaredPng(2000, 2000))).toBe('image-unreadable');
    expect(await codeOf(await declaredJpeg(65_535, 65_535))).toBe('image-unreadable');
    expect(await codeOf(await declaredJpeg(65_535, 1))).toBe('image-unreadable');
  });

  it('a picture that breaks off, at every tenth', async () => {
    const noise = { type: 'gaussian' as const, mean: 128, sigma: 30 };
    const whole = await sharp({ create: { width: 400, height: 300, channels: 3, background: '#888888', noise } })
      .jpeg()
      .toBuffer();
    for (let tenth = 1; tenth < 10; tenth += 1)
      expect(await codeOf(whole.subarray(0, Math.floor((whole.length * tenth) / 10))), `${tenth} tenths`).toBe(
        'image-unreadable',
      );
    expect(await codeOf(whole)).toBe('taken');
  });

  it.each([
    ['SVG', '<svg xmlns="http://www.w3.org/2000/svg" width="10" height="10"><rect width="9" height="9"/></svg>'],
    [
      'SVG that names a file',
      '<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><image href="/etc/passwd" width="9" height="9"/></svg>',
    ],
    ['TIFF', Buffer.from('49492a0008000000', 'hex')],
    ['a text', 'a note'],
    ['nothing', ''],
  ])('%s, whatever called it a picture', async (_case, content) => {
    expect(await codeOf(content)).toBe('image-unreadable');
  });

  it('a picture of more bytes than pictures may have', async () => {
    const picture = await PLAIN.jpeg();
    expect(await codeOf(Buffer.concat([picture, Buffer.alloc(FILE_LIMITS.imageBytes - picture.length + 1)]))).toBe(
      'too-large',
    );
  });
});

describe('an animation', () => {
  it('of 10,000 frames becomes its first one, and quickly', async () => {
    const animation = await manyFrames(10_000);
    expect((await sharp(animation).metadata()).pages).toBe(10_000);
    const started = Date.now();
    const { full } = await render(animation);
    expect(Date.now() - started).toBeLessThan(3000);
    expect([full.width, full.height]).toEqual([60, 30]);
    expect((await sharp(full.bytes).metadata()).pages).toBeUndefined();
  });
});

describe('files of two kinds at once', () => {
  it('lose what was hidden behind or inside the picture', async () => {
    const script = '<script>alert(1)</script>';
    const hidden = await sharp(await PLAIN.jpeg())
      .withExif({ IFD0: { ImageDescription: script } })
      .jpeg()
      .toBuffer();
    expect(hidden.includes(script)).toBe(true);
    const { full } = await render(Buffer.concat([hidden, Buffer.from(`PK\x03\x04${script}`)]));
    expect(full.bytes.includes('script')).toBe(false);
    expect(full.bytes.includes('PK\x03\x04')).toBe(false);
  });
});

describe('takeTurns', () => {
  it('runs so many at once, the rest in order, and refuses beyond the queue', async () => {
    const inTurn = takeTurns(2, 2);
    const started: number[] = [];
    const ends: (() => void)[] = [];
    const work = (id: number) => () => {
      started.push(id);
      return new Promise<number>((resolve) => ends.push(() => resolve(id)));
    };
    const all = [1, 2, 3, 4].map((id) => inTurn(work(id)));
    const refused = await inTurn(work(5)).catch((error: unknown) => error);
    expect(refused).toBeInstanceOf(AppError);
    expect(refused).toMatchObject({ code: 'busy', parts: { retryAfterS: 5 } });
    expect(started).toEqual([1, 2]);
    ends[0]?.();
    await all[0];
    await new Promise(setImmediate);
    expect(started).toEqual([1, 2, 3]);
    for (const at of [1, 2, 3]) {
      ends[at]?.();
      await new Promise(setImmediate);
    }
    expect(await Promise.all(all)).toEqual([1, 2, 3, 4]);
  });

  it('goes on after one has failed', async () => {
    const inTurn = takeTurns(1, 1);
    const failing = inTurn(() => Promise.reject(new Error('broke')));
    const next = inTurn(() => Promise.resolve('fine'));
    await expect(failing).rejects.toThrow('broke');
    expect(await next).toBe('fine');
    expect(await inTurn(() => Promise.resolve('still'))).toBe('still');
  });
});
