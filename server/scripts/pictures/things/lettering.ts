import { hash } from '../optics/noise.ts';

/** Strokes of a draughtsman's letters (and the small f of a shaft's ISO 286 class) on a field 4 wide and 6 high, y down: points as digit pairs, strokes by spaces. */
const STROKES: Readonly<Record<string, string>> = {
  '0': '100105163645413010',
  '1': '112026',
  '2': '01103041420646',
  '3': '01103041423313 334445361605',
  '4': '36300444',
  '5': '400002324345361605',
  '6': '4130100105163645443303',
  '7': '004016',
  '8': '100102133342413010 1304051636454433',
  '9': '4313020110304145361605',
  A: '062046 1434',
  B: '06003041423303 3344453606',
  C: '4130100105163645',
  D: '06002042442606',
  E: '40000646 0333',
  F: '400006 0333',
  G: '41301001051636454323',
  H: '0006 4046 0343',
  I: '2026',
  K: '0006 400346',
  L: '000646',
  M: '0600234046',
  N: '06004640',
  O: '100105163645413010',
  P: '06003041423303',
  R: '06003041423303 2346',
  S: '413010010213334445361605',
  T: '0040 2026',
  U: '000516364540',
  V: '002640',
  W: '0016233640',
  X: '0046 4006',
  Z: '00400646',
  J: '404536160504',
  Q: '100105163645413010 3347',
  Y: '002340 2326',
  f: '31211216 0323',
  '.': '2526',
  '-': '1333',
  '/': '4006',
  '+': '1333 2224',
};

/**
 * Words as an SVG path in pencil strokes. `height` is the height of a capital in the drawing's units; every letter leans
 * and wanders a little, always in the same way for the same `seed`.
 */
export function lettering(words: string, x: number, y: number, height: number, seed = 1): string {
  const unit = height / 6;
  let pen = x;
  let path = '';
  [...words].forEach((letter, index) => {
    const lean = (hash(index, 1, 0, seed) - 0.5) * 0.12 + 0.1;
    const drop = (hash(index, 2, 0, seed) - 0.5) * 0.5;
    for (const stroke of (STROKES[letter] ?? '').split(' '))
      for (let at = 0; at + 1 < stroke.length; at += 2) {
        const gx = Number(stroke[at]);
        const gy = Number(stroke[at + 1]);
        const px = pen + (gx + (6 - gy) * lean) * unit + (hash(index, at, 3, seed) - 0.5) * unit * 0.4;
        const py = y + (gy - 6 + drop) * unit + (hash(index, at, 4, seed) - 0.5) * unit * 0.4;
        path += `${at === 0 ? 'M' : 'L'}${px.toFixed(2)} ${py.toFixed(2)}`;
      }
    pen += unit * (letter === ' ' ? 3.4 : letter === '.' || letter === 'I' || letter === '1' ? 4.4 : 5.8);
  });
  return path;
}

/** How far `lettering` runs, in the drawing's units. */
export const letteringWidth = (words: string, height: number): number =>
  [...words].reduce(
    (sum, letter) =>
      sum + (height / 6) * (letter === ' ' ? 3.4 : letter === '.' || letter === 'I' || letter === '1' ? 4.4 : 5.8),
    0,
  );
