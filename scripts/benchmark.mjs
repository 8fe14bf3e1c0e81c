import { buildWhenChanged } from './setup/build.mjs';
import { ensureDatabase, startCluster } from './setup/cluster.mjs';
import { installPackages } from './setup/install-packages.mjs';
import { runMain } from './setup/say.mjs';
import { runNamed } from './run-named.mjs';

/** npm run benchmark -- bench  prints measured figures; none of them fails anything. */
runMain(async () => {
  await installPackages();
  await buildWhenChanged();
  const cluster = await startCluster({ folder: '.data/test', forTests: true });
  try {
    await ensureDatabase(cluster, 'holdfast_tests');
    return await runNamed('benchmarks', process.argv.slice(2), {
      ...process.env,
      TEST_DATABASE_URL: cluster.url('holdfast_tests'),
    });
  } finally {
    await cluster.stop();
  }
});
