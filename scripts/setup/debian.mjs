import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { isThere, run } from './run.mjs';
import { Mendable, say, throwWhenDiskFull } from './say.mjs';

/**
 * Installs Debian packages, saying so; where there is no right to, prints the one command to run.
 *
 * @param {string[]} packages
 * @param {string} why  what they are for
 */
export async function installDebian(packages, why) {
  const command = `apt-get update && apt-get install -y ${packages.join(' ')}`;
  if (!(await isThere('apt-get'))) {
    throw new Mendable(
      `${why} is missing, and this is not Debian.`,
      `Install ${packages.join(', ')} the way your system does.`,
    );
  }
  const isRoot = process.getuid?.() === 0;
  const sudo = !isRoot && (await run('sudo', ['-n', 'true']).catch(() => ({ code: 1 }))).code === 0;
  if (!isRoot && !sudo)
    throw new Mendable(`${why} is missing, and this account may not install it.`, `Run once: sudo sh -c "${command}"`);
  say(`Installing Debian's ${packages.join(', ')}: ${why} is missing …`);
  if (packages.includes('postgresql') && isRoot && !existsSync('/etc/postgresql-common/createcluster.conf')) {
    // Only the program is wanted, not a server of the system's own.
    mkdirSync('/etc/postgresql-common', { recursive: true });
    writeFileSync('/etc/postgresql-common/createcluster.conf', 'create_main_cluster = false\n');
  }
  const shell = `export DEBIAN_FRONTEND=noninteractive; apt-get update -qq && apt-get install -y -qq -o Dpkg::Options::=--force-confold ${packages.join(' ')}`;
  const { code, output } = await run(isRoot ? 'sh' : 'sudo', isRoot ? ['-c', shell] : ['-n', 'sh', '-c', shell]);
  if (code !== 0) {
    throwWhenDiskFull(output);
    throw new Mendable(
      `${packages.join(', ')} could not be installed.`,
      `Run "${command}" by hand and read what it says:\n${output.trim().split('\n').slice(-5).join('\n')}`,
    );
  }
}

/** Where Debian keeps the programs of each version of PostgreSQL. */
const POSTGRES = '/usr/lib/postgresql';

/** Folder of the newest PostgreSQL's programs, or null. @param {string} root @returns {string | null} */
function findPostgres(root) {
  if (!existsSync(root)) return null;
  const versions = readdirSync(root)
    .filter((name) => existsSync(`${root}/${name}/bin/initdb`))
    .sort((a, b) => Number(b) - Number(a));
  return versions[0] ? `${root}/${versions[0]}/bin` : null;
}

/**
 * @param {{ root?: string }} [options]  `root`: where its versions are
 * @returns {Promise<string>} folder of PostgreSQL's programs, installed when missing
 */
export async function needPostgres({ root = POSTGRES } = {}) {
  if (!findPostgres(root)) await installDebian(['postgresql'], 'PostgreSQL');
  const found = findPostgres(root);
  if (!found)
    throw new Mendable(
      `PostgreSQL was installed, and its programs are not in ${root}.`,
      'Install the Debian package "postgresql" by hand.',
    );
  return found;
}
