import { db } from '@/lib/server/db';
import { migrate } from '@/lib/server/migrate';
import { seedDemo } from './seed-demo';

/** Brings the database to the present schema; with `--seed`, puts the demo in once. */
const ran = await migrate(db().sequelize);
if (ran.length > 0) console.log(`Database: ${ran.length} ${ran.length === 1 ? 'migration' : 'migrations'} run.`);
if (process.argv.includes('--seed') && (await seedDemo()))
  console.log('The demo accounts, plans and a build were put in.');
await db().sequelize.close();
