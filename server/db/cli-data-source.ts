import { DataSource } from 'typeorm';
import { dataSourceOptions } from './data-source.ts';

/** For the TypeORM command line, which wants a default export. */
export default new DataSource(dataSourceOptions(process.env['DATABASE_URL'] ?? 'postgres://127.0.0.1/ferrule', 2));
