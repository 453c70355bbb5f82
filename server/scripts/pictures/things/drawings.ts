import { hash } from '../optics/noise.ts';
import type { Corner } from '../optics/turned.ts';
import { lettering, letteringWidth } from './lettering.ts';
import { sheetOf, type Sheet } from './sheets.ts';

/** A drawing sheet, mm. */
export const SHEET = { width: 420, height: 297 } as const;

const PENCIL = '#2c2b30';

/** A pencil line: a little unsure, pressed unevenly. */
export function pencilLine(
  points: readonly (readonly [number, number])[],
  options: { width?: number; tone?: string; dash?: string; seed?: number } = {},
): string {
  const { width: asked = 0.5, tone = PENCIL, dash = '', seed = 1 } = options;
  const width = asked * 1.55;
  let path = '';
  points.forEach(([x, y], index) => {
    const before = points[index - 1];
    const legs = before ? Math.max(1, Math.round(Math.hypot(x - before[0], y - before[1]) / 9)) : 1;
    for (let leg = 1; leg <= legs; leg += 1) {
      const px = before ? before[0] + ((x - before[0]) * leg) / legs : x;
      const py = before ? before[1] + ((y - before[1]) * leg) / legs : y;
      const jitter = (salt: number): number => (hash(index * 40 + leg, salt, Math.round(x + y), seed) - 0.5) * 0.28;
      path += `${before ? 'L' : 'M'}${(px + jitter(1)).toFixed(2)} ${(py + jitter(2)).toFixed(2)}`;
    }
  });
  const stroke = (w: number, o: number, d: string): string =>
    `<path d="${d}" fill="none" stroke="${tone}" stroke-width="${w}" stroke-opacity="${o}" stroke-linecap="round" stroke-linejoin="round" ${dash ? `stroke-dasharray="${dash}"` : ''}/>`;
  return stroke(width, 0.82, path) + stroke(width * 2.2, 0.1, path);
}

export const words = (text: string, x: number, y: number, height = 4, tone = PENCIL): string =>
  `<path d="${lettering(text, x, y, height, text.length)}" fill="none" stroke="${tone}" stroke-width="${height * 0.13}" stroke-opacity="0.9" stroke-linecap="round" stroke-linejoin="round"/>`;

/** A dimension between two points of one line, set off from it; `text` in the middle. */
export function dimension(
  from: readonly [number, number],
  to: readonly [number, number],
  offset: number,
  text: string,
): string {
  const upright = Math.abs(from[0] - to[0]) < 0.01;
  const a: [number, number] = upright ? [from[0] + offset, from[1]] : [from[0], from[1] + offset];
  const b: [number, number] = upright ? [to[0] + offset, to[1]] : [to[0], to[1] + offset];
  const fine = { width: 0.26 };
  const over = Math.sign(offset) * 2;
  const end = (p: [number, number]): [number, number] => (upright ? [p[0] + over, p[1]] : [p[0], p[1] + over]);
  const head = (at: [number, number], way: number): string =>
    pencilLine(
      upright
        ? [[at[0] - 0.8, at[1] + way * 2.6], at, [at[0] + 0.8, at[1] + way * 2.6]]
        : [[at[0] + way * 2.6, at[1] - 0.8], at, [at[0] + way * 2.6, at[1] + 0.8]],
      { width: 0.3 },
    );
  const wide = letteringWidth(text, 5.2);
  const label = upright
    ? `<g transform="translate(${a[0] - 1.4} ${(a[1] + b[1]) / 2 + wide / 2}) rotate(-90)">${words(text, 0, 0, 5.2)}</g>`
    : words(text, (a[0] + b[0]) / 2 - wide / 2, a[1] - 1.6, 5.2);
  return (
    pencilLine([from, end(a)], fine) +
    pencilLine([to, end(b)], fine) +
    pencilLine([a, b], fine) +
    head(a, upright ? Math.sign(b[1] - a[1]) : 1) +
    head(b, upright ? Math.sign(a[1] - b[1]) : -1) +
    label
  );
}

