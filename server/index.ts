import { createServer } from 'node:http';
import { startProcess } from './boot.ts';
import { EnvInvalid, readEnv } from './config/env.ts';

try {
  const running = await startProcess(readEnv(process.env), createServer());
  let stopping = false;
  const stop = (signal: string): void => {
    if (stopping) return;
    stopping = true;
    running.log.info({ signal }, 'stopping');
    running.stop().then(
      () => process.exit(0),
      (error: unknown) => {
        running.log.error({ err: error }, 'did not stop cleanly');
        process.exit(1);
      },
    );
  };
  process.on('SIGTERM', () => stop('SIGTERM'));
  process.on('SIGINT', () => stop('SIGINT'));
} catch (error) {
  process.stderr.write(`${error instanceof EnvInvalid ? error.message : String((error as Error).stack ?? error)}\n`);
  process.exit(1);
}
