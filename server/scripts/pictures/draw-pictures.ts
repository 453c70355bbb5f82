import { mkdir, writeFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import sharp from 'sharp';
import { PICTURES } from './catalogue.ts';
import { develop, expose } from './optics/develop.ts';
import type { Picture } from './picture.ts';

/** Where the drawn pictures are kept. */
export const PICTURES_FOLDER = new URL('../../db/seeds/pictures/', import.meta.url);

const MOST_BYTES = 96_000;
const BEST_QUALITY = 80;
const LEAST_QUALITY = 50;
/** Traced at three quarters of the size and enlarged: a telephone's lens is no sharper, and it takes half the time. */
const TRACED_SHARE = 0.75;

/** Draws a picture at a share of its size; always the same for the same share and rays. */
export async function drawPicture(
  picture: Picture,
  options: { share?: number; rays?: number } = {},
): Promise<{ pixels: Buffer; width: number; height: number }> {
  const { share = TRACED_SHARE, rays = picture.rays } = options;
  const size = { width: Math.round(picture.width * share), height: Math.round(picture.height * share), rays };
  const scene = await picture.scene();
  return { pixels: develop(expose(scene, size), size, scene.film), width: size.width, height: size.height };
}

/** A drawn picture as JPEG at its full size, as good as fits the bytes allowed; busy ones stop at the least quality. */
export async function asJpeg(
  picture: Picture,
  drawn: { pixels: Buffer; width: number; height: number },
): Promise<Buffer> {
  const { pixels, width, height } = drawn;
  const enlarged = await sharp(pixels, { raw: { width, height, channels: 3 } })
    .resize(picture.width, picture.height, { kernel: 'cubic' })
    .raw()
    .toBuffer();
  const raw = { raw: { width: picture.width, height: picture.height, channels: 3 as const } };
  const encoded = (quality: number): Promise<Buffer> =>
    sharp(enlarged, raw).jpeg({ quality, mozjpeg: true }).toBuffer();
  let jpeg = await encoded(BEST_QUALITY);
  for (let quality = BEST_QUALITY - 3; jpeg.length > MOST_BYTES && quality >= LEAST_QUALITY; quality -= 3)
    jpeg = await encoded(quality);
  return jpeg;
}

/** Draws the pictures whose file names are given, or all of them, into the demo's folder. */
async function drawAll(names: readonly string[]): Promise<void> {
  await mkdir(PICTURES_FOLDER, { recursive: true });
  for (const picture of PICTURES) {
    if (names.length > 0 && !names.includes(picture.fileName)) continue;
    const started = performance.now();
    const jpeg = await asJpeg(picture, await drawPicture(picture));
    await writeFile(new URL(picture.fileName, PICTURES_FOLDER), jpeg);
    process.stdout.write(
      `${picture.fileName}: ${jpeg.length} bytes, ${Math.round((performance.now() - started) / 1000)} s\n`,
    );
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) await drawAll(process.argv.slice(2));
