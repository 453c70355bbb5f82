import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

/** Values of the theme as `--name: light-dark(#day, #night);` gives them. */
const css = readFileSync(new URL('../../../src/styles/theme.css', import.meta.url), 'utf8');
const tokens = new Map<string, { light: string; dark: string }>();
for (const [, name, light, dark] of css.matchAll(/--([a-z-]+):\s*light-dark\((#[0-9a-f]{6}),\s*(#[0-9a-f]{6})\);/g))
  if (name && light && dark) tokens.set(name, { light, dark });

/** Relative luminance and contrast ratio as WCAG 2.2 defines them (w3.org/TR/WCAG22, "relative luminance"). */
function luminance(hex: string): number {
  const [red, green, blue] = [1, 3, 5].map((at) => {
    const channel = parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(one: string, other: string): number {
  const [lighter, darker] = [luminance(one), luminance(other)].sort((a, b) => b - a) as [number, number];
  return (lighter + 0.05) / (darker + 0.05);
}

function ratio(front: string, back: string, theme: 'light' | 'dark'): number {
  const [a, b] = [tokens.get(front), tokens.get(back)];
  if (!a || !b) throw new Error(`theme.css has no token ${a ? back : front}`);
  return contrast(a[theme], b[theme]);
}

const SURFACES = ['bone', 'vellum'];
const WORDS = [
  'soot',
  'lead-grey',
  'brass',
  'brass-deep',
  'verdigris',
  'gun-blue',
  'oxide',
  'oxide-deep',
  'plum',
  'moss',
];
/** Words that stand on a filling rather than on a surface. */
const FILLED: [words: string, filling: string][] = [
  ['on-brass', 'brass'],
  ['on-brass', 'brass-deep'],
  ['on-oxide', 'oxide'],
  ['on-oxide', 'oxide-deep'],
];
/** Lines and shapes that carry meaning or bound a control (WCAG 1.4.11). The hairline is decoration and not held to it. */
const LINES = ['edge', 'done-edge', 'work-edge'];

describe('contrast of the theme', () => {
  it('knows the formula: black on white is 21, and #777777 on white is 4.48 (common check value)', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
    expect(contrast('#777777', '#ffffff')).toBeCloseTo(4.48, 2);
  });

  it('reads every raw colour of the theme, so that none escapes the checks below', () => {
    const raw = css.slice(0, css.indexOf('@theme')).match(/#[0-9a-f]{3,8}\b/gi) ?? [];
    expect(raw.length).toBe(tokens.size * 2);
    const checked = new Set([...SURFACES, ...WORDS, ...LINES, 'on-brass', 'on-oxide']);
    const decoration = [
      'hairline',
      'veil',
      'done-body',
      'done-lit',
      'done-shade',
      'work-body',
      'work-lit',
      'work-shade',
    ];
    expect([...tokens.keys()].filter((name) => !checked.has(name)).sort()).toEqual(decoration.sort());
  });

  for (const theme of ['light', 'dark'] as const) {
    it.each(WORDS.flatMap((words) => SURFACES.map((surface) => [words, surface] as const)))(
      `${theme}: words in %s on %s reach 4.5:1`,
      (words, surface) => expect(ratio(words, surface, theme)).toBeGreaterThanOrEqual(4.5),
    );
    it.each(FILLED)(`${theme}: words in %s on a filling of %s reach 4.5:1`, (words, filling) =>
      expect(ratio(words, filling, theme)).toBeGreaterThanOrEqual(4.5),
    );
    it.each(LINES.flatMap((line) => SURFACES.map((surface) => [line, surface] as const)))(
      `${theme}: lines in %s on %s reach 3:1`,
      (line, surface) => expect(ratio(line, surface, theme)).toBeGreaterThanOrEqual(3),
    );
  }
});
