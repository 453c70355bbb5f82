/** kbit/s of layer 3 by index (ISO/IEC 11172-3 and 13818-3); index 0 is "free" and 15 is forbidden. */
const KBIT_S_VERSION_1 = [0, 32, 40, 48, 56, 64, 80, 96, 112, 128, 160, 192, 224, 256, 320];
const KBIT_S_VERSION_2 = [0, 8, 16, 24, 32, 40, 48, 56, 64, 80, 96, 112, 128, 144, 160];
const HZ_VERSION_1 = [44_100, 48_000, 32_000];

/** Length in bytes of the layer 3 frame that begins at `at`; null where none does. */
function frameBytes(bytes: Uint8Array, at: number): number | null {
  const [one = 0, two = 0, three = 0] = bytes.subarray(at, at + 3);
  const version = (two >> 3) & 3; // 3: version 1; 2: version 2; 0: version 2.5
  const isLayer3 = (two & 0x06) === 0x02;
  if (one !== 0xff || (two & 0xe0) !== 0xe0 || version === 1 || !isLayer3) return null;
  const kbitS = (version === 3 ? KBIT_S_VERSION_1 : KBIT_S_VERSION_2)[three >> 4];
  const hz = HZ_VERSION_1[(three >> 2) & 3];
  if (!kbitS || !hz) return null;
  const divisor = version === 3 ? 1 : version === 2 ? 2 : 4;
  const samplesEighth = version === 3 ? 144 : 72;
  return Math.floor((samplesEighth * kbitS * 1000) / (hz / divisor)) + ((three >> 1) & 1);
}

/**
 * Whether bytes begin an MP3: an ID3v2 tag, or a frame that another frame follows. One frame header alone is eleven set
 * bits, which text in UTF-16 begins with too.
 * @param head at least the first 3000 bytes of the file, or all of it
 */
export function isMp3(head: Uint8Array): boolean {
  const isTagged = Buffer.from(head.subarray(0, 3)).toString('latin1') === 'ID3';
  if (isTagged) return [2, 3, 4].includes(head[3] ?? 0);
  const length = frameBytes(head, 0);
  return length !== null && frameBytes(head, length) !== null;
}
