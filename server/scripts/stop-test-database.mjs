// npm run test:db:stop: ends and removes the cluster that test runners started by hand share.
import { say } from './halt.mjs';
import { runCommand } from './scope.mjs';
import { removeSharedTestCluster } from './throw-away-cluster.mjs';

await runCommand(async () => {
  await removeSharedTestCluster();
  say('The shared test cluster of this checkout is stopped and removed.');
  return 0;
});
