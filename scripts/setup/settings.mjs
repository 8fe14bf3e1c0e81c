import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';

/** A secret of this installation, made once and kept readable to its owner alone. @param {string} name */
export function keptSecret(name) {
  mkdirSync('.data', { recursive: true });
  const file = `.data/${name}`;
  if (!existsSync(file)) {
    writeFileSync(file, randomBytes(32).toString('hex'));
    chmodSync(file, 0o600);
  }
  return readFileSync(file, 'utf8').trim();
}

/** How our TypeScript runs outside the web server. `react-server` makes the server-only mark pass. */
export const TSX = ['--conditions', 'react-server', '--import', 'tsx'];
