import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** Lines of the lock that a running server keeps in its cluster; none without one. @param {string} data */
function lockLines(data) {
  const lock = lockFile(data);
  return existsSync(lock) ? readFileSync(lock, 'utf8').split('\n') : [];
}

/** @param {string} data */
export const lockFile = (data) => path.join(data, 'postmaster.pid');

/**
 * Port of the server that runs this very cluster, or null. A lock alone tells nothing: after a crash its number may have
 * gone to any other process, even to a database of somebody else's.
 *
 * @param {string} data @returns {number | null}
 */
export function runningPort(data) {
  const [pid, , , port] = lockLines(data);
  if (!pid || !commandOf(pid).includes(data)) return null;
  return Number(port) > 0 ? Number(port) : null;
}

/** Arguments a process was started with; none when it is gone. @param {string} pid @returns {string[]} */
function commandOf(pid) {
  return (readProc(pid, 'cmdline') ?? '').split('\0');
}

/** @param {string | number} pid @param {string} name @returns {string | null} */
function readProc(pid, name) {
  try {
    return readFileSync(`/proc/${Number(pid)}/${name}`, 'utf8');
  } catch {
    // The process is gone.
    return null;
  }
}

/** Process and the moment it began: a number alone may be given anew. @param {string | number} pid */
function markOf(pid) {
  const stat = readProc(pid, 'stat');
  if (stat === null) return null;
  const [state, ...fields] = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  return state === 'Z' ? null : `${pid} ${fields[18]}`;
}

/** Whether a start that is still running, this process among them, will end the cluster. @param {string} home */
export function hasOwner(home) {
  const file = path.join(home, 'started-by');
  if (!existsSync(file)) return false;
  const mark = readFileSync(file, 'utf8');
  return markOf(mark.split(' ')[0] ?? '') === mark;
}

/** From now on this process ends the cluster. @param {string} home */
export function own(home) {
  writeFileSync(path.join(home, 'started-by'), markOf(process.pid) ?? '');
}
