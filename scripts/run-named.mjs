import { existsSync, readdirSync } from 'node:fs';
import { spawn } from 'node:child_process';
import { TSX } from './setup/settings.mjs';
import { Mendable } from './setup/say.mjs';

/**
 * Runs scripts/<folder>/<name>.ts with the rest of the arguments; says which there are when the name is not one.
 *
 * @param {string} folder @param {string[]} args @param {NodeJS.ProcessEnv} env @returns {Promise<number>} exit code
 */
export function runNamed(folder, [name, ...rest], env) {
  const names = readdirSync(`scripts/${folder}`)
    .filter((file) => file.endsWith('.ts'))
    .map((file) => file.replace('.ts', ''));
  const file = `scripts/${folder}/${name}.ts`;
  if (!name || !existsSync(file)) throw new Mendable('Say which one to run.', `There are: ${names.join(', ')}.`);
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, [...TSX, file, ...rest], { env, stdio: 'inherit' });
    child.on('error', reject);
    child.on('exit', (code) => resolve(code ?? 1));
  });
}
