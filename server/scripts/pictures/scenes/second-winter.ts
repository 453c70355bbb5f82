import { picture, type Picture } from '../picture.ts';
import { darkRoom, tubeLight, windowLight } from '../optics/light.ts';
import { film } from '../optics/scene.ts';
import { solid } from '../optics/solid.ts';
import { turned } from '../optics/turned.ts';
import { frameAlong, frameFlat } from '../optics/vector.ts';
import { cuttingMat, felt, woodBench } from '../things/benches.ts';
import { winterDrawing } from '../things/drawn-pieces.ts';
import { boneResin } from '../things/materials.ts';
import {
  SECOND_WINTER_RADIUS_MM,
  secondWinter,
  winterBody,
  winterPommel,
  winterSwitch,
} from '../things/second-winter.ts';
import { pencil, rule } from '../things/tools.ts';
import { layDown, shot, upright } from './shot.ts';

const LYING = SECOND_WINTER_RADIUS_MM;
const resinRing = turned(
  [
    [0, 15.2],
    [0, 18.2],
    [9.6, 18.2],
    [9.6, 15.2],
  ],
  { bevelMm: 0.4 },
);

export const SECOND_WINTER_PICTURES: readonly Picture[] = [
  picture('second-winter-cover.jpg', () => ({
    camera: shot([10, 8, 0], {
      turnDeg: 8,
      upDeg: 33,
      distance: 405,
      fieldDeg: 44,
      openingMm: 3.4,
      focus: [0, 26, 18],
    }),
    bench: felt({ tone: [0.016, 0.016, 0.018] }),
    light: windowLight(-55, 1.1),
    solids: secondWinter(frameAlong([-94, LYING, 40], [1, 0, -0.36], -52)),
    film: film({ exposure: 1.25 }),
  })),
  picture('second-winter-drawing.jpg', async () => ({
    camera: shot([0, 0, 2], { turnDeg: 3, upDeg: 72, distance: 312, fieldDeg: 48, openingMm: 1.2, rollDeg: -1.5 }),
    bench: woodBench({ tone: [0.2, 0.13, 0.075], seed: 22 }),
    light: windowLight(-60),
    solids: [layDown(await winterDrawing(), [0, 0, 0], 2, 0.68), pencil(frameAlong([34, 0.6, 104], [1, 0, -0.42], 12))],
    film: film({ exposure: 0.72 }),
  })),
  picture(
    'second-winter-length.jpg',
    async () => ({
      camera: shot([-6, 0, -24], {
        turnDeg: -12,
        upDeg: 47,
        distance: 235,
        fieldDeg: 50,
        openingMm: 2.6,
        focus: [-10, 0, -38],
      }),
      bench: cuttingMat({ seed: 27 }),
      light: tubeLight(-20),
      solids: [
        layDown(await winterDrawing(), [0, 0, 0], 8, 0.68),
        pencil(frameAlong([-84, 0.6, 18], [1, 0, -0.66], 12)),
        await rule(frameFlat([14, 0.6, -18], 8)),
      ],
      film: film({ exposure: 0.72 }),
    }),
    { upright: true },
  ),
  picture('second-winter-parts.jpg', () => ({
    camera: shot([4, 6, 8], { turnDeg: -8, upDeg: 50, distance: 360, fieldDeg: 44, openingMm: 2.6, focus: [0, 16, 0] }),
    bench: cuttingMat({ seed: 28 }),
    light: tubeLight(15, 1.1),
    solids: [
      winterBody(frameAlong([-106, LYING, -36], [1, 0, -0.06], -60), 'turned'),
      ...winterSwitch(frameAlong([-106, LYING, -36], [1, 0, -0.06], -60), false),
      winterPommel(frameAlong([-96, 18.6, 52], [1, 0, 0.3], 0), 'turned'),
      solid(upright([40, 0, 50]), resinRing, boneResin(29)),
      solid(upright([86, 0, 66]), resinRing, boneResin(31)),
      solid(frameAlong([120, 6.2, 36], [0.1, 0.95, 0.3]), resinRing, boneResin(33)),
    ],
    film: film({ exposure: 0.95 }),
  })),
  picture('second-winter-switch.jpg', () => {
    const frame = frameAlong([-142, LYING, 0], [1, 0, -0.05], -48);
    return {
      camera: shot([2, 26, 8], {
        turnDeg: -24,
        upDeg: 36,
        distance: 130,
        fieldDeg: 38,
        openingMm: 2.4,
        focus: [0, 35, 14],
      }),
      bench: felt({ tone: [0.02, 0.02, 0.022], seed: 45 }),
      light: {
        ...darkRoom({ from: [-4, 42, 20], to: [4, 42, 20], light: [0.05, 0.075, 0.09] }),
        panes: windowLight(-65, 0.5).panes,
        above: [0.13, 0.14, 0.16],
        level: [0.03, 0.03, 0.035],
      },
      solids: secondWinter(frame, { lit: true }),
      film: film({ exposure: 1.5, bloom: 0.22, vignette: 0.45 }),
    };
  }),
];
