import { picture, type Picture } from '../picture.ts';
import { lampLight, tubeLight, windowLight } from '../optics/light.ts';
import { film } from '../optics/scene.ts';
import { frameAlong, frameFlat, shifted } from '../optics/vector.ts';
import { cuttingMat, laidOn, leather, linen, paintedBoard, woodBench } from '../things/benches.ts';
import { CARTOGRAPHER_RADIUS_MM, cartographer, cartographerBody, cartographerPommel } from '../things/cartographer.ts';
import { cartographerDrawing } from '../things/drawn-pieces.ts';
import { carton, packing, tissue } from '../things/parcel.ts';
import { brush, cloth, dish, pencil } from '../things/tools.ts';
import { measured } from './salt-lantern-bench.ts';
import { layDown, shot } from './shot.ts';

const LYING = CARTOGRAPHER_RADIUS_MM;

export const CARTOGRAPHER_PICTURES: readonly Picture[] = [
  picture('cartographer-cover.jpg', () => ({
    camera: shot([6, 8, 0], { turnDeg: -10, upDeg: 33, distance: 400, fieldDeg: 43, openingMm: 4, focus: [0, 28, 18] }),
    bench: leather({ tone: [0.17, 0.1, 0.055], seed: 39 }),
    light: windowLight(-52, 1.1),
    solids: cartographer(frameAlong([-92, LYING, -32], [1, 0, 0.3], 60)),
    film: film({ exposure: 1.35 }),
  })),
  picture('cartographer-drawing.jpg', async () => ({
    camera: shot([2, 0, 2], { turnDeg: 7, upDeg: 68, distance: 312, fieldDeg: 48, openingMm: 1.2, rollDeg: -2 }),
    bench: woodBench({ tone: [0.26, 0.15, 0.075], seed: 24, turned: true }),
    light: lampLight(-45, 1.15),
    solids: [
      layDown(await cartographerDrawing(), [0, 0, 0], 3, 0.68),
      pencil(frameAlong([128, 0.6, 84], [-0.5, 0, -1], 12)),
    ],
    film: film({ exposure: 0.72 }),
  })),
  picture('cartographer-dragging.jpg', () => ({
    camera: shot([24, 14, 4], {
      turnDeg: 16,
      upDeg: 30,
      distance: 170,
      fieldDeg: 40,
      openingMm: 2.6,
      focus: [34, 22, 14],
    }),
    bench: laidOn(woodBench({ tone: [0.28, 0.18, 0.1], seed: 26 }), cuttingMat({ seed: 29 }), {
      x: 40,
      z: 70,
      halfX: 200,
      halfZ: 120,
      yawDeg: 5,
    }),
    light: tubeLight(-25, 1.2),
    solids: [cartographerPommel(frameAlong([0, 19.2, 6], [1, 0, 0.12], 110), 'full', false)],
    film: film({ exposure: 1.05 }),
  })),
  picture('cartographer-eased.jpg', async () => ({
    camera: shot([22, 42, -10], {
      turnDeg: 20,
      upDeg: 46,
      distance: 205,
      fieldDeg: 42,
      openingMm: 2,
      focus: [4, 56, 2],
    }),
    bench: paintedBoard([0.24, 0.27, 0.25], 67),
    light: windowLight(-110, 1.05),
    solids: await measured((frame) => cartographerPommel(shifted(frame, [-2, 0, 0]), 'full', true), {
      heightMm: 46,
      diameterMm: 30.95,
      reading: '30.95',
    }),
    film: film({ exposure: 0.9 }),
  })),
  picture('cartographer-patina.jpg', () => ({
    camera: shot([0, 8, 6], {
      turnDeg: -6,
      upDeg: 44,
      distance: 390,
      fieldDeg: 44,
      openingMm: 3.4,
      focus: [0, 24, 10],
    }),
    bench: linen({ tone: [0.36, 0.35, 0.32], seed: 55 }),
    light: windowLight(-70, 1.1),
    solids: [
      cartographerBody(frameAlong([-126, LYING, 26], [1, 0, -0.14], 30), 'half'),
      ...dish(frameFlat([86, 0, -66], 0), [0.03, 0.05, 0.03]),
      ...brush(frameAlong([20, 0, 96], [-1, 0.02, -0.24])),
    ],
    film: film({ exposure: 0.85 }),
  })),
  picture('cartographer-emitter.jpg', () => ({
    camera: shot([4, 18, 10], {
      turnDeg: 52,
      upDeg: 20,
      distance: 150,
      fieldDeg: 38,
      openingMm: 3,
      focus: [18, 26, 10],
    }),
    bench: woodBench({ tone: [0.22, 0.13, 0.07], seed: 32 }),
    light: lampLight(70, 1.25),
    solids: [...cartographer(frameAlong([-206, LYING, 12], [1, 0, 0.02], 20)), cloth(frameFlat([-120, 0, -80], 30))],
    film: film({ exposure: 1.15 }),
  })),
  picture(
    'cartographer-packed.jpg',
    () => {
      const hilt = frameAlong([-30, 58, 98], [0.24, 0.02, -1], 200);
      return {
        camera: shot([0, 40, 0], {
          turnDeg: -5,
          upDeg: 68,
          distance: 560,
          fieldDeg: 46,
          openingMm: 4,
          focus: [0, 70, 0],
        }),
        bench: woodBench({ tone: [0.3, 0.2, 0.12], seed: 34 }),
        light: tubeLight(60, 1.1),
        solids: [
          ...carton(frameFlat([0, 0, 0], 88), 340, 180, 90),
          packing(frameFlat([0, 4, 0], 88), 332, 172, 14, 40, 941),
          ...cartographer(hilt),
          tissue(shifted(hilt, [60, 0, 0]), 19.6, 130, 917),
        ],
        film: film({ exposure: 0.9 }),
      };
    },
    { upright: true },
  ),
];
