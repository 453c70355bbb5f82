import { picture, type Picture } from '../picture.ts';
import { darkRoom, lampLight, tubeLight, windowLight, type Rod } from '../optics/light.ts';
import { film } from '../optics/scene.ts';
import { bar, solid } from '../optics/solid.ts';
import { frameAlong, frameFlat, place, shifted } from '../optics/vector.ts';
import { leather, linen, woodBench } from '../things/benches.ts';
import { saltDrawing, wiringSketch } from '../things/drawn-pieces.ts';
import { glowing } from '../things/materials.ts';
import { carton, packing, tissue } from '../things/parcel.ts';
import { SALT_LANTERN_RADIUS_MM, saltLantern } from '../things/salt-lantern.ts';
import { cloth, pencil, rule, screwdriver } from '../things/tools.ts';
import { layDown, shot } from './shot.ts';

const LYING = SALT_LANTERN_RADIUS_MM;

/** The whole piece, its drawings, and its travels. */
export const SALT_LANTERN_PICTURES: readonly Picture[] = [
  picture('salt-lantern-cover.jpg', () => ({
    camera: shot([8, 12, 4], {
      turnDeg: -14,
      upDeg: 29,
      distance: 420,
      fieldDeg: 42,
      openingMm: 4,
      focus: [0, 25, 20],
    }),
    bench: woodBench({ tone: [0.2, 0.1, 0.045] }),
    light: windowLight(-78, 1),
    solids: [
      ...saltLantern(frameAlong([-96, LYING, 44], [1, 0, -0.4], 20), { lit: true }),
      cloth(frameFlat([-150, 0, -110], 24)),
    ],
    film: film({ exposure: 0.95, bloom: 0.1, vignette: 0.5 }),
  })),
  picture('salt-lantern-section.jpg', async () => ({
    camera: shot([4, 0, 4], { turnDeg: 4, upDeg: 71, distance: 312, fieldDeg: 48, openingMm: 1.2, rollDeg: -2 }),
    bench: woodBench({ tone: [0.3, 0.19, 0.1], seed: 14 }),
    light: windowLight(-50),
    solids: [
      layDown(await saltDrawing(), [0, 0, 0], 1.5, 0.68),
      pencil(frameAlong([26, 0.6, 92], [1, 0, -0.62], 12)),
      await rule(frameFlat([-62, 0.6, 116], 3)),
    ],
    film: film({ exposure: 0.72 }),
  })),
  picture('salt-lantern-arrived.jpg', async () => ({
    camera: shot([14, 4, 6], { turnDeg: 0, upDeg: 58, distance: 400, fieldDeg: 43, openingMm: 2 }),
    bench: leather(),
    light: tubeLight(-15, 1.1),
    solids: [
      ...saltLantern(frameAlong([-86, LYING, -18], [1, 0, 0.06], 75), { age: 0.5 }),
      await rule(frameFlat([0, 0, 56], 2)),
    ],
    film: film({ exposure: 1.05 }),
  })),
  picture(
    'salt-lantern-daylight.jpg',
    () => ({
      camera: shot([4, 4, 0], {
        turnDeg: 12,
        upDeg: 64,
        distance: 430,
        fieldDeg: 45,
        openingMm: 3.4,
        focus: [0, 24, 10],
      }),
      bench: linen(),
      light: windowLight(-75, 1.15),
      solids: saltLantern(frameAlong([-34, LYING, 104], [0.34, 0, -1], 130), { age: 0.78 }),
      film: film({ exposure: 0.72, warmth: 0.97 }),
    }),
    { upright: true },
  ),
  picture('salt-lantern-sketch.jpg', async () => ({
    camera: shot([0, 0, 2], { turnDeg: -9, upDeg: 66, distance: 315, fieldDeg: 46, openingMm: 1.6, rollDeg: 3 }),
    bench: leather({ tone: [0.08, 0.07, 0.06], seed: 35 }),
    light: lampLight(40, 1.1),
    solids: [
      layDown(await wiringSketch(), [0, 0, 0], -3, 0.68),
      ...screwdriver(frameAlong([-172, 0, 112], [1, 0, -0.16])),
      pencil(frameAlong([74, 0.6, 66], [-0.3, 0, -1], 12)),
    ],
    film: film({ exposure: 0.72 }),
  })),
  picture(
    'salt-lantern-lit.jpg',
    () => {
      const frame = frameAlong([-190, LYING, 66], [1, 0, -0.36], 20);
      const rod: Rod = { from: place(frame, [236, 0, 0]), to: place(frame, [640, 0, 0]), light: [1.2, 0.82, 0.46] };
      return {
        camera: shot([30, 10, -8], {
          turnDeg: -24,
          upDeg: 24,
          distance: 520,
          fieldDeg: 46,
          openingMm: 4,
          focus: [-70, 20, 30],
        }),
        bench: woodBench({ seed: 15 }),
        light: darkRoom(rod),
        solids: [
          ...saltLantern(frame, { lit: true }),
          solid(shifted(frame, [205, 0, 0]), bar(11.1, 470, 11), glowing([1, 0.74, 0.42], 2.5), false),
        ],
        film: film({ exposure: 1.5, bloom: 0.9, vignette: 0.5 }),
      };
    },
    { rays: 8 },
  ),
  picture('salt-lantern-parcel.jpg', () => {
    const hilt = frameAlong([-98, 62, 16], [1, 0.02, -0.16], 35);
    return {
      camera: shot([0, 46, 4], {
        turnDeg: 10,
        upDeg: 54,
        distance: 455,
        fieldDeg: 44,
        openingMm: 4,
        focus: [-20, 70, 10],
      }),
      bench: woodBench({ tone: [0.27, 0.16, 0.08], seed: 16, turned: true }),
      light: windowLight(-40, 1.05),
      solids: [
        ...carton(frameFlat([0, 0, 0], 0), 330, 190, 96),
        packing(frameFlat([0, 4, 0], 0), 322, 182, 14, 44, 931),
        ...saltLantern(hilt),
        tissue(shifted(hilt, [20, 0, 0]), 19.5, 108),
      ],
      film: film({ exposure: 0.9 }),
    };
  }),
];
