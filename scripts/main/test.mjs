import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { spawn } from 'node:child_process';
import { buildWhenChanged } from '../setup/build.mjs';
import { ensureDatabase, startCluster } from '../setup/cluster.mjs';
import { installDebian } from '../setup/debian.mjs';
import { installPackages } from '../setup/install-packages.mjs';
import { isThere } from '../setup/run.mjs';
import { Mendable, runMain, say } from '../setup/say.mjs';

const PARTS = ['pure', 'phone', 'server', 'e2e'];
const REPORTS = 'test-results';

/**
 * npm test            every test
 * npm test -- server  one part: pure, phone, server or e2e
 */
runMain(async () => {
  const asked = process.argv.slice(2);
  const unknown = asked.find((name) => !PARTS.includes(name));
  if (unknown) throw new Mendable(`There is no part "${unknown}" of the tests.`, `Parts: ${PARTS.join(', ')}.`);
  const parts = asked.length > 0 ? asked : PARTS;
  await installPackages();
  if (!existsSync('/usr/bin/chromium')) await installDebian(['chromium'], 'The browser for the end-to-end tests');
  if (!(await isThere('units'))) await installDebian(['units'], 'GNU units, which the lengths are checked against');
  rmSync(REPORTS, { recursive: true, force: true });
  mkdirSync(REPORTS, { recursive: true });

  const cluster = await startCluster({ folder: '.data/test', forTests: true });
  try {
    await ensureDatabase(cluster, 'holdfast_tests');
    const env = {
      ...process.env,
      TEST_DATABASE_URL: cluster.url('holdfast_tests'),
      TZ: 'UTC',
      NEXT_TELEMETRY_DISABLED: '1',
    };
    const total = { passed: 0, failed: 0 };
    let broke = false;
    const vitest = parts.filter((name) => name !== 'e2e');
    if (vitest.length > 0) {
      say(`\n== ${vitest.join(', ')}\n`);
      const report = `${REPORTS}/vitest.json`;
      const projects = vitest.flatMap((name) => ['--project', name]);
      const code = await show(
        'npx',
        ['vitest', 'run', ...projects, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
        env,
      );
      broke ||= add(total, code, countVitest(report));
    }
    if (parts.includes('e2e')) {
      say('\n== end to end\n');
      await buildWhenChanged();
      const report = `${REPORTS}/e2e.json`;
      const code = await show('npx', ['playwright', 'test'], { ...env, E2E_REPORT: report });
      broke ||= add(total, code, countPlaywright(report));
    }
    say(`\n${total.passed} passed, ${total.failed} failed`);
    return total.failed > 0 || total.passed === 0 || broke ? 1 : 0;
  } finally {
    await cluster.stop();
  }
});

/** @param {string} command @param {string[]} args @param {NodeJS.ProcessEnv} env @returns {Promise<number>} */
function show(command, args, env) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { env, stdio: ['ignore', 'inherit', 'inherit'] });
    child.on('error', reject);
    child.on('exit', (code) => resolve(code ?? 1));
  });
}

/**
 * Adds a runner's count; a runner that failed without a failed test (a file that does not load) counts as one failure.
 *
 * @param {{ passed: number, failed: number }} total @param {number} code @param {{ passed: number, failed: number }} count
 */
function add(total, code, count) {
  total.passed += count.passed;
  total.failed += code !== 0 && count.failed === 0 ? 1 : count.failed;
  return code !== 0;
}

/** @param {string} file */
function countVitest(file) {
  if (!existsSync(file)) return { passed: 0, failed: 0 };
  const { numPassedTests, numFailedTests } = JSON.parse(readFileSync(file, 'utf8'));
  return { passed: numPassedTests, failed: numFailedTests };
}

/** @param {string} file */
function countPlaywright(file) {
  if (!existsSync(file)) return { passed: 0, failed: 0 };
  const { stats } = JSON.parse(readFileSync(file, 'utf8'));
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky };
}
