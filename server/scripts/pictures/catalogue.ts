import type { Picture } from './picture.ts';
import { CARTOGRAPHER_PICTURES } from './scenes/cartographer.ts';
import { HERON_PICTURES } from './scenes/heron.ts';
import { SALT_BENCH_PICTURES } from './scenes/salt-lantern-bench.ts';
import { SALT_LANTERN_PICTURES } from './scenes/salt-lantern.ts';
import { SECOND_WINTER_PICTURES } from './scenes/second-winter.ts';

/** Every demo picture that can be drawn. */
export const PICTURES: readonly Picture[] = [
  ...SALT_LANTERN_PICTURES,
  ...SALT_BENCH_PICTURES,
  ...HERON_PICTURES,
  ...SECOND_WINTER_PICTURES,
  ...CARTOGRAPHER_PICTURES,
];
