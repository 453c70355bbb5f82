import { picture, type Picture } from '../picture.ts';
import { lampLight, pane, tubeLight, windowLight, type LightRig } from '../optics/light.ts';
import { film } from '../optics/scene.ts';
import { solid, type Solid } from '../optics/solid.ts';
import { turned } from '../optics/turned.ts';
import { frameAlong, frameFlat, place, shifted, type Frame, type Vec3 } from '../optics/vector.ts';
import { cuttingMat, felt, laidOn, leather, paintedBoard, woodBench } from '../things/benches.ts';
import { cradle, joint, ledStrip, padAt, roundCell, soundBoard, speaker, WIRE, wire } from '../things/electronics.ts';
import { metal } from '../things/materials.ts';
import { SALT_LANTERN_RADIUS_MM, saltBody, saltLantern, saltPommel } from '../things/salt-lantern.ts';
import { caliper, cloth, gaugeBlock } from '../things/tools.ts';
import { shot, upright } from './shot.ts';

const LYING = SALT_LANTERN_RADIUS_MM;
const mat = laidOn(woodBench({ tone: [0.28, 0.18, 0.1], seed: 18 }), cuttingMat(), {
  x: 20,
  z: 10,
  halfX: 310,
  halfZ: 160,
  yawDeg: 6,
});

/** Light from behind the camera, to see into a bore. */
const intoTheBore: LightRig = {
  ...lampLight(150),
  panes: [
    pane({
      azimuthDeg: 166,
      heightDeg: 26,
      width: 0.3,
      height: 0.22,
      colour: [1, 0.93, 0.84],
      light: 2.4,
      shine: 9,
      crisp: 8,
    }),
    pane({
      azimuthDeg: -70,
      heightDeg: 45,
      width: 0.6,
      height: 0.4,
      colour: [0.86, 0.94, 1.06],
      light: 0.5,
      shine: 1.6,
      crisp: 4,
    }),
  ],
};

/** The cap stood on a ring, spigot up, between the jaws of a caliper that rests on blocks. */
export async function measured(
  pommel: (frame: Frame) => Solid,
  spigot: { heightMm: number; diameterMm: number; reading: string },
): Promise<Solid[]> {
  const middle: Vec3 = [0, spigot.heightMm + 8, 0];
  const gauge = frameFlat([middle[0] - spigot.diameterMm / 2, middle[1], middle[2] - 27], 0);
  const ring = turned(
    [
      [0, 13],
      [0, 21],
      [14, 21],
      [14, 14],
      [11, 13],
    ],
    { bevelMm: 0.8 },
  );
  return [
    solid(upright([0, 0, 0]), ring, metal({ tone: [0.5, 0.5, 0.51], rough: 0.24, marks: 0.8, seed: 741 })),
    pommel(upright([0, 8, 0])),
    ...(await caliper(gauge, spigot.diameterMm, spigot.reading)),
    gaugeBlock(frameFlat(place(gauge, [112, -middle[1], -14]), 4), middle[1] - 2),
  ];
}

