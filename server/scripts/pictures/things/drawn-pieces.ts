import { CARTOGRAPHER_BODY_OUTLINE } from './cartographer.ts';
import { dimension, paperSheet, pencilLine, section, words } from './drawings.ts';
import { HERON_BODY_OUTLINE, HERON_EMITTER_OUTLINE } from './heron.ts';
import { contour, country } from './reliefs.ts';
import { SALT_BODY_OUTLINE, saltPommelOutline } from './salt-lantern.ts';
import type { Sheet } from './sheets.ts';
import { WINTER_BODY_OUTLINE, WINTER_POMMEL_OUTLINE } from './second-winter.ts';

/** Section of The Salt Lantern with its pommel drawn apart. */
export function saltDrawing(): Promise<Sheet> {
  const x = 96;
  const y = 92;
  const px = 38;
  return paperSheet(
    section(saltPommelOutline(false), px - 16, y, 1.15, 'p') +
      section(SALT_BODY_OUTLINE, x + 6, y, 1.15, 'b') +
      dimension([x + 6, y - 24], [x + 6 + 235 * 1.15, y - 24], -22, '235') +
      dimension([x + 6 + 26 * 1.15, y + 22], [x + 6 + 123 * 1.15, y + 22], 18, '97') +
      dimension([x + 6 + 134 * 1.15, y + 24], [x + 6 + 182 * 1.15, y + 24], 16, '48') +
      dimension([px - 16 + 36 * 1.15, y + 22], [px - 16 + 52 * 1.15, y + 22], 14, '16') +
      dimension([x + 6 + 235 * 1.15, y - 11.3 * 1.15], [x + 6 + 235 * 1.15, y + 11.3 * 1.15], 16, '22.3') +
      section(saltPommelOutline(false), 40, 214, 2.1, 'd', 3.6) +
      dimension([40 + 52 * 2.1, 214 - 33.6], [40 + 52 * 2.1, 214 + 33.6], 14, '32 f7') +
      dimension([40 + 36 * 2.1, 214 + 42], [40 + 52 * 2.1, 214 + 42], 16, '16') +
      pencilLine(
        [
          [40 + 44 * 2.1, 180],
          [196, 158],
          [236, 158],
        ],
        { width: 0.3 },
      ) +
      words('SLIPS BY HAND', 198, 155, 4.6) +
      words('BORE 32 H8', 198, 166, 4.6) +
      words('STOP 1.5 SHORT OF SHOULDER', 182, 214, 4.6) +
      words('GRIP WALNUT', x + 52, y - 28, 4.6),
    ['THE SALT LANTERN', 'SECTION AND POMMEL', 'BRASS 40 BAR', 'SCALE AS NOTED'],
  );
}

/** Wiring sketch of The Salt Lantern, in coloured pencil. */
export function wiringSketch(): Promise<Sheet> {
  const box = (x: number, y: number, w: number, h: number, label: string): string =>
    pencilLine(
      [
        [x, y],
        [x + w, y],
        [x + w, y + h],
        [x, y + h],
        [x, y],
      ],
      { width: 0.7, seed: x },
    ) + words(label, x + 5, y + 10, 5);
  const run = (points: readonly (readonly [number, number])[], tone: string): string =>
    pencilLine(points, { width: 1.1, tone, seed: points.length });
  const pads = Array.from({ length: 8 }, (_, pad) =>
    pencilLine(
      [
        [158 + pad * 13, 118],
        [164 + pad * 13, 118],
        [164 + pad * 13, 124],
        [158 + pad * 13, 124],
        [158 + pad * 13, 118],
      ],
      { width: 0.4 },
    ),
  ).join('');
  return paperSheet(
    box(30, 40, 92, 34, 'CELL 3.6 V') +
      pencilLine(
        [
          [122, 50],
          [127, 50],
          [127, 64],
          [122, 64],
        ],
        { width: 0.7 },
      ) +
      box(150, 118, 120, 56, 'BOARD') +
      pads +
      box(318, 96, 66, 34, 'LED 8') +
      box(318, 156, 66, 30, 'BLADE') +
      box(30, 208, 74, 40, 'SWITCH') +
      box(140, 214, 60, 34, 'KILL') +
      pencilLine(
        Array.from({ length: 33 }, (_, k): [number, number] => [
          258 + 24 * Math.cos((k / 32) * 6.283),
          236 + 24 * Math.sin((k / 32) * 6.283),
        ]),
        { width: 0.7 },
      ) +
      words('28', 252, 239, 5) +
      run(
        [
          [127, 57],
          [161, 57],
          [161, 118],
        ],
        '#b3352a',
      ) +
      run(
        [
          [30, 57],
          [20, 57],
          [20, 190],
          [168, 190],
          [168, 214],
        ],
        '#2a2a2c',
      ) +
      run(
        [
          [187, 174],
          [187, 214],
        ],
        '#2a2a2c',
      ) +
      run(
        [
          [213, 118],
          [213, 84],
          [300, 84],
          [300, 112],
          [318, 112],
        ],
        '#3b7a45',
      ) +
      run(
        [
          [226, 118],
          [226, 92],
          [292, 92],
          [292, 170],
          [318, 170],
        ],
        '#2d57a5',
      ) +
      run(
        [
          [104, 222],
          [124, 222],
          [124, 150],
          [150, 150],
        ],
        '#c79a1e',
      ) +
      run(
        [
          [240, 174],
          [240, 217],
        ],
        '#8a4fa0',
      ) +
      run(
        [
          [252, 174],
          [252, 213],
        ],
        '#8a4fa0',
      ) +
      words('RED + AWG 22', 170, 66, 4.6) +
      words('330 R', 246, 80, 4.6) +
      words('DATA', 296, 150, 4.6) +
      words('LAST OFF FIRST ON', 40, 270, 4) +
      pencilLine(
        [
          [40, 274],
          [128, 273],
        ],
        { width: 0.5, tone: '#b3352a' },
      ),
    ['WIRING SKETCH', 'FROM THE PAD SIDE', 'THE SALT LANTERN'],
    '#ece9e0',
  );
}

