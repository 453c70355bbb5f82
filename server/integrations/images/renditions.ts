import { createHash } from 'node:crypto';
import { stat } from 'node:fs/promises';
import sharp, { type Metadata, type Sharp } from 'sharp';
import { FILE_LIMITS, type IMAGE_SIZES } from '../../../shared/contracts/files.ts';
import { FileRefusedError } from './file-refused-error.ts';
import { takeTurns } from './take-turns.ts';

export type ImageSize = (typeof IMAGE_SIZES)[number];

/** Longest side in pixels. */
const LONGEST_SIDE_PX: Readonly<Record<ImageSize, number>> = { thumb: 320, screen: 1280, full: 2560 };

/** Pixels an image may declare; more is refused before anything is decoded. */
const INPUT_PIXELS_MAX = 50_000_000;

const WEBP_QUALITY = 80;
const DECODE_S = 20;
const RENDITION_MEDIA_TYPE = 'image/webp';

/** One size of a photograph, as WebP in sRGB. */
export interface Rendition {
  readonly bytes: Buffer;
  readonly mediaType: typeof RENDITION_MEDIA_TYPE;
  readonly width: number;
  readonly height: number;
  readonly byteSize: number;
  /** SHA-256 of `bytes`, hexadecimal. */
  readonly sha256: string;
}

// The image library reads more formats than are accepted (SVG among them); what is not accepted has no decoder here.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({
  operation: ['Jpeg', 'Png', 'Webp', 'Nsgif', 'Heif'].flatMap((format) => [
    `VipsForeignLoad${format}File`,
    `VipsForeignLoad${format}Buffer`,
  ]),
});
// Uploads are read once; a cache would only hold memory and file handles.
sharp.cache(false);

const inTurn = takeTurns(2, 40);

const unreadable = (cause: unknown): FileRefusedError =>
  new FileRefusedError(
    'image-unreadable',
    'This picture is damaged or breaks off, so nothing of it was kept. Open it on your side, save it again and send that.',
    { cause },
  );

function assertPixels({ width, height }: Metadata): void {
  if (width * height <= INPUT_PIXELS_MAX) return;
  throw new FileRefusedError(
    'image-too-large',
    `This picture has ${width} x ${height} pixels; Ferrule takes up to 50 million. Nothing of it was kept. Make it smaller and send it again.`,
  );
}

async function assertBytes(filePath: string): Promise<void> {
  const { size } = await stat(filePath);
  if (size > FILE_LIMITS.imageBytes)
    throw new FileRefusedError(
      'too-large',
      `This picture has ${Math.ceil(size / 1e6)} MB; Ferrule takes pictures up to ${Math.floor(FILE_LIMITS.imageBytes / 1e6)} MB. Nothing of it was kept. Save it smaller and send it again.`,
    );
}

async function encode(image: Sharp, size: ImageSize): Promise<Rendition> {
  const side = LONGEST_SIDE_PX[size];
  const { data, info } = await image
    .resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true })
    .webp({ quality: WEBP_QUALITY })
    .toBuffer({ resolveWithObject: true });
  return {
    bytes: data,
    mediaType: RENDITION_MEDIA_TYPE,
    width: info.width,
    height: info.height,
    byteSize: data.length,
    sha256: createHash('sha256').update(data).digest('hex'),
  };
}

async function render(filePath: string): Promise<Record<ImageSize, Rendition>> {
  try {
    // Only the header is read here, so that the refusal can say the size; the decoder has the same limit again.
    assertPixels(await sharp(filePath, { limitInputPixels: false }).metadata());
    const source = sharp(filePath, { failOn: 'error', limitInputPixels: INPUT_PIXELS_MAX });
    // One decode: the largest size is kept as bare pixels, which carry no metadata, and the others are made from it.
    const { data, info } = await source
      .autoOrient()
      .resize({ width: LONGEST_SIDE_PX.full, height: LONGEST_SIDE_PX.full, fit: 'inside', withoutEnlargement: true })
      .toColourspace('srgb')
      .timeout({ seconds: DECODE_S })
      .raw()
      .toBuffer({ resolveWithObject: true });
    const pixels = (): Sharp =>
      sharp(data, { raw: { width: info.width, height: info.height, channels: info.channels } });
    return {
      full: await encode(pixels(), 'full'),
      screen: await encode(pixels(), 'screen'),
      thumb: await encode(pixels(), 'thumb'),
    };
  } catch (error) {
    if (error instanceof FileRefusedError) throw error;
    throw unreadable(error);
  }
}

/**
 * The sizes of a photograph that are kept in its place: turned upright, first picture of an animation, and without any
 * metadata (place, serial numbers, embedded previews, comments), since a maker's photograph says where the bench is.
 * At most two run at once.
 * @throws FileRefusedError `image-unreadable`, `image-too-large` or `too-large`; AppError `busy` when too many wait
 */
export async function makeRenditions(filePath: string): Promise<Record<ImageSize, Rendition>> {
  await assertBytes(filePath);
  return inTurn(() => render(filePath));
}
