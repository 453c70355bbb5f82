import { open } from 'node:fs/promises';
import { BoxFile, videoUnreadable, type Box } from './boxes.ts';
import { blankSamples } from './video-samples.ts';

/** Boxes whose children may hold places. */
const CONTAINERS = new Set(['moov', 'trak', 'mdia', 'minf', 'udta', 'moof', 'traf', 'mvex']);
/**
 * Boxes that are blanked whole: `©xyz` (ISO 6709 text by QuickTime and phones), `loci` (3GPP TS 26.244), `XMP_`, and
 * what editors leave behind in unused space.
 */
const BLANKED = new Set(['\u00A9xyz', 'loci', 'XMP_', 'free', 'skip']);
/** XMP in a `uuid` box (XMP specification part 3). */
const XMP_UUID = 'be7acfcb97a942e89c71999491e3afac';
/** Keys of QuickTime metadata such as `com.apple.quicktime.location.ISO6709`. */
const PLACE_KEY = /location|gps|geo|direction\./i;
const KEY_BYTES_MAX = 4096;
const DEPTH_MAX = 10;
const SPACE = 0x20;

/** A `meta` box begins with four bytes of version and flags in MP4 and without them in QuickTime. */
async function metaBodyStart(file: BoxFile, box: Box): Promise<number> {
  if (box.end - box.bodyStart < 8) return box.end;
  const isQuickTime = (await file.read(box.bodyStart + 4, 4)).toString('latin1') === 'hdlr';
  return isQuickTime ? box.bodyStart : box.bodyStart + 4;
}

/** Numbers, from one, of the keys that name a place. */
async function placeKeys(file: BoxFile, keys: Box): Promise<Set<number>> {
  const found = new Set<number>();
  let number = 0;
  for await (const key of file.boxes(keys.bodyStart + 8, keys.end)) {
    number += 1;
    const length = Math.min(KEY_BYTES_MAX, key.end - key.bodyStart);
    if (PLACE_KEY.test((await file.read(key.bodyStart, length)).toString('latin1'))) found.add(number);
  }
  return found;
}

/** Overwrites the values of an item and leaves its headers, since an item's type is the number of its key. */
async function blankItem(file: BoxFile, item: Box): Promise<void> {
  const valueHeaderBytes = 8; // type and locale
  for await (const data of file.boxes(item.bodyStart, item.end))
    await file.fill(
      Math.min(data.end, data.bodyStart + (data.type === 'data' ? valueHeaderBytes : 0)),
      data.end,
      SPACE,
    );
}

async function stripMeta(file: BoxFile, meta: Box): Promise<number> {
  const start = await metaBodyStart(file, meta);
  let blanked = 0;
  let byNumber = new Set<number>();
  for await (const box of file.boxes(start, meta.end)) if (box.type === 'keys') byNumber = await placeKeys(file, box);
  for await (const box of file.boxes(start, meta.end)) {
    if (BLANKED.has(box.type)) blanked += await blankBox(file, box);
    if (box.type !== 'ilst') continue;
    for await (const item of file.boxes(box.bodyStart, box.end)) {
      const number = Buffer.from(item.type, 'latin1').readUInt32BE(0);
      if (BLANKED.has(item.type)) blanked += await blankBox(file, item);
      else if (byNumber.has(number)) {
        await blankItem(file, item);
        blanked += 1;
      }
    }
  }
  return blanked;
}

/** @returns 1 where something was overwritten that may have been a place, 0 for unused space */
async function blankBox(file: BoxFile, box: Box): Promise<number> {
  await file.blank(box);
  return box.type === 'free' || box.type === 'skip' ? 0 : 1;
}

async function isXmp(file: BoxFile, box: Box): Promise<boolean> {
  return box.end - box.bodyStart >= 16 && (await file.read(box.bodyStart, 16)).toString('hex') === XMP_UUID;
}

async function stripWithin(file: BoxFile, from: number, to: number, depth: number): Promise<number> {
  if (depth > DEPTH_MAX) throw videoUnreadable();
  let blanked = 0;
  for await (const box of file.boxes(from, to)) {
    // A compressed header hides what it says.
    if (box.type === 'cmov') throw videoUnreadable();
    if (BLANKED.has(box.type) || (box.type === 'uuid' && (await isXmp(file, box))))
      blanked += await blankBox(file, box);
    else if (box.type === 'meta') blanked += await stripMeta(file, box);
    else if (box.type === 'trak')
      blanked += (await blankSamples(file, box)) + (await stripWithin(file, box.bodyStart, box.end, depth + 1));
    else if (CONTAINERS.has(box.type)) blanked += await stripWithin(file, box.bodyStart, box.end, depth + 1);
  }
  return blanked;
}

/**
 * Overwrites the places recorded in an MP4 or MOV file, in place and without changing its length, so that offsets into
 * the pictures hold: text and 3GPP location boxes, QuickTime location keys, XMP, and tracks of sensor samples.
 * @returns how many values were overwritten
 * @throws FileRefusedError `video-unreadable` for a file whose boxes do not add up: what cannot be read cannot be cleared
 */
export async function stripVideoLocation(filePath: string): Promise<number> {
  const handle = await open(filePath, 'r+');
  try {
    const { size } = await handle.stat();
    const blanked = await stripWithin(new BoxFile(handle, size), 0, size, 0);
    await handle.sync();
    return blanked;
  } finally {
    await handle.close();
  }
}
