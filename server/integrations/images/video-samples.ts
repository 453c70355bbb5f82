import { videoUnreadable, type Box, type BoxFile } from './boxes.ts';

/** Sample formats of tracks that cameras write their sensors to, position among them. */
const SENSOR_FORMATS = new Set(['gpmd', 'camm', 'mebx', 'rtmd', 'nmea']);
const ENTRIES_MAX = 4_000_000;

async function child(file: BoxFile, parent: Box, type: string): Promise<Box | undefined> {
  for await (const box of file.boxes(parent.bodyStart, parent.end)) if (box.type === type) return box;
  return undefined;
}

async function descend(file: BoxFile, from: Box, path: readonly string[]): Promise<Box | undefined> {
  let at: Box | undefined = from;
  for (const type of path) at = at && (await child(file, at, type));
  return at;
}

/** Reads a table of equal rows behind version, flags and (after `skip` bytes) a count. */
async function readTable(
  file: BoxFile,
  box: Box,
  skip: number,
  rowBytes: number,
): Promise<{ count: number; rows: Buffer }> {
  const head = box.bodyStart + 4 + skip;
  const count = (await file.read(head, 4)).readUInt32BE(0);
  if (count > ENTRIES_MAX || head + 4 + count * rowBytes > box.end) throw videoUnreadable();
  return { count, rows: await file.read(head + 4, count * rowBytes) };
}

/** Length in bytes of each sample, by its number from zero. */
async function sampleSizes(file: BoxFile, stsz: Box): Promise<(sample: number) => number | undefined> {
  const uniform = (await file.read(stsz.bodyStart + 4, 4)).readUInt32BE(0);
  if (uniform !== 0) {
    const count = (await file.read(stsz.bodyStart + 8, 4)).readUInt32BE(0);
    return (sample) => (sample < count ? uniform : undefined);
  }
  const { count, rows } = await readTable(file, stsz, 4, 4);
  return (sample) => (sample < count ? rows.readUInt32BE(sample * 4) : undefined);
}

/** Where each chunk of samples begins. */
async function chunkStarts(file: BoxFile, stbl: Box): Promise<number[]> {
  const stco = await child(file, stbl, 'stco');
  if (stco) {
    const { count, rows } = await readTable(file, stco, 0, 4);
    return Array.from({ length: count }, (_, at) => rows.readUInt32BE(at * 4));
  }
  const co64 = await child(file, stbl, 'co64');
  if (!co64) return [];
  const { count, rows } = await readTable(file, co64, 0, 8);
  return Array.from({ length: count }, (_, at) => Number(rows.readBigUInt64BE(at * 8)));
}

/** How many samples each chunk holds: rows of (first chunk from one, samples, description), each good until the next row. */
async function samplesPerChunk(file: BoxFile, stsc: Box, chunks: number): Promise<number[]> {
  const { count, rows } = await readTable(file, stsc, 0, 12);
  const perChunk = new Array<number>(chunks).fill(0);
  for (let row = 0; row < count; row += 1) {
    const first = rows.readUInt32BE(row * 12) - 1;
    // The rows ascend (ISO/IEC 14496-12, 8.7.4); ones that do not would have every chunk walked for every row.
    if (row > 0 && first <= rows.readUInt32BE((row - 1) * 12) - 1) throw videoUnreadable();
    const next = row + 1 < count ? rows.readUInt32BE((row + 1) * 12) - 1 : chunks;
    for (let chunk = Math.max(0, first); chunk < Math.min(next, chunks); chunk += 1)
      perChunk[chunk] = rows.readUInt32BE(row * 12 + 4);
  }
  return perChunk;
}

/** Whether samples lie in fragments (`moof`) with tables of their own. */
async function isInFragments(file: BoxFile): Promise<boolean> {
  for await (const box of file.boxes(0, file.byteSize)) if (box.type === 'moof') return true;
  return false;
}

/**
 * Overwrites the samples of a track that holds sensor data rather than pictures or sound; other tracks are left alone.
 * The samples of a file in fragments are not found this way, so such a track is refused there.
 * @returns how many samples were overwritten
 */
export async function blankSamples(file: BoxFile, trak: Box): Promise<number> {
  const stbl = await descend(file, trak, ['mdia', 'minf', 'stbl']);
  const stsd = stbl && (await child(file, stbl, 'stsd'));
  if (!stbl || !stsd || stsd.end - stsd.bodyStart < 16) return 0;
  const format = (await file.read(stsd.bodyStart + 12, 4)).toString('latin1');
  if (!SENSOR_FORMATS.has(format)) return 0;
  const [stsc, stsz] = [await child(file, stbl, 'stsc'), await child(file, stbl, 'stsz')];
  if (!stsc || !stsz) throw videoUnreadable();
  const starts = await chunkStarts(file, stbl);
  if (starts.length === 0) {
    if (await isInFragments(file)) throw videoUnreadable();
    return 0;
  }
  const perChunk = await samplesPerChunk(file, stsc, starts.length);
  const sizeOf = await sampleSizes(file, stsz);
  let sample = 0;
  let overwrittenBytes = 0;
  for (const [chunk, start] of starts.entries()) {
    let at = start;
    for (let within = 0; within < (perChunk[chunk] ?? 0); within += 1) {
      const size = sizeOf(sample);
      if (size === undefined) return sample;
      overwrittenBytes += size;
      // Samples that overlap so much that they add up to more than the file are there to keep us writing.
      if (at + size > file.byteSize || overwrittenBytes > file.byteSize) throw videoUnreadable();
      await file.fill(at, at + size, 0);
      at += size;
      sample += 1;
    }
  }
  return sample;
}
