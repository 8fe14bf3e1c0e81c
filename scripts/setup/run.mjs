import { spawn } from 'node:child_process';

/**
 * @typedef {object} Ran
 * @property {number} code
 * @property {string} output  both streams, in order of arrival
 */

/**
 * Runs a program to its end.
 *
 * @param {string} command
 * @param {readonly string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, show?: boolean }} [options]  `show`: pass its output through
 * @returns {Promise<Ran>}
 */
export function run(command, args, { cwd, env, show = false } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd, env: env ?? process.env, stdio: ['ignore', 'pipe', 'pipe'] });
    let output = '';
    for (const stream of [child.stdout, child.stderr]) {
      stream.on('data', (chunk) => {
        output += chunk;
        if (show) process.stdout.write(chunk);
      });
    }
    child.on('error', reject);
    child.on('close', (code) => resolve({ code: code ?? 1, output }));
  });
}

/** @param {string} command @returns {Promise<boolean>} */
export async function isThere(command) {
  return (await run('sh', ['-c', `command -v ${command}`])).code === 0;
}
