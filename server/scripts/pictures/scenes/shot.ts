import type { Camera } from '../optics/scene.ts';
import { solid, type Solid } from '../optics/solid.ts';
import { add, frameFlat, type Frame, type Vec3 } from '../optics/vector.ts';
import { block } from '../optics/solid.ts';
import { colour, printed } from '../things/materials.ts';
import { SHEET } from '../things/drawings.ts';
import type { Sheet } from '../things/sheets.ts';

/** A camera that looks at a point from `turnDeg` round it (0 is in front) and `upDeg` above. */
export function shot(
  at: Vec3,
  from: {
    turnDeg: number;
    upDeg: number;
    distance: number;
    fieldDeg: number;
    openingMm: number;
    focus?: Vec3;
    rollDeg?: number;
  },
): Camera {
  const turn = (from.turnDeg * Math.PI) / 180;
  const up = (from.upDeg * Math.PI) / 180;
  const away: Vec3 = [
    Math.sin(turn) * Math.cos(up) * from.distance,
    Math.sin(up) * from.distance,
    Math.cos(turn) * Math.cos(up) * from.distance,
  ];
  return {
    from: add(at, away),
    at,
    fieldDeg: from.fieldDeg,
    openingMm: from.openingMm,
    focus: from.focus ?? at,
    rollDeg: from.rollDeg ?? 0,
  };
}

/** A drawing sheet lying on the bench at half size, so that it and what lies on it fit one picture. */
export function layDown(sheet: Sheet, at: Vec3, yawDeg: number, scale = 0.7): Solid {
  const size = { widthMm: SHEET.width * scale, depthMm: SHEET.height * scale };
  const face = printed(sheet, size);
  return solid(
    frameFlat(add(at, [0, 0.3, 0]), yawDeg),
    block(size.widthMm, 0.6, size.depthMm, 0.1),
    (x, y, z, surface) => {
      if (y > 0.1) face(x, y, z, surface);
      else colour(surface, [0.7, 0.66, 0.58]);
    },
  );
}

/** A thing's frame stood upright: its x points up. */
export const upright = (at: Vec3, yawDeg = 0): Frame => {
  const flat = frameFlat(at, yawDeg);
  return { origin: flat.origin, x: flat.y, y: flat.z, z: flat.x };
};
