import { Mendable } from './say.mjs';

const LEAST = [20, 9];
const FIRST_NOT_TRIED = 25;

/** @param {string} version  such as 20.20.2 */
export function checkNode(version) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  const tooOld = major < LEAST[0] || (major === LEAST[0] && minor < LEAST[1]);
  if (tooOld || major >= FIRST_NOT_TRIED) {
    throw new Mendable(
      `This is Node ${version}, and Holdfast runs on Node 20 (20.9 or later) to 24.`,
      'Install Node 20, for example with your version manager, then run the same command again.',
    );
  }
}