export const SALT_BENCH_PICTURES: readonly Picture[] = [
  picture('salt-lantern-stuck.jpg', () => ({
    camera: shot([-14, 17, 6], {
      turnDeg: 24,
      upDeg: 24,
      distance: 210,
      fieldDeg: 40,
      openingMm: 1.9,
      focus: [-8, 28, 22],
    }),
    bench: cuttingMat({ seed: 23 }),
    light: tubeLight(-30, 1.15),
    solids: saltLantern(frameAlong([-6, LYING, 8], [1, 0, -0.1], 40), { gapMm: 2.4 }),
    film: film({ exposure: 1.05 }),
  })),
  picture('salt-lantern-rub.jpg', () => ({
    camera: shot([0, 21, 0], {
      turnDeg: 9,
      upDeg: 15,
      distance: 112,
      fieldDeg: 36,
      openingMm: 2.2,
      focus: [2, 22, -2],
    }),
    bench: felt({ tone: [0.035, 0.034, 0.034], seed: 43 }),
    light: intoTheBore,
    solids: [saltBody(frameAlong([0, LYING, 0], [0, 0, -1], 0), { rubbed: true })],
    film: film({ exposure: 1.35 }),
  })),
  picture('salt-lantern-spigot.jpg', async () => ({
    camera: shot([24, 42, -10], {
      turnDeg: -14,
      upDeg: 45,
      distance: 205,
      fieldDeg: 42,
      openingMm: 2,
      focus: [4, 56, 0],
    }),
    bench: leather({ seed: 33 }),
    light: windowLight(-115, 1.15),
    solids: await measured((frame) => saltPommel(frame), { heightMm: 44, diameterMm: 32.05, reading: '32.05' }),
    film: film({ exposure: 0.95 }),
  })),
  picture('salt-lantern-turned.jpg', async () => ({
    camera: shot([26, 42, -12], {
      turnDeg: 10,
      upDeg: 50,
      distance: 205,
      fieldDeg: 42,
      openingMm: 2,
      focus: [6, 56, 0],
    }),
    bench: woodBench({ tone: [0.33, 0.22, 0.13], seed: 19 }),
    light: tubeLight(20, 1.1),
    solids: [
      ...(await measured((frame) => saltPommel(frame, { turnedDown: true }), {
        heightMm: 44,
        diameterMm: 31.93,
        reading: '31.93',
      })),
      cloth(frameFlat([-96, 0, -40], 50)),
    ],
    film: film({ exposure: 0.95 }),
  })),
  picture('salt-lantern-chassis.jpg', async () => {
    const tray = frameAlong([-100, 14.2, -14], [1, 0, 0.12], 0);
    const board = shifted(tray, [104, 3.6, 0]);
    const strip = frameFlat([-72, 0, 58], -7);
    const leads = [WIRE.red, WIRE.black, WIRE.yellow].map((tone, index) =>
      wire(
        board,
        [
          padAt(6 + index * 0.6, 1),
          [padAt(6, 1)[0] + index * 3, 5, 12],
          [2 + index * 5, -12.6, 26],
          [-60 + index * 3, -17, 38 + index * 3],
          [-96, -16.6, 57 + index * 2],
        ],
        tone,
        0.7,
      ),
    );
    return {
      camera: shot([-6, 6, 8], {
        turnDeg: 12,
        upDeg: 46,
        distance: 232,
        fieldDeg: 45,
        openingMm: 2.2,
        focus: [6, 16, 0],
      }),
      bench: mat,
      light: tubeLight(10, 1.15),
      solids: [
        cradle(tray, 168, [6, 76, 82, 128, 150]),
        ...roundCell(shifted(tray, [8.4, 0.4, 0])),
        ...(await soundBoard(board)),
        ...speaker(shifted(tray, [168.2, 0, 0])),
        ...ledStrip(strip, 10, null),
        ...leads,
        wire(
          tray,
          [
            [124, 5, 6],
            [136, 9, 8],
            [150, 7, 4],
            [166, 3, 3],
          ],
          WIRE.white,
          0.7,
        ),
        wire(
          tray,
          [
            [124, 5, 3],
            [138, 8, 4],
            [152, 6, 0],
            [166, 2, -2],
          ],
          WIRE.white,
          0.7,
        ),
      ],
      film: film({ exposure: 1 }),
    };
  }),
  picture('salt-lantern-wiring.jpg', async () => {
    const board = frameFlat([0, 3.4, 0], -14);
    const tones = [WIRE.red, WIRE.black, WIRE.yellow, WIRE.blue, WIRE.green, WIRE.white];
    const near = tones.flatMap((tone, index) => {
      const [x, y, z] = padAt(index + 1, 1);
      return [
        joint(board, [x, y, z], 1.45),
        wire(
          board,
          [
            [x, y + 0.5, z],
            [x + 0.1, y + 3.6, z + 1.2],
            [x - 1 + index * 0.8, y + 4, z + 11],
            [x - 14 + index * 5, -2, z + 26],
            [x - 26 + index * 8, -2.4, z + 60],
          ],
          tone,
          0.66,
        ),
      ];
    });
    const far = [WIRE.black, WIRE.red].flatMap((tone, index) => {
      const [x, y, z] = padAt(index + 5, -1);
      return [
        joint(board, [x, y, z], 1.45),
        wire(
          board,
          [
            [x, y + 0.5, z],
            [x, y + 3.6, z - 1.4],
            [x + 6, y + 3, z - 14],
            [x + 30, -2, z - 30],
            [x + 80, -2.4, z - 40],
          ],
          tone,
          0.8,
        ),
      ];
    });
    return {
      camera: shot([0, 3, 5], {
        turnDeg: -10,
        upDeg: 40,
        distance: 84,
        fieldDeg: 40,
        openingMm: 1.7,
        focus: [0, 5, 6],
      }),
      bench: paintedBoard([0.3, 0.34, 0.35], 63),
      light: lampLight(-40, 1.1),
      solids: [
        ...(await soundBoard(board)),
        ...near,
        ...far,
        ...[-15, 15].map((x) =>
          solid(
            shifted(board, [x, -2.1, 0]),
            turnedFoot,
            metal({ tone: [0.5, 0.5, 0.5], rough: 0.3, marks: 0, seed: 743 }),
          ),
        ),
      ],
      film: film({ exposure: 0.95 }),
    };
  }),
];

const turnedFoot = {
  min: [-3, -1.4, -3] as Vec3,
  max: [3, 1.4, 3] as Vec3,
  distance: (x: number, y: number, z: number) => Math.max(Math.hypot(x, z) - 3, Math.abs(y) - 1.3),
};
