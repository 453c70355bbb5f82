import { along, seenIn, type LightRig } from './light.ts';
import { hash } from './noise.ts';
import type { Scene } from './scene.ts';
import { Space } from './space.ts';
import { blankSurface, clearSurface, type Surface } from './surface.ts';

const FAR_MM = 4000;

type Rgb = [number, number, number];

/**
 * Follows rays through a scene: distance stepping for the things, one mirrored ray for polished skins, soft shadows,
 * and the darkening of corners. Not thread-safe: it reuses its own working values.
 */
export class Tracer {
  readonly #space: Space;
  readonly #light: LightRig;
  readonly #bench: Scene['bench'];
  readonly #surfaces: readonly Surface[] = [blankSurface(), blankSurface()];
  readonly #seen: Rgb = [0, 0, 0];
  #sample = 0;

  constructor(scene: Scene) {
    this.#space = new Space(scene.solids);
    this.#light = scene.light;
    this.#bench = scene.bench;
  }

  /** Light that comes back along a ray, written into `out`. `sample` makes the scatter of this ray repeatable. */
  see(ox: number, oy: number, oz: number, dx: number, dy: number, dz: number, sample: number, out: Rgb): void {
    this.#sample = sample;
    this.#look(ox, oy, oz, dx, dy, dz, 0, out);
  }

  #look(ox: number, oy: number, oz: number, dx: number, dy: number, dz: number, depth: 0 | 1, out: Rgb): void {
    const benchAt = dy < -1e-5 ? -oy / dy : FAR_MM * 2;
    this.#space.meet(ox, oy, oz, dx, dy, dz, Math.min(benchAt, FAR_MM));
    const solid = this.#space.hitSolid;
    const surface = this.#surfaces[depth] ?? blankSurface();
    clearSurface(surface);
    let nx: number;
    let ny = 1;
    let nz: number;
    let px: number;
    let py = 0;
    let pz: number;
    if (solid) {
      const t = this.#space.hitAt;
      px = ox + dx * t;
      py = oy + dy * t;
      pz = oz + dz * t;
      const { frame } = solid;
      const ex = px - frame.origin[0];
      const ey = py - frame.origin[1];
      const ez = pz - frame.origin[2];
      const lx = ex * frame.x[0] + ey * frame.x[1] + ez * frame.x[2];
      const ly = ex * frame.y[0] + ey * frame.y[1] + ez * frame.y[2];
      const lz = ex * frame.z[0] + ey * frame.z[1] + ez * frame.z[2];
      const e = 0.06;
      const a = solid.distance(lx + e, ly - e, lz - e);
      const b = solid.distance(lx - e, ly - e, lz + e);
      const c = solid.distance(lx - e, ly + e, lz - e);
      const d = solid.distance(lx + e, ly + e, lz + e);
      solid.material(lx, ly, lz, surface);
      let mx = a - b - c + d;
      let my = -a - b + c + d;
      let mz = -a + b - c + d;
      const size = 1 / (Math.sqrt(mx * mx + my * my + mz * mz) + 1e-9);
      mx = mx * size + surface.tiltX + (surface.streak > 0 ? this.#scatter(depth + 3) * surface.streak * 0.4 : 0);
      my = my * size + surface.tiltY;
      mz = mz * size + surface.tiltZ;
      nx = mx * frame.x[0] + my * frame.y[0] + mz * frame.z[0];
      ny = mx * frame.x[1] + my * frame.y[1] + mz * frame.z[1];
      nz = mx * frame.x[2] + my * frame.y[2] + mz * frame.z[2];
    } else if (benchAt < FAR_MM) {
      px = ox + dx * benchAt;
      pz = oz + dz * benchAt;
      this.#bench(px, pz, surface);
      nx = surface.tiltX;
      nz = surface.tiltZ;
    } else {
      seenIn(this.#light, dx, dy, dz, 0.6, out);
      return;
    }
    const size = 1 / Math.sqrt(nx * nx + ny * ny + nz * nz);
    nx *= size;
    ny *= size;
    nz *= size;
    this.#shade(px, py, pz, nx, ny, nz, dx, dy, dz, surface, depth, solid === null, out);
  }

  #shade(
    px: number,
    py: number,
    pz: number,
    nx: number,
    ny: number,
    nz: number,
    dx: number,
    dy: number,
    dz: number,
    surface: Surface,
    depth: 0 | 1,
    onBench: boolean,
    out: Rgb,
  ): void {
    const { r, g, b, metal, rough, glowR, glowG, glowB } = surface;
    const light = this.#light;
    const open = this.#space.openness(px, py, pz, nx, ny, nz);
    const high = ny * 0.5 + 0.5;
    let lr = (light.below[0] * (1 - high) + light.above[0] * high) * open;
    let lg = (light.below[1] * (1 - high) + light.above[1] * high) * open;
    let lb = (light.below[2] * (1 - high) + light.above[2] * high) * open;
    let lit = 0;
    for (const pane of light.panes) {
      const facing = nx * pane.toward[0] + ny * pane.toward[1] + nz * pane.toward[2];
      // A wide pane still lights a little past the edge of the turn.
      const wrapped = facing > 0.15 ? facing : Math.max(0, (facing + 0.15) * 0.5);
      if (wrapped <= 0) continue;
      const share =
        wrapped *
        this.#space.sight(
          px + nx * 0.15,
          py + ny * 0.15,
          pz + nz * 0.15,
          pane.toward[0],
          pane.toward[1],
          pane.toward[2],
          FAR_MM,
          pane.crisp,
        );
      lit += share;
      lr += pane.light[0] * share;
      lg += pane.light[1] * share;
      lb += pane.light[2] * share;
    }
    for (const rod of light.rods)
      for (let step = 0; step < 6; step += 1) {
        const q = along(rod, (step + 0.5) / 6);
        const vx = q[0] - px;
        const vy = q[1] - py;
        const vz = q[2] - pz;
        const far = Math.sqrt(vx * vx + vy * vy + vz * vz) + 1e-6;
        const facing = (nx * vx + ny * vy + nz * vz) / far;
        if (facing <= 0) continue;
        const share =
          ((facing * 2600) / (far * far + 500)) *
          this.#space.sight(px + nx * 0.2, py + ny * 0.2, pz + nz * 0.2, vx / far, vy / far, vz / far, far, 5);
        lr += rod.light[0] * share;
        lg += rod.light[1] * share;
        lb += rod.light[2] * share;
      }
    const dull = 1 - metal;
    out[0] = r * dull * lr + glowR;
    out[1] = g * dull * lg + glowG;
    out[2] = b * dull * lb + glowB;

