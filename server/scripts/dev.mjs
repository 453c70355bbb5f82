// npm run dev: database, server and pages for development, each reloading when its sources change.
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { seedDemo } from './demo.mjs';
import { CHECKOUT } from './folders.mjs';
import { appEnvironment, localOrigin } from './given-environment.mjs';
import { Halt, say } from './halt.mjs';
import { choosePort, isFree } from './ports.mjs';
import { prepareRun } from './prepared-run.mjs';
import { endChild, runCommand } from './scope.mjs';
import { startServer, waitForAnswer, waitHealthy } from './server-process.mjs';

const FIRST_WEB_PORT = 5173;
/** The first start compiles everything. */
const FIRST_START_MS = 90_000;

await runCommand(async (scope) => {
  const { folder, secrets, lock, database } = await prepareRun(scope, { flavour: 'dev' });
  const port = await choosePort(process.env['PORT'], isFree);
  const webPort = await choosePort(process.env['FERRULE_WEB_PORT'], isFree, FIRST_WEB_PORT);
  const apiOrigin = localOrigin(undefined, port);
  const origin = localOrigin(undefined, webPort);
  const env = {
    NODE_ENV: 'development',
    ...appEnvironment({ env: process.env, folder, secrets, databaseUrl: database.url, port, origin }),
  };
  const signIns = await seedDemo(scope, { folder, own: database.own, env });
  const server = startServer(scope, { checkout: CHECKOUT, folder, env, watch: true });
  await waitHealthy(server, apiOrigin, FIRST_START_MS);
  const pages = spawn(
    process.execPath,
    ['node_modules/vite/bin/vite.js', '--clearScreen', 'false', '--logLevel', 'warn'],
    {
      cwd: CHECKOUT,
      env: { ...process.env, FERRULE_API_ORIGIN: apiOrigin, FERRULE_WEB_PORT: String(webPort) },
      stdio: ['ignore', 'inherit', 'inherit'],
      detached: true,
    },
  );
  scope.add(() => endChild(pages, { graceMs: 5000 }));
  await waitForAnswer(pages, `${origin}/`);
  lock.setNote(`for development at ${origin}, process ${process.pid}`);
  say(`\nFerrule for development: ${origin} (API at ${apiOrigin})\n`);
  if (signIns) say(`Demo sign-ins:\n${signIns}\n`);
  say(`Data and mails: ${folder}\nCtrl-C stops it.`);
  const what = await Promise.race([
    once(server, 'exit').then(() => 'The watcher of the server'),
    once(pages, 'exit').then(() => 'The server of the pages'),
    database.ended.then(() => 'PostgreSQL'),
  ]);
  throw new Halt(`${what} ended unexpectedly, so all of it stops.`);
});
