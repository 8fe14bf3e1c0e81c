import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { run } from './run.mjs';
import { Mendable, say, throwWhenDiskFull } from './say.mjs';

const SOURCES = [
  'app',
  'components',
  'lib',
  'models',
  'worker',
  'public',
  'package-lock.json',
  'next.config.ts',
  'serwist.config.mjs',
  'tailwind.config.ts',
  'postcss.config.mjs',
  'tsconfig.json',
  'instrumentation.ts',
];
const MADE = new Set(['public/sw.js', 'public/sw.js.map']);
const MARK = '.next/holdfast-sources';

/** Builds when the sources changed since the last build. @returns {Promise<boolean>} whether it built */
export async function buildWhenChanged() {
  const now = hashOf(SOURCES);
  if (existsSync(MARK) && existsSync('public/sw.js') && readFileSync(MARK, 'utf8') === now) return false;
  say('Building (about a minute) …');
  const { code, output } = await run('npm', ['run', '--silent', 'build'], {
    env: { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' },
  });
  if (code !== 0) {
    throwWhenDiskFull(output);
    throw new Mendable('The build failed.', `Its last lines:\n${output.trim().split('\n').slice(-25).join('\n')}`);
  }
  writeFileSync(MARK, now);
  return true;
}

/** @param {string[]} roots */
function hashOf(roots) {
  const hash = createHash('sha256');
  /** @param {string} file */
  const add = (file) => {
    if (!existsSync(file) || MADE.has(file)) return;
    if (statSync(file).isDirectory()) {
      for (const name of readdirSync(file).sort()) add(path.join(file, name));
    } else hash.update(file).update('\0').update(readFileSync(file));
  };
  roots.forEach(add);
  return hash.digest('hex');
}
