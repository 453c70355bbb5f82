// npm start: everything from a fresh clone to a running Ferrule.
import { once } from 'node:events';
import { ensureClientBuild } from './client-build.mjs';
import { seedDemo } from './demo.mjs';
import { CHECKOUT } from './folders.mjs';
import { appEnvironment, localOrigin } from './given-environment.mjs';
import { Halt, say } from './halt.mjs';
import { choosePort, isFree } from './ports.mjs';
import { prepareRun } from './prepared-run.mjs';
import { runCommand } from './scope.mjs';
import { startServer, waitHealthy } from './server-process.mjs';

await runCommand(async (scope) => {
  const host = process.env['HOST'];
  const free = (/** @type {number} */ port) => isFree(port, host);
  // A port that was asked for and is taken is said before anything is installed or built.
  const askedPort = process.env['PORT'] ? await choosePort(process.env['PORT'], free) : null;
  const { folder, secrets, lock, database } = await prepareRun(scope);
  const webDir = await ensureClientBuild(scope, CHECKOUT);
  const port = askedPort ?? (await choosePort(undefined, free));
  const origin = localOrigin(host, port);
  const env = {
    NODE_ENV: 'production',
    WEB_DIR: webDir,
    ...appEnvironment({ env: process.env, folder, secrets, databaseUrl: database.url, port, origin }),
  };
  const signIns = await seedDemo(scope, { folder, own: database.own, env });
  const server = startServer(scope, { checkout: CHECKOUT, folder, env });
  await waitHealthy(server, origin);
  const address = process.env['PUBLIC_ORIGIN'] || origin;
  lock.setNote(`at ${address}, process ${process.pid}`);
  say(`\nFerrule is ready at ${address}\n`);
  if (signIns) say(`Demo sign-ins:\n${signIns}\n`);
  say(`Data: ${folder}\nLetters that would be sent: ${folder}/mail\nCtrl-C stops it.`);
  const what = await Promise.race([
    once(server, 'exit').then(() => 'The application'),
    database.ended.then(() => 'PostgreSQL'),
  ]);
  throw new Halt(
    `${what} ended unexpectedly, so Ferrule stops. Nothing that was saved is lost. Start it again with npm start.`,
  );
});
