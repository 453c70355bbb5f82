import sharp from 'sharp';
import { hash } from '../optics/noise.ts';

/** A flat picture to be laid on a thing: sRGB, three values per point. */
export interface Sheet {
  pixels: Buffer;
  width: number;
  height: number;
}

/** Draws an SVG body of `width` by `height` units at `scale` points per unit. */
export async function sheetOf(
  body: string,
  width: number,
  height: number,
  scale: number,
  background = '#ffffff',
): Promise<Sheet> {
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="${width * scale}" height="${height * scale}" viewBox="0 0 ${width} ${height}"><rect width="${width}" height="${height}" fill="${background}"/>${body}</svg>`;
  const { data, info } = await sharp(Buffer.from(svg))
    .removeAlpha()
    .toColourspace('srgb')
    .raw()
    .toBuffer({ resolveWithObject: true });
  return { pixels: data, width: info.width, height: info.height };
}

/** Segments that are lit for each digit: top, upper right, lower right, bottom, lower left, upper left, middle. */
const SEGMENTS: Readonly<Record<string, string>> = {
  '0': 'abcdef',
  '1': 'bc',
  '2': 'abged',
  '3': 'abgcd',
  '4': 'fgbc',
  '5': 'afgcd',
  '6': 'afgedc',
  '7': 'abc',
  '8': 'abcdefg',
  '9': 'abcdfg',
};
const BARS: Readonly<Record<string, string>> = {
  a: 'M0.7 0L4.3 0L3.6 1L1.4 1Z',
  b: 'M4.7 0.3L4.7 4.6L4.1 4.6L3.8 3.9L3.8 1.2Z',
  c: 'M4.7 5L4.7 9.3L3.8 8.4L3.8 5.7L4.1 5Z',
  d: 'M0.7 9.6L4.3 9.6L3.6 8.6L1.4 8.6Z',
  e: 'M0.3 5L0.3 9.3L1.2 8.4L1.2 5.7L0.9 5Z',
  f: 'M0.3 0.3L0.3 4.6L0.9 4.6L1.2 3.9L1.2 1.2Z',
  g: 'M1 4.8L1.6 4.3L3.4 4.3L4 4.8L3.4 5.3L1.6 5.3Z',
};

/** A liquid-crystal display that reads `reading`, 33 by 13 mm. */
export function displaySheet(reading: string): Promise<Sheet> {
  let x = 31 - [...reading].reduce((sum, letter) => sum + (letter === '.' ? 1.4 : 5.8), 0);
  let body = '<rect x="0.5" y="0.5" width="32" height="12" fill="#a9b3a0"/>';
  for (const letter of reading) {
    if (letter === '.') {
      body += `<rect x="${x - 0.1}" y="10" width="1" height="1" fill="#151a16"/>`;
      x += 1.4;
      continue;
    }
    for (const [name, path] of Object.entries(BARS))
      body += `<path transform="translate(${x} 1.6) skewX(-5)" d="${path}" fill="${SEGMENTS[letter]?.includes(name) ? '#151a16' : '#a0aa97'}"/>`;
    x += 5.8;
  }
  return sheetOf(body, 33, 13, 24, '#87917f');
}

/** Face of a steel rule, 166 by 19 mm: millimetres along both edges. */
export function ruleSheet(): Promise<Sheet> {
  let body = '';
  for (let mm = 0; mm <= 160; mm += 1) {
    const long = mm % 10 === 0 ? 6 : mm % 5 === 0 ? 4.4 : 3;
    body += `<path d="M${mm + 3} 19V${19 - long}" stroke="#1b1b1b" stroke-width="0.22"/>`;
    if (mm % 5 === 0) body += `<path d="M${mm + 3} 0V${long * 0.7}" stroke="#1b1b1b" stroke-width="0.22"/>`;
  }
  return sheetOf(`${body}<circle cx="6" cy="8" r="1.6" fill="#222"/>`, 166, 19, 12, '#a9a9a6');
}

/** Upper side of the sound board, 42 by 20 mm: mask, traces, pads. */
export function boardSheet(): Promise<Sheet> {
  let body = '';
  for (let trace = 0; trace < 46; trace += 1) {
    const x = 1 + hash(trace, 1, 0, 9) * 38;
    const z = 3 + hash(trace, 2, 0, 9) * 14;
    const run = (hash(trace, 3, 0, 9) - 0.5) * 16;
    const step = (hash(trace, 4, 0, 9) - 0.5) * 6;
    body += `<path d="M${x} ${z}h${run}l${Math.abs(step) * Math.sign(run)} ${step}v${step * 0.8}" fill="none" stroke="#1d5a3f" stroke-width="0.34"/><circle cx="${x}" cy="${z}" r="0.42" fill="#b9a45c"/><circle cx="${x}" cy="${z}" r="0.18" fill="#0c2018"/>`;
  }
  for (const z of [1.4, 18.6])
    for (let pad = 0; pad < 9; pad += 1)
      body += `<rect x="${2.8 + pad * 4.2}" y="${z - 1.1}" width="2.4" height="2.2" rx="0.5" fill="#cfae58"/><path d="M${4 + pad * 4.2} ${z > 10 ? 17.3 : 2.7}V${z > 10 ? 15 : 5}" stroke="#e8e6da" stroke-width="0.16"/>`;
  body +=
    '<rect x="9.8" y="6.2" width="10.6" height="8.8" fill="none" stroke="#e8e6da" stroke-width="0.18"/><rect x="26" y="5" width="7" height="6" fill="none" stroke="#e8e6da" stroke-width="0.18"/>';
  return sheetOf(body, 42, 20, 26, '#0d3b29');
}
