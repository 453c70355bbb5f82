import { picture, type Picture } from '../picture.ts';
import { darkRoom, lampLight, tubeLight, windowLight, type Rod } from '../optics/light.ts';
import { film } from '../optics/scene.ts';
import { bar, solid } from '../optics/solid.ts';
import { frameAlong, frameFlat, place, shifted } from '../optics/vector.ts';
import { cuttingMat, laidOn, leather, linen, paintedBoard, woodBench } from '../things/benches.ts';
import { heronDrawing } from '../things/drawn-pieces.ts';
import { HERON_RADIUS_MM, heron } from '../things/heron.ts';
import { glowing } from '../things/materials.ts';
import { cloth, pencil, rule } from '../things/tools.ts';
import { layDown, shot } from './shot.ts';

const LYING = HERON_RADIUS_MM;
const mat = laidOn(woodBench({ tone: [0.28, 0.18, 0.1], seed: 18 }), cuttingMat({ seed: 25 }), {
  x: -20,
  z: 20,
  halfX: 330,
  halfZ: 150,
  yawDeg: -7,
});

export const HERON_PICTURES: readonly Picture[] = [
  picture('heron-cover.jpg', () => ({
    camera: shot([8, 8, 0], { turnDeg: 10, upDeg: 32, distance: 430, fieldDeg: 44, openingMm: 4, focus: [0, 26, 18] }),
    bench: leather({ tone: [0.13, 0.132, 0.136] }),
    light: windowLight(-48, 1.2),
    solids: heron(frameAlong([-142, LYING, -34], [1, 0, 0.3], 150)),
    film: film({ exposure: 1.15 }),
  })),
  picture('heron-drawing.jpg', async () => ({
    camera: shot([2, 0, 2], { turnDeg: -5, upDeg: 69, distance: 312, fieldDeg: 48, openingMm: 1.2, rollDeg: 2 }),
    bench: paintedBoard([0.22, 0.27, 0.27], 65),
    light: windowLight(55),
    solids: [layDown(await heronDrawing(), [0, 0, 0], -2, 0.68), pencil(frameAlong([-118, 0.6, 84], [1, 0, 0.24], 12))],
    film: film({ exposure: 0.72 }),
  })),
  picture('heron-bright.jpg', () => ({
    camera: shot([0, 6, 4], {
      turnDeg: -20,
      upDeg: 40,
      distance: 430,
      fieldDeg: 44,
      openingMm: 3.4,
      focus: [-6, 24, 10],
    }),
    bench: mat,
    light: tubeLight(25, 1.1),
    solids: [
      ...heron(frameAlong([-134, LYING, 40], [1, 0, -0.24], 30), { stage: 'bright' }),
      cloth(frameFlat([150, 0, -70], -20)),
    ],
    film: film({ exposure: 1 }),
  })),
  picture('heron-tight.jpg', () => ({
    camera: shot([6, 17, 4], {
      turnDeg: -22,
      upDeg: 27,
      distance: 200,
      fieldDeg: 40,
      openingMm: 3,
      focus: [4, 24, 18],
    }),
    bench: woodBench({ tone: [0.2, 0.12, 0.065], seed: 20 }),
    light: lampLight(-30, 1.25),
    solids: heron(frameAlong([-232, LYING, 22], [1, 0, -0.06], 60), { gapMm: 9 }),
    film: film({ exposure: 1.15 }),
  })),
  picture(
    'heron-waxed.jpg',
    async () => ({
      camera: shot([0, 4, -4], { turnDeg: -6, upDeg: 62, distance: 420, fieldDeg: 44, openingMm: 3 }),
      bench: linen({ tone: [0.42, 0.42, 0.41], seed: 53 }),
      light: windowLight(-70, 1.2),
      solids: [...heron(frameAlong([-52, LYING, 126], [0.36, 0, -1], 200)), await rule(frameFlat([66, 0, 34], 72))],
      film: film({ exposure: 0.85 }),
    }),
    { upright: true },
  ),
  picture(
    'heron-lit.jpg',
    () => {
      const frame = frameAlong([-200, LYING, 84], [1, 0, -0.42], 120);
      const rod: Rod = { from: place(frame, [300, 0, 0]), to: place(frame, [700, 0, 0]), light: [0.3, 0.62, 1.25] };
      return {
        camera: shot([60, 8, -26], {
          turnDeg: -4,
          upDeg: 36,
          distance: 640,
          fieldDeg: 46,
          openingMm: 4,
          focus: [-40, 20, 20],
        }),
        bench: leather({ tone: [0.12, 0.12, 0.125], seed: 37 }),
        light: darkRoom(rod),
        solids: [
          ...heron(frame),
          solid(shifted(frame, [240, 0, 0]), bar(11.1, 520, 11), glowing([0.3, 0.62, 1], 2.5), false),
        ],
        film: film({ exposure: 1.6, bloom: 0.9, vignette: 0.5 }),
      };
    },
    { rays: 8 },
  ),
];
