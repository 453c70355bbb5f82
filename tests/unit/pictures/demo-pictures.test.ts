import { readdir, readFile } from 'node:fs/promises';
import sharp, { type Sharp } from 'sharp';
import { beforeAll, describe, expect, test } from 'vitest';
import { DEMO_PIECES } from '../../../server/db/seeds/demo-pieces.ts';
import { DEMO_PICTURES } from '../../../server/db/seeds/pictures/manifest.ts';
import { PICTURES } from '../../../server/scripts/pictures/catalogue.ts';
import { drawPicture, PICTURES_FOLDER } from '../../../server/scripts/pictures/draw-pictures.ts';

const GRID = { width: 16, height: 16 } as const;

/** What a picture looks like from across the room: 16 by 16 colours, squeezed to a square. */
const glance = (image: Sharp): Promise<Buffer> =>
  image.resize(GRID.width, GRID.height, { fit: 'fill', kernel: 'cubic' }).removeAlpha().raw().toBuffer();

/** Mean difference of two glances, 0 to 255. */
const difference = (a: Buffer, b: Buffer): number =>
  a.reduce((sum, value, at) => sum + Math.abs(value - (b[at] ?? 0)), 0) / a.length;

const files = new Map<string, Buffer>();
const glances = new Map<string, Buffer>();

beforeAll(async () => {
  for (const { fileName } of DEMO_PICTURES) {
    const bytes = await readFile(new URL(fileName, PICTURES_FOLDER));
    files.set(fileName, bytes);
    glances.set(fileName, await glance(sharp(bytes)));
  }
}, 60_000);

describe('the demo pictures', () => {
  test('manifest, folder and catalogue name the same files', async () => {
    const named = DEMO_PICTURES.map((picture) => picture.fileName).sort();
    const kept = (await readdir(PICTURES_FOLDER)).filter((name) => name.endsWith('.jpg')).sort();
    expect(named.length).toBeGreaterThanOrEqual(18);
    expect(new Set(named).size).toBe(named.length);
    expect(kept).toEqual(named);
    expect(PICTURES.map((picture) => picture.fileName).sort()).toEqual(named);
  });

  test('each file is a whole JPEG of the size that the catalogue gives, without metadata', async () => {
    for (const picture of PICTURES) {
      const bytes = files.get(picture.fileName) ?? Buffer.alloc(0);
      const meta = await sharp(bytes).metadata();
      expect([meta.format, meta.width, meta.height], picture.fileName).toEqual(['jpeg', picture.width, picture.height]);
      expect([meta.exif, meta.xmp, meta.icc, meta.iptc], picture.fileName).toEqual([
        undefined,
        undefined,
        undefined,
        undefined,
      ]);
      // A cut-off file stops here: decoding every row fails on the first missing one.
      const { info } = await sharp(bytes, { failOn: 'warning' }).raw().toBuffer({ resolveWithObject: true });
      expect(info.size, picture.fileName).toBe(picture.width * picture.height * 3);
    }
  }, 60_000);

  test('together they stay under 3 MB', () => {
    const sizes = [...files.values()].map((bytes) => bytes.length);
    expect(Math.min(...sizes)).toBeGreaterThan(15_000);
    expect(sizes.reduce((sum, size) => sum + size, 0)).toBeLessThan(3_000_000);
  });

  test('no two look alike, and none is flat', () => {
    const all = [...glances];
    for (const [index, [name, one]] of all.entries()) {
      const mean = one.reduce((sum, value) => sum + value, 0) / one.length;
      expect(difference(one, Buffer.alloc(one.length, Math.round(mean))), name).toBeGreaterThan(4);
      for (const [other, two] of all.slice(index + 1))
        expect(difference(one, two), `${name} and ${other}`).toBeGreaterThan(6);
    }
  });

  test('every piece has what its scenario hands out: cover, brief, condition, and a picture for each report and message', () => {
    for (const piece of DEMO_PIECES) {
      const wanted = [
        'cover',
        'drawing',
        'condition',
        ...piece.reports.flatMap((report) => report.pictures),
        ...piece.threads.flatMap((thread) => thread.messages.filter((message) => message.picture).map(() => 'message')),
      ];
      for (const purpose of new Set(wanted)) {
        const offered = DEMO_PICTURES.filter(
          (picture) => picture.pieceKey === piece.pictureKey && picture.purpose === purpose,
        );
        expect(offered.length, `${piece.title}: ${purpose}`).toBeGreaterThanOrEqual(
          wanted.filter((one) => one === purpose).length,
        );
      }
    }
  });

  test('captions and text equivalents are there, and say different things', () => {
    for (const { fileName, title, alt } of DEMO_PICTURES) {
      expect(title.length, fileName).toBeGreaterThan(3);
      expect(alt.length, fileName).toBeGreaterThan(title.length);
    }
    expect(new Set(DEMO_PICTURES.map((picture) => picture.alt)).size).toBe(DEMO_PICTURES.length);
  });

  test.each(['salt-lantern-arrived.jpg', 'second-winter-parts.jpg'])(
    'drawing %s again gives the picture in the folder',
    async (fileName) => {
      const picture = PICTURES.find((one) => one.fileName === fileName);
      if (!picture) throw new Error(`${fileName} is not in the catalogue`);
      const drawn = await drawPicture(picture, { share: 0.1, rays: 2 });
      const again = await glance(
        sharp(drawn.pixels, { raw: { width: drawn.width, height: drawn.height, channels: 3 } }),
      );
      const kept = glances.get(fileName) ?? Buffer.alloc(0);
      expect(difference(again, kept)).toBeLessThan(3);
      // The same measure tells it from every other picture.
      for (const [other, glimpse] of glances)
        if (other !== fileName) expect(difference(again, glimpse), other).toBeGreaterThan(6);
    },
    60_000,
  );

  test('drawing is repeatable to the last value', async () => {
    const picture = PICTURES.find((one) => one.fileName === 'heron-bright.jpg');
    if (!picture) throw new Error('heron-bright.jpg is not in the catalogue');
    const first = await drawPicture(picture, { share: 0.04, rays: 2 });
    const second = await drawPicture(picture, { share: 0.04, rays: 2 });
    expect(first.pixels.equals(second.pixels)).toBe(true);
  }, 60_000);
});
