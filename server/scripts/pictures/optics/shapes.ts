import type { Shape } from './solid.ts';
import { hash, noise2 } from './noise.ts';

/** A flat thing cut out of sheet: `corners` in x and z (mm), `thickness` about y = 0. */
export function cutOut(corners: readonly (readonly [x: number, z: number])[], thickness: number, round = 0.3): Shape {
  const xs = corners.map(([x]) => x);
  const zs = corners.map(([, z]) => z);
  return {
    min: [Math.min(...xs), -thickness / 2, Math.min(...zs)],
    max: [Math.max(...xs), thickness / 2, Math.max(...zs)],
    distance: (x, y, z) => {
      let best = 1e9;
      let inside = false;
      let before = corners.at(-1) ?? [0, 0];
      for (const corner of corners) {
        const ex = before[0] - corner[0];
        const ez = before[1] - corner[1];
        const px = x - corner[0];
        const pz = z - corner[1];
        const t = Math.min(Math.max((px * ex + pz * ez) / (ex * ex + ez * ez), 0), 1);
        best = Math.min(best, (px - ex * t) ** 2 + (pz - ez * t) ** 2);
        if (corner[1] > z !== before[1] > z && x < (ex * pz) / ez + corner[0]) inside = !inside;
        before = corner;
      }
      const flat = (inside ? -Math.sqrt(best) : Math.sqrt(best)) + round;
      const high = Math.abs(y) - thickness / 2 + round;
      return Math.min(Math.max(flat, high), 0) + Math.hypot(Math.max(flat, 0), Math.max(high, 0)) - round;
    },
  };
}

/** Crumpled paper filling a box: flat facets between straight creases, up to `height` mm. */
export function crumpled(width: number, depth: number, base: number, height: number, seed: number, foldMm = 62): Shape {
  const folds = Array.from({ length: 9 }, (_, fold) => {
    const angle = (fold * 2.4 + hash(fold, 1, 0, seed)) % Math.PI;
    const length = foldMm * (0.45 + 1.1 * hash(fold, 2, 0, seed));
    return {
      x: Math.cos(angle) / length,
      z: Math.sin(angle) / length,
      from: hash(fold, 3, 0, seed),
      rise: length / foldMm,
    };
  });
  const total = folds.reduce((sum, fold) => sum + fold.rise, 0);
  const at = (x: number, z: number): number => {
    const bendX = x + (noise2(x / 60, z / 60, seed) - 0.5) * 50;
    const bendZ = z + (noise2(x / 60 + 9, z / 60, seed) - 0.5) * 50;
    let sum = 0;
    for (const fold of folds) {
      const t = bendX * fold.x + bendZ * fold.z + fold.from;
      sum += Math.abs(t - Math.round(t)) * 2 * fold.rise;
    }
    return base + Math.max(0, (sum / total - 0.22) / 0.5) * height;
  };
  return {
    min: [-width / 2, 0, -depth / 2],
    max: [width / 2, base + height * 1.3, depth / 2],
    stride: 0.45,
    distance: (x, y, z) => {
      const side = Math.max(Math.abs(x) - width / 2, Math.abs(z) - depth / 2);
      const top = y > base + height * 1.3 + 2 ? y - base - height * 1.3 : (y - at(x, z)) * 0.75;
      return Math.max(top, side, -y);
    },
  };
}
