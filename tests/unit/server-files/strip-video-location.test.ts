import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { FileRefusedError } from '../../../server/integrations/images/file-refused-error.ts';
import { stripVideoLocation } from '../../../server/integrations/images/strip-video-location.ts';
import { box, ftyp, keyedMeta, latin1, longBox, quickTimeText, track, u32 } from '../../fixtures/files/boxes.ts';

const PLACE = '+48.8583+002.2945+035.000/';
const XMP_UUID = Buffer.from('be7acfcb97a942e89c71999491e3afac', 'hex');

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'ferrule-video-'));
});
afterAll(() => rm(folder, { recursive: true }));

async function strip(content: Uint8Array): Promise<{ after: Buffer; blanked: number }> {
  const path = join(folder, 'video');
  await writeFile(path, content);
  const blanked = await stripVideoLocation(path);
  return { after: await readFile(path), blanked };
}

const pictures = box('mdat', Buffer.alloc(5000, 0xab));
const movie = (...inMoov: Uint8Array[]): Buffer =>
  Buffer.concat([ftyp('qt  '), pictures, box('moov', box('mvhd', Buffer.alloc(100)), ...inMoov)]);
const udta = (...content: Uint8Array[]): Buffer => box('udta', ...content);

describe('places in a video', () => {
  it.each<[string, Uint8Array]>([
    ['the QuickTime text ©xyz', udta(box('©xyz', quickTimeText(PLACE)), u32(0))],
    ['the same in a track', box('trak', udta(box('©xyz', quickTimeText(PLACE))))],
    ['3GPP loci', udta(box('loci', u32(0), latin1(`\x15\xc7${PLACE}\0`)))],
    ['QuickTime keys, in a box without version', keyedMeta([['com.apple.quicktime.location.ISO6709', PLACE]], false)],
    ['QuickTime keys, in a box with version', keyedMeta([['com.apple.quicktime.location.ISO6709', PLACE]], true)],
    ['keys below user data', udta(keyedMeta([['com.apple.quicktime.location.name', PLACE]], true))],
    [
      'an item ©xyz in a list',
      udta(
        box(
          'meta',
          u32(0),
          box('hdlr', Buffer.alloc(25)),
          box('ilst', box('©xyz', box('data', u32(1, 0), latin1(PLACE)))),
        ),
      ),
    ],
    ['XMP in user data', udta(box('XMP_', latin1(`<x:xmpmeta>${PLACE}</x:xmpmeta>`)))],
    ['XMP in a uuid box', box('uuid', XMP_UUID, latin1(`<x:xmpmeta>${PLACE}</x:xmpmeta>`))],
    ['a box with a 64-bit size', longBox('udta', longBox('©xyz', quickTimeText(PLACE)))],
  ])('%s is overwritten in place', async (_case, holder) => {
    const before = movie(holder);
    expect(before.includes(PLACE)).toBe(true);
    const { after, blanked } = await strip(before);
    expect(blanked).toBe(1);
    expect(after.includes(PLACE)).toBe(false);
    expect(after.includes('48.8583')).toBe(false);
    expect(after.length).toBe(before.length);
    const upToMoov = ftyp('qt  ').length + pictures.length;
    expect(after.subarray(0, upToMoov).equals(before.subarray(0, upToMoov))).toBe(true);
    // A second run finds a well-built file with nothing left in it (an overwritten key keeps its name).
    const again = await strip(after);
    expect(again.after.equals(after)).toBe(true);
  });

  it('are overwritten wherever they are, and nothing else is', async () => {
    const { after, blanked } = await strip(
      movie(
        keyedMeta(
          [
            ['com.apple.quicktime.creationdate', '2026-03-12'],
            ['com.apple.quicktime.location.ISO6709', PLACE],
            ['com.apple.quicktime.location.accuracy.horizontal', '4.776900'],
            ['com.example.title', 'The hilt'],
          ],
          false,
        ),
        udta(box('©nam', quickTimeText('Bench test')), box('©xyz', quickTimeText(PLACE))),
      ),
    );
    expect(blanked).toBe(3);
    for (const kept of ['2026-03-12', 'The hilt', 'Bench test']) expect(after.includes(kept)).toBe(true);
    for (const gone of [PLACE, '4.7769']) expect(after.includes(gone)).toBe(false);
  });

  it('are not left behind in unused space', async () => {
    const { after } = await strip(
      Buffer.concat([movie(), box('free', latin1(`moov udta ©xyz ${PLACE}`)), box('skip', latin1(PLACE))]),
    );
    expect(after.includes(PLACE)).toBe(false);
  });

  it('leaves a video without places as it was', async () => {
    const before = movie(box('trak', box('tkhd', Buffer.alloc(84, 1))), udta(box('©nam', quickTimeText('Bench test'))));
    const { after, blanked } = await strip(before);
    expect(blanked).toBe(0);
    expect(after.equals(before)).toBe(true);
  });

  it('takes a last box that runs to the end of the file', async () => {
    const open = Buffer.concat([
      movie(udta(box('©xyz', quickTimeText(PLACE)))),
      u32(0),
      latin1('mdat'),
      Buffer.alloc(999, 7),
    ]);
    const { after } = await strip(open);
    expect(after.includes(PLACE)).toBe(false);
    expect(after.subarray(-999).equals(Buffer.alloc(999, 7))).toBe(true);
  });
});