export function heronDrawing(): Promise<Sheet> {
  const x = 34;
  const y = 88;
  const end = x + 232 * 1.1;
  return paperSheet(
    section(HERON_BODY_OUTLINE, x, y, 1.1, 'b') +
      section(HERON_EMITTER_OUTLINE, end + 20, y, 1.1, 'e') +
      pencilLine(
        [
          [end + 20 + 26 * 1.1, y - 22],
          [end + 20 + 62 * 1.1, y + 24],
        ],
        { width: 0.5, dash: '4 2' },
      ) +
      dimension([x, y - 20], [end, y - 20], -20, '232') +
      dimension([x + 138.6 * 1.1, y + 20], [x + 152 * 1.1, y + 20], 18, '13.4') +
      dimension([x, y + 18], [x + 138.6 * 1.1, y + 18], 34, '138.6') +
      dimension([end + 20 - 12 * 1.1, y + 18], [end + 20, y + 18], 20, '12') +
      words('COPPER SHRUNK ON', x + 130, y - 23, 4.6) +
      section(HERON_EMITTER_OUTLINE, 70, 216, 2.2, 'd', 3.6) +
      dimension([70 - 12 * 2.2, 216 - 33], [70 - 12 * 2.2, 216 + 33], -14, '30') +
      words('FIRM PUSH', 220, 196, 4) +
      words('BREAK EDGE 0.3', 220, 208, 4) +
      pencilLine(
        [
          [218, 204],
          [74, 176],
        ],
        { width: 0.3 },
      ),
    ['HERON AT DUSK', 'BODY AND FRONT PIECE', 'STEEL BLACKENED'],
  );
}

export function winterDrawing(): Promise<Sheet> {
  const x = 62;
  const y = 100;
  const s = 1.12;
  return paperSheet(
    section(WINTER_POMMEL_OUTLINE, x, y, s, 'p') +
      section(WINTER_BODY_OUTLINE, x + 36 * s, y, s, 'b', 3.1) +
      dimension([x, y - 24], [x + 282 * s, y - 24], -26, '282') +
      `<circle cx="${x + 141 * s}" cy="${y - 52.6}" r="11" fill="none" stroke="#b3352a" stroke-width="0.9" opacity="0.75"/>` +
      dimension([x, y + 23], [x + 36 * s, y + 23], 16, '36') +
      dimension([x + 76 * s, y + 23], [x + 86 * s, y + 23], 16, '10') +
      dimension([x + 153 * s, y + 23], [x + 204 * s, y + 23], 16, '51') +
      dimension([x + 282 * s, y - 19.2 * s], [x + 282 * s, y + 19.2 * s], 14, '38.4') +
      words('4 RINGS RESIN', x + 78, y - 28, 4.6) +
      section(WINTER_POMMEL_OUTLINE, 52, 218, 2, 'd', 3.6) +
      dimension([52 + 50 * 2, 218 - 30], [52 + 50 * 2, 218 + 30], 14, '30 f7') +
      words('MATCH THE OLDER PIECE', 196, 190, 4.4, '#a23a2c') +
      words('282 OVER ALL', 196, 202, 4.4, '#a23a2c') +
      words('BLAST LAST MASK THE BORE', 196, 218, 4.6),
    ['SECOND WINTER', 'SECTION', 'ALUMINIUM AND RESIN'],
  );
}

/** The country unrolled, with a section of the body above it. */
export function cartographerDrawing(): Promise<Sheet> {
  const dots: string[] = [];
  const [left, top, wide, high] = [40, 150, 290, 118];
  for (let px = 0; px < wide; px += 0.4)
    for (let py = 0; py < high; py += 0.4) {
      const x = 34 + (px / wide) * 142;
      const angle = (py / high) * Math.PI * 2;
      const height = country(x, angle, 61);
      const slope = Math.hypot(
        (country(x + 0.4, angle, 61) - height) / 0.4,
        (country(x, angle + 0.022, 61) - height) / 0.4,
      );
      if (contour(height, 22, slope, 0.22) > 0.4) dots.push(`M${(left + px).toFixed(1)} ${(top + py).toFixed(1)}h0.4`);
    }
  return paperSheet(
    section(CARTOGRAPHER_BODY_OUTLINE, 52, 76, 1.15, 'b') +
      dimension([52, 76 - 25], [52 + 234 * 1.15, 76 - 25], -16, '234') +
      dimension([52 + 34 * 1.15, 76 + 24], [52 + 176 * 1.15, 76 + 24], 18, '142') +
      pencilLine(
        [
          [left, top],
          [left + wide, top],
          [left + wide, top + high],
          [left, top + high],
          [left, top],
        ],
        { width: 0.4, dash: '4 2' },
      ) +
      `<path d="${dots.join('')}" stroke="#4a4640" stroke-width="0.44" opacity="0.8"/>` +
      words('UNROLLED - EVERY FIFTH LINE DEEPER', left + 2, top + high + 8, 4.6),
    ['THE CARTOGRAPHER', 'ENGRAVING', 'BRONZE'],
  );
}
