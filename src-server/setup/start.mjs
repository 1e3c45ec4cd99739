// `npm start`: everything from a fresh machine to a running product.
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { ensurePostgres } from './postgres.mjs';
import {
  checkNode,
  ensureBuild,
  ensurePackages,
  giveUp,
  keptSecret,
  needDiskSpace,
  portIsFree,
  root,
  say,
} from './surroundings.mjs';

const database = 'wallflux';
const demoAccounts = [
  ['odile.varga', 'engineer'],
  ['timo.reinholt', 'engineer'],
  ['hanna.quaye', 'checker'],
  ['alasdair.brodie', 'lead'],
  ['priya.lindqvarn', 'reader'],
  ['admin', 'administrator'],
];

async function ensureDatabase(server) {
  const { default: pg } = await import('pg');
  const client = new pg.Client({ connectionString: `${server}/postgres` });
  await client.connect();
  const { rowCount } = await client.query('SELECT 1 FROM pg_database WHERE datname = $1', [database]);
  if (rowCount === 0) await client.query(`CREATE DATABASE ${database}`);
  await client.end();
}

async function untilReady(address, server) {
  for (let tries = 0; tries < 240; tries += 1) {
    if (server.exitCode !== null) return false;
    try {
      if ((await fetch(`${address}/healthz`)).ok) return true;
    } catch {
      // Not listening yet.
    }
    await wait(250);
  }
  return false;
}

checkNode();
const port = Number(process.env.PORT ?? 8417);
if (!Number.isInteger(port) || port < 1 || port > 65535)
  giveUp(`PORT must be a number from 1 to 65535, not "${process.env.PORT}".`);
if (!(await portIsFree(port)))
  giveUp(`port ${port} is taken by another program. Stop it, or choose another: PORT=8418 npm start`);
needDiskSpace(root, 300);
ensurePackages();
const databaseServer = process.env.DATABASE_URL === undefined ? await ensurePostgres('main') : undefined;
if (databaseServer !== undefined) await ensureDatabase(databaseServer);
ensureBuild();

say('starting the server (migrations, and the demo on first run)');
const server = spawn(process.execPath, ['--import', 'tsx', join('src-server', 'server.ts')], {
  cwd: root,
  stdio: 'inherit',
  env: {
    NODE_ENV: 'production',
    WALLFLUX_SEED: 'demo',
    ...process.env,
    PORT: String(port),
    DATABASE_URL: process.env.DATABASE_URL ?? `${databaseServer}/${database}`,
    SESSION_SECRET: process.env.SESSION_SECRET ?? keptSecret('session-secret'),
  },
});
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));
server.on('exit', (code) => process.exit(code ?? 0));

const address = `http://localhost:${port}`;
if (await untilReady(`http://127.0.0.1:${port}`, server)) {
  say(`ready at ${address}`);
  console.log(`\n  Demo accounts, all with the passphrase velvet-heron-42:`);
  for (const [name, part] of demoAccounts) console.log(`    ${name.padEnd(16)} ${part}`);
  console.log(`\n  Mails of the demo can be read at ${address}/dev/mails. Stop with Ctrl+C; data is kept.\n`);
} else if (server.exitCode === null) {
  say('the server does not answer after a minute; its messages above say why.');
}
