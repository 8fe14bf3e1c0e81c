import { renewEpoch } from '@/lib/server/commands/renew-epoch';
import { db } from '@/lib/server/db';
import { migrate } from '@/lib/server/migrate';
import { seedDemo } from './seed-demo';

/**
 * Brings the database to the present schema. With `--seed` puts the demo in once. With `--restored`, for the first start
 * after a backup was played back, lets every phone send again what the backup did not hold.
 */
const ran = await migrate(db().sequelize);
if (ran.length > 0) console.log(`Database: ${ran.length} ${ran.length === 1 ? 'migration' : 'migrations'} run.`);
if (process.argv.includes('--seed') && (await seedDemo()))
  console.log('The demo accounts, plans and a build were put in.');
if (process.argv.includes('--restored')) {
  await renewEpoch();
  console.log('Every phone will send again what the backup did not hold, the next time it has a signal.');
}
await db().sequelize.close();