/** A turned part in section about its axis: outline, hatching on both sides, centre line. */
export function section(
  outline: readonly Corner[],
  originX: number,
  axisY: number,
  scale: number,
  id: string,
  hatchMm = 2.6,
): string {
  const corners = outline.map(([x, r]): [number, number] => [originX + x * scale, r * scale]);
  const half = (side: 1 | -1): [number, number][] =>
    corners.map(([x, r]): [number, number] => [x, axisY + side * Math.max(r, 0)]);
  const shape = (side: 1 | -1): string =>
    half(side)
      .map(([x, y], index) => `${index ? 'L' : 'M'}${x.toFixed(2)} ${y.toFixed(2)}`)
      .join('') + 'Z';
  const xs = corners.map(([x]) => x);
  const [low, high] = [Math.min(...xs), Math.max(...xs)];
  let hatch = '';
  for (let x = low - 60; x < high + 60; x += hatchMm)
    hatch += pencilLine(
      [
        [x, axisY + 50],
        [x + 100, axisY - 50],
      ],
      { width: 0.2, seed: Math.round(x) },
    );
  // The axis itself is no edge of the part.
  const edges = (side: 1 | -1): string =>
    half(side)
      .map((corner, index, all): string => {
        const next = all[(index + 1) % all.length] ?? corner;
        return corner[1] === axisY && next[1] === axisY
          ? ''
          : pencilLine([corner, next], { width: 0.62, seed: side + 4 });
      })
      .join('');
  return (
    `<clipPath id="${id}"><path d="${shape(1)}${shape(-1)}"/></clipPath><g clip-path="url(#${id})">${hatch}</g>` +
    edges(-1) +
    edges(1) +
    pencilLine(
      [
        [low - 8, axisY],
        [high + 8, axisY],
      ],
      { width: 0.24, dash: '9 1.6 1.4 1.6' },
    )
  );
}

/** Border, folds, smudges and the block of words in the corner. */
export function paperSheet(body: string, block: readonly string[], tint = '#f1ebdc'): Promise<Sheet> {
  const { width, height } = SHEET;
  let smudges = '';
  for (let k = 0; k < 9; k += 1)
    smudges += `<ellipse cx="${hash(k, 1, 0, 3) * width}" cy="${hash(k, 2, 0, 3) * height}" rx="${14 + hash(k, 3, 0, 3) * 34}" ry="${6 + hash(k, 4, 0, 3) * 12}" fill="#6d6a66" opacity="0.035" transform="rotate(${hash(k, 5, 0, 3) * 40 - 20} ${width / 2} ${height / 2})"/>`;
  const ring = `<circle cx="372" cy="52" r="31" fill="none" stroke="#8a5a2c" stroke-width="2.2" opacity="0.13"/><path d="M345 38a31 31 0 0 1 40 -14" fill="none" stroke="#8a5a2c" stroke-width="1.4" opacity="0.2"/>`;
  const folds = `<path d="M${width / 2} 0V${height}M0 ${height / 2}H${width}" stroke="#8d8676" stroke-width="0.5" opacity="0.4"/><path d="M${width / 2 + 0.7} 0V${height}M0 ${height / 2 + 0.7}H${width}" stroke="#ffffff" stroke-width="0.7" opacity="0.7"/>`;
  const edge = pencilLine(
    [
      [10, 10],
      [width - 10, 10],
      [width - 10, height - 10],
      [10, height - 10],
      [10, 10],
    ],
    { width: 0.5 },
  );
  const boxX = width - 118;
  const boxY = height - 10 - block.length * 9 - 3;
  const box =
    pencilLine(
      [
        [boxX, height - 10],
        [boxX, boxY],
        [width - 10, boxY],
      ],
      { width: 0.5 },
    ) +
    block
      .map(
        (line, index) =>
          words(line, boxX + 5, boxY + 8.4 + index * 9, index === 0 ? 5.4 : 4.6) +
          (index
            ? pencilLine(
                [
                  [boxX, boxY + 2.5 + index * 9],
                  [width - 10, boxY + 2.5 + index * 9],
                ],
                { width: 0.22 },
              )
            : ''),
      )
      .join('');
  return sheetOf(smudges + ring + folds + edge + box + body, width, height, 6, tint);
}
