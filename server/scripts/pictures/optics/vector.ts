export type Vec3 = readonly [number, number, number];

export const add = (a: Vec3, b: Vec3): Vec3 => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
export const minus = (a: Vec3, b: Vec3): Vec3 => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const times = (a: Vec3, factor: number): Vec3 => [a[0] * factor, a[1] * factor, a[2] * factor];
export const dot = (a: Vec3, b: Vec3): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
export const cross = (a: Vec3, b: Vec3): Vec3 => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
export const unit = (a: Vec3): Vec3 => times(a, 1 / Math.hypot(a[0], a[1], a[2]));

export const clamp = (value: number, low: number, high: number): number =>
  value < low ? low : value > high ? high : value;
export const mix = (a: number, b: number, share: number): number => a + (b - a) * share;
/** 0 below `low`, 1 above `high`, smooth between. */
export const smooth = (low: number, high: number, value: number): number => {
  const t = clamp((value - low) / (high - low), 0, 1);
  return t * t * (3 - 2 * t);
};

/** Where a thing lies: its own axes in the picture's axes (mm, y up). `x` is the axis of turned things. */
export interface Frame {
  origin: Vec3;
  x: Vec3;
  y: Vec3;
  z: Vec3;
}

/** A frame whose x runs along `axis`; `rollDeg` turns it about that axis. */
export function frameAlong(origin: Vec3, axis: Vec3, rollDeg = 0): Frame {
  const x = unit(axis);
  const helper: Vec3 = Math.abs(x[1]) > 0.9 ? [0, 0, 1] : [0, 1, 0];
  const side = unit(cross(x, helper));
  const up = cross(side, x);
  const c = Math.cos((rollDeg * Math.PI) / 180);
  const s = Math.sin((rollDeg * Math.PI) / 180);
  const y = add(times(up, c), times(side, s));
  return { origin, x, y, z: cross(x, y) };
}

/** A frame on the bench: upright, turned by `yawDeg` about the vertical. */
export function frameFlat(origin: Vec3, yawDeg = 0): Frame {
  const c = Math.cos((yawDeg * Math.PI) / 180);
  const s = Math.sin((yawDeg * Math.PI) / 180);
  return { origin, x: [c, 0, -s], y: [0, 1, 0], z: [s, 0, c] };
}

/** A point of `frame` in the picture's axes. */
export const place = (frame: Frame, point: Vec3): Vec3 =>
  add(frame.origin, add(times(frame.x, point[0]), add(times(frame.y, point[1]), times(frame.z, point[2]))));

/** The frame moved along its own axes. */
export const shifted = (frame: Frame, by: Vec3): Frame => ({ ...frame, origin: place(frame, by) });
