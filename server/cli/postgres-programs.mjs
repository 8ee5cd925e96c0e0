import fs from 'node:fs';
import path from 'node:path';
import { installDebianPackages, isRoot } from './debian-packages.mjs';
import { runProgram } from './run-program.mjs';

const DEBIAN_HOME = '/usr/lib/postgresql';

// Debian would otherwise create and start a cluster of its own on the standard port.
const KEEP_DEBIAN_FROM_STARTING_ONE = [
  'mkdir -p /etc/postgresql-common',
  'conf=/etc/postgresql-common/createcluster.conf',
  '[ -e "$conf" ] || echo "create_main_cluster = false" > "$conf"',
].join('\n');

/**
 * The folder with PostgreSQL's programs: of the given major version, or the newest there is.
 *
 * @param {string} [version]
 */
function findProgramsFolder(version) {
  const versions = fs.existsSync(DEBIAN_HOME) ? fs.readdirSync(DEBIAN_HOME) : [];
  versions.sort((a, b) => Number(b) - Number(a));
  const debian = versions.filter((v) => version === undefined || v === version);
  const folders = [
    ...debian.map((v) => path.join(DEBIAN_HOME, v, 'bin')),
    ...(process.env.PATH ?? '').split(':').filter(Boolean),
  ];
  return folders.find((folder) =>
    ['initdb', 'pg_ctl'].every((name) => fs.existsSync(path.join(folder, name))),
  );
}

/** @param {string} [version] the major version that existing data needs */
export async function ensurePostgresPrograms(version) {
  const present = findProgramsFolder(version);
  if (present !== undefined) return present;
  const name = version === undefined ? 'postgresql' : `postgresql-${version}`;
  await installDebianPackages([name], { prepare: KEEP_DEBIAN_FROM_STARTING_ONE });
  const installed = findProgramsFolder(version);
  if (installed === undefined)
    throw new Error(`${name} is installed, but its programs are not in ${DEBIAN_HOME}`);
  return installed;
}

/**
 * PostgreSQL refuses to run as root. Node becomes the `postgres` user through its own uid and gid options, so that
 * neither runuser nor setpriv is needed.
 *
 * @returns {{ uid?: number, gid?: number }}
 */
export function postgresAccount() {
  if (!isRoot) return {};
  const entry = fs.readFileSync('/etc/passwd', 'utf8').match(/^postgres:[^:]*:(\d+):(\d+):/m);
  if (entry === null) throw new Error('PostgreSQL is there, but the system user "postgres" is not');
  return { uid: Number(entry[1]), gid: Number(entry[2]) };
}

/**
 * Gives a file or folder to the account that PostgreSQL runs under.
 *
 * @param {string} file
 */
export function giveToPostgres(file) {
  const { uid, gid } = postgresAccount();
  if (uid !== undefined && gid !== undefined) fs.chownSync(file, uid, gid);
}

/**
 * @param {string} program full path
 * @param {string[]} args
 * @param {{ stdio?: 'ignore', env?: Record<string, string> }} [options]
 */
export function runPostgresProgram(program, args, { stdio, env = {} } = {}) {
  return runProgram(program, args, {
    isQuiet: true,
    ...(stdio === undefined ? {} : { stdio }),
    cwd: '/',
    env: { PATH: process.env.PATH, LC_ALL: 'C.UTF-8', TZ: 'UTC', ...env },
    ...postgresAccount(),
  });
}
