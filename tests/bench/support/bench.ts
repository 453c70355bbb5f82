import type pg from 'pg';
import type { DataSource } from 'typeorm';
import type { Data } from './data.ts';
import type { Line } from './report.ts';

/** What every measurement is given. */
export interface Bench {
  readonly databaseUrl: string;
  /** For statements of the measurement itself. */
  readonly client: pg.Client;
  readonly db: DataSource;
  /** Fills the database at the first call and gives the same rows at the next ones. */
  data(): Promise<Data>;
  /** Pairs of slices. */
  readonly rounds: number;
  /** Length of one slice. */
  readonly sliceSeconds: number;
}

export interface Measurement {
  readonly title: string;
  run(bench: Bench): Promise<Line[]>;
}
