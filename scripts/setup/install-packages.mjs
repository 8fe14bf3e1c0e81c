import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { run } from './run.mjs';
import { Mendable, say, throwWhenDiskFull } from './say.mjs';

const MARK = 'node_modules/.holdfast-lock';

/** Installs the packages of the lock file when they are missing or the lock file has changed since. */
export async function installPackages() {
  const lock = createHash('sha256').update(readFileSync('package-lock.json')).digest('hex');
  if (existsSync(MARK) && readFileSync(MARK, 'utf8') === lock) return;
  say('Installing the packages of the lock file (about a minute) …');
  const { code, output } = await run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error']);
  if (code !== 0) {
    throwWhenDiskFull(output);
    throw new Mendable(
      'The packages could not be installed.',
      `Mend what npm says here (often there is no network), then run the same command again:\n${output.trim().split('\n').slice(-8).join('\n')}`,
    );
  }
  writeFileSync(MARK, lock);
}