describe('sensor tracks', () => {
  /** Two chunks of sensor samples between pictures: 3 samples of 10, 20, 30 bytes, then 2 of 40 and 50. */
  const chunksAt = (start: number): { at: number; sizes: number[] }[] => [
    { at: start, sizes: [10, 20, 30] },
    { at: start + 60 + 100, sizes: [40, 50] },
  ];
  const withTrack = (format: string): { bytes: Buffer; start: number } => {
    const start = ftyp('isom').length + 8;
    const data = Buffer.concat([Buffer.alloc(60, 1), Buffer.alloc(100, 2), Buffer.alloc(90, 3), Buffer.alloc(100, 4)]);
    return {
      bytes: Buffer.concat([ftyp('isom'), box('mdat', data), box('moov', track(format, chunksAt(start)))]),
      start,
    };
  };

  it.each(['gpmd', 'camm', 'mebx'])('of format %s lose their samples and nothing beside them', async (format) => {
    const { bytes, start } = withTrack(format);
    const { after, blanked } = await strip(bytes);
    expect(blanked).toBe(5);
    const expected = Buffer.concat([
      Buffer.alloc(60, 0),
      Buffer.alloc(100, 2),
      Buffer.alloc(90, 0),
      Buffer.alloc(100, 4),
    ]);
    expect(after.subarray(start, start + 350).equals(expected)).toBe(true);
    expect(after.subarray(start + 350).equals(bytes.subarray(start + 350))).toBe(true);
  });

  it('leaves pictures and sound alone', async () => {
    const { bytes } = withTrack('avc1');
    expect((await strip(bytes)).after.equals(bytes)).toBe(true);
  });

  it('is refused where samples lie outside the file, add up to more than it, or lie in fragments', async () => {
    const start = ftyp('isom').length + 8;
    const outside = Buffer.concat([ftyp('isom'), box('moov', track('gpmd', [{ at: 1_000_000, sizes: [10] }]))]);
    const overlapping = Buffer.concat([
      ftyp('isom'),
      box('mdat', Buffer.alloc(5000)),
      box(
        'moov',
        track(
          'gpmd',
          Array.from({ length: 500 }, () => ({ at: start, sizes: [5000] })),
        ),
      ),
    ]);
    const fragments = Buffer.concat([ftyp('isom'), box('moov', track('gpmd', [])), box('moof', u32(0))]);
    for (const bytes of [outside, overlapping, fragments])
      await expect(strip(bytes)).rejects.toMatchObject({ code: 'video-unreadable' });
  });
});

describe('a file whose boxes do not add up', () => {
  const nested = (depth: number): Buffer => (depth === 0 ? Buffer.alloc(0) : box('udta', nested(depth - 1)));
  it.each<[string, Uint8Array]>([
    [
      'a box larger than its parent',
      Buffer.concat([ftyp('isom'), box('moov', u32(5000), latin1('udta'), Buffer.alloc(20))]),
    ],
    ['a box larger than the file', Buffer.concat([ftyp('isom'), u32(9_999_999), latin1('moov')])],
    ['a box smaller than its own header', Buffer.concat([ftyp('isom'), u32(4), latin1('moov'), Buffer.alloc(20)])],
    [
      'a 64-bit size beyond all numbers',
      Buffer.concat([ftyp('isom'), u32(1), latin1('moov'), u32(0xffffffff, 0xffffffff)]),
    ],
    ['boxes in boxes without end', Buffer.concat([ftyp('isom'), nested(40)])],
    ['a compressed header', Buffer.concat([ftyp('qt  '), box('moov', box('cmov', Buffer.alloc(20)))])],
    ['200,001 empty boxes', Buffer.concat(Array.from({ length: 200_001 }, () => box('wide')))],
  ])(
    'is refused: %s',
    async (_case, bytes) => {
      await expect(strip(bytes)).rejects.toBeInstanceOf(FileRefusedError);
    },
    20_000,
  );

  it('is refused when it breaks off', async () => {
    const whole = movie(udta(box('©xyz', quickTimeText(PLACE))));
    for (const cut of [1, 7])
      await expect(strip(whole.subarray(0, whole.length - cut))).rejects.toMatchObject({ code: 'video-unreadable' });
  });
});
