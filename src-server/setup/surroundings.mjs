// What the set-up scripts share: places, plain messages, running other programs. Node.js only, so
// that they run before anything is installed.
import { spawnSync } from 'node:child_process';
import { createHash, randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, statSync, statfsSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
export const isRoot = process.getuid?.() === 0;

/**
 * The product's own data directory. Under root it must not lie below a home directory, since
 * PostgreSQL runs as another user and has to walk there.
 */
export function dataDirectory() {
  const key = createHash('sha256').update(root).digest('hex').slice(0, 8);
  const place = process.env.WALLFLUX_DATA ?? (isRoot ? `/var/lib/wallflux-${key}` : join(root, '.wallflux'));
  mkdirSync(place, { recursive: true, mode: 0o755 });
  return place;
}

/** Says what is being done; beside the output of the programs themselves. */
export function say(text) {
  console.error(`wallflux: ${text}`);
}

/** Ends the script with one sentence that says what is missing and what to do. */
export function giveUp(text) {
  console.error(`wallflux: ${text}`);
  process.exit(1);
}

/** Runs a program to its end with its output shown; answers whether it succeeded. */
export function run(program, parameters, options = {}) {
  return spawnSync(program, parameters, { cwd: root, stdio: 'inherit', ...options }).status === 0;
}

export function found(program) {
  return spawnSync('which', [program], { stdio: 'ignore' }).status === 0;
}

/** Installs Debian packages, or says who has to. */
export function installDebianPackages(packages, purpose) {
  const command = `apt-get install -y ${packages.join(' ')}`;
  if (!found('apt-get'))
    giveUp(`${purpose} is not installed and there is no apt-get here. Install ${packages.join(', ')} and start again.`);
  if (!isRoot) giveUp(`${purpose} is not installed. Ask an administrator to run "${command}", then start again.`);
  say(`installing ${purpose} from Debian's packages (${packages.join(', ')})`);
  const quiet = { stdio: ['ignore', 'ignore', 'inherit'], env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } };
  run('apt-get', ['update'], quiet);
  if (!run('apt-get', ['install', '-y', '--no-install-recommends', ...packages], quiet)) {
    giveUp(`${purpose} could not be installed. Run "${command}" by hand to see why, then start again.`);
  }
}

/** Refuses to begin work that would end half way on a full disk. */
export function needDiskSpace(place, megabytes) {
  const { bavail, bsize } = statfsSync(place);
  const free = Math.floor((Number(bavail) * Number(bsize)) / 1e6);
  if (free < megabytes)
    giveUp(`only ${free} MB are free at ${place}; at least ${megabytes} MB are needed. Make room, then start again.`);
}

export function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19))
    giveUp(`Node.js 20.19 or later is needed; this is ${process.versions.node}.`);
}

/** Installs the packages of the lock file when they are not there or another lock file is. */
export function ensurePackages() {
  const lock = createHash('sha256')
    .update(readFileSync(join(root, 'package-lock.json')))
    .digest('hex');
  const mark = join(root, 'node_modules', '.wallflux-lock');
  if (existsSync(mark) && readFileSync(mark, 'utf8') === lock && existsSync(join(root, '.quasar', 'tsconfig.json')))
    return;
  needDiskSpace(root, 1500);
  say('installing packages (npm ci, about a minute)');
  if (!run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error'])) {
    giveUp('the packages could not be installed; npm says why above. Mend that, then start again.');
  }
  // Writes .quasar/tsconfig.json, which every TypeScript tool here reads.
  if (!run(join(root, 'node_modules', '.bin', 'quasar'), ['prepare'], { stdio: 'ignore' }))
    giveUp('quasar prepare failed; run it by hand to see why.');
  writeFileSync(mark, lock);
}

/** Hash over names, sizes and times of all files in the given places. */
function stamp(places) {
  const hash = createHash('sha256');
  const visit = (path) => {
    const stat = statSync(path);
    if (stat.isDirectory()) for (const name of readdirSync(path).sort()) visit(join(path, name));
    else hash.update(`${path}:${stat.size}:${stat.mtimeMs};`);
  };
  for (const place of places) if (existsSync(join(root, place))) visit(join(root, place));
  return hash.digest('hex');
}

/** Builds the browser application when its sources are newer than the last build. */
export function ensureBuild() {
  const now = stamp(['src', 'public', 'index.html', 'quasar.config.ts', 'package-lock.json']);
  const mark = join(root, 'dist', '.wallflux-build');
  if (existsSync(mark) && readFileSync(mark, 'utf8') === now) return;
  say('building the browser application (about half a minute)');
  if (!run(join(root, 'node_modules', '.bin', 'quasar'), ['build'], { stdio: ['ignore', 'inherit', 'inherit'] })) {
    giveUp('the browser application could not be built; the reason is above.');
  }
  writeFileSync(mark, now);
}

/** A secret that is made once and kept in the data directory. */
export function keptSecret(name) {
  const file = join(dataDirectory(), name);
  if (!existsSync(file)) writeFileSync(file, randomBytes(24).toString('hex'), { mode: 0o600 });
  return readFileSync(file, 'utf8').trim();
}

/** Whether a TCP port on loopback can be listened on. */
export function portIsFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen(port, '127.0.0.1', () => probe.close(() => resolve(true)));
  });
}
