import type { Measurement } from '../support/bench.ts';
import { median } from '../support/paired.ts';
import { residentBytes, startApplication } from '../support/processes.ts';

const RUNS = 7;

/** From spawning Node on a migrated database to the first 200 of `/readyz`. */
export const coldStart: Measurement = {
  title: 'Start to ready',
  async run({ databaseUrl }) {
    const seconds: number[] = [];
    const megabytes: number[] = [];
    for (let run = 0; run < RUNS; run += 1) {
      const from = performance.now();
      const application = await startApplication(databaseUrl);
      seconds.push((performance.now() - from) / 1000);
      megabytes.push(residentBytes(application.child) / 1e6);
      await application.stop();
    }
    const of = (values: number[], digits: number): string =>
      `${median(values).toFixed(digits)} [${Math.min(...values).toFixed(digits)}-${Math.max(...values).toFixed(digits)}]`;
    return [
      { what: 'spawn to ready, seconds', figure: of(seconds, 2), detail: `${RUNS} runs` },
      { what: 'resident memory when ready, MB', figure: of(megabytes, 0) },
    ];
  },
};