    let facing = -(nx * dx + ny * dy + nz * dz);
    if (facing < 0.02) facing = 0.02;
    const spread = rough * 0.22;
    const sx = nx + this.#scatter(depth) * spread;
    const sy = ny + this.#scatter(depth + 7) * spread;
    const sz = nz + this.#scatter(depth + 13) * spread;
    const turn = 2 * (sx * dx + sy * dy + sz * dz);
    let rx = dx - turn * sx;
    let ry = dy - turn * sy;
    let rz = dz - turn * sz;
    const size = 1 / (Math.sqrt(rx * rx + ry * ry + rz * rz) + 1e-9);
    rx *= size;
    ry *= size;
    rz *= size;
    const grazing = (1 - facing) ** 5 * (1 - rough) ** 2;
    const base = 0.04 * dull;
    const fr = base + r * metal;
    const fg = base + g * metal;
    const fb = base + b * metal;
    let mr: number;
    let mg: number;
    let mb: number;
    if (depth === 0 && (metal > 0.25 || rough < 0.3) && !(onBench && rough > 0.25)) {
      const seen: Rgb = [0, 0, 0];
      if (this.#blocked(px + nx * 0.1, py + ny * 0.1, pz + nz * 0.1, rx, ry, rz)) {
        this.#look(px + nx * 0.1, py + ny * 0.1, pz + nz * 0.1, rx, ry, rz, 1, seen);
        [mr, mg, mb] = seen;
      } else {
        seenIn(light, rx, ry, rz, rough, this.#seen);
        [mr, mg, mb] = this.#seen;
      }
    } else {
      seenIn(light, rx, ry, rz, rough, this.#seen);
      const shaded = open * (0.35 + 0.65 * Math.min(1, lit * 1.6 + 0.25));
      mr = this.#seen[0] * shaded;
      mg = this.#seen[1] * shaded;
      mb = this.#seen[2] * shaded;
    }
    const closed = 0.55 + 0.45 * open;
    out[0] += (fr + (1 - fr) * grazing) * mr * closed;
    out[1] += (fg + (1 - fg) * grazing) * mg * closed;
    out[2] += (fb + (1 - fb) * grazing) * mb * closed;
  }

  /** Whether a mirrored ray meets anything but the room. */
  #blocked(ox: number, oy: number, oz: number, dx: number, dy: number, dz: number): boolean {
    if (dy < -0.02) return true;
    this.#space.meet(ox, oy, oz, dx, dy, dz, FAR_MM);
    return this.#space.hitSolid !== null;
  }

  #scatter(salt: number): number {
    return hash(this.#sample, salt, 0, 91) + hash(this.#sample, salt, 1, 91) - 1;
  }
}
