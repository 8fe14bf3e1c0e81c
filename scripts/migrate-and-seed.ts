import { env } from '@/lib/server/env';
import { openDatabase } from '@/lib/server/db';
import { seedDemo } from '@/lib/server/commands/seed-demo';
import { migrate } from '@/lib/server/migrate';

/** Brings the database to the present schema; with `--seed`, puts the demo in once. */
const { sequelize } = openDatabase(env().DATABASE_URL, 2);
const ran = await migrate(sequelize);
if (ran.length > 0) console.log(`Database: ${ran.length} ${ran.length === 1 ? 'migration' : 'migrations'} run.`);
await sequelize.close();
if (process.argv.includes('--seed') && (await seedDemo()))
  console.log('The demo accounts, plans and a build were put in.');
process.exit(0);
