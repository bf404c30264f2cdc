import { spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { buildIfStale, serveCommand } from './lib/build.mjs';
import { checkNode } from './lib/check-node.mjs';
import { startCluster } from './lib/cluster.mjs';
import { ensureDatabase, migrate, seedIfEmpty } from './lib/database.mjs';
import { ensureNpmPackages } from './lib/npm-packages.mjs';
import { DATA, ROOT } from './lib/places.mjs';
import { portTaken } from './lib/ports.mjs';
import { ensurePostgres } from './lib/postgres.mjs';
import { runMain, say, Stop } from './lib/say.mjs';

const RUNNING = `${DATA}running.json`;

await runMain(async () => {
  checkNode();
  const development = process.argv.includes('--dev');
  const port = webPort();
  mkdirSync(DATA, { recursive: true });
  await refuseSecondStart(port);
  const url = await database();
  const environment = {
    DATABASE_URL: url,
    SESSION_SECRET: process.env.SESSION_SECRET ?? sessionSecret(),
    EVENRUN_DATA_DIR: process.env.EVENRUN_DATA_DIR ?? `${DATA}files`,
    NEXT_TELEMETRY_DISABLED: '1',
  };
  await migrate(url);
  const seeded = await seedIfEmpty(url, environment);
  if (seeded) say(seeded);
  if (!development && !existsSync(`${ROOT}.next/evenrun-sources`))
    say('Building the product; the first time takes a minute or two …');
  if (!development) await buildIfStale('.next', environment);
  await serve(port, development, environment);
});

function webPort() {
  const port = Number(process.env.PORT ?? 3000);
  if (Number.isInteger(port) && port > 0 && port < 65536) return port;
  throw new Stop(
    `PORT is “${process.env.PORT}”: it must be a number from 1 to 65535. Set it, for example PORT=3001 npm start.`,
  );
}

async function refuseSecondStart(port) {
  if (existsSync(RUNNING)) {
    const { pid, address } = JSON.parse(readFileSync(RUNNING, 'utf8'));
    if (isAlive(pid) && (await portTaken(Number(new URL(address).port))))
      throw new Stop(
        `Evenrun already runs from this folder at ${address} (process ${pid}). Stop that one first, with Ctrl-C or “kill ${pid}”.`,
      );
  }
  if (await portTaken(port))
    throw new Stop(
      `Port ${port} is taken by another program. Choose another, for example PORT=${port + 1} npm start.`,
    );
}

function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}

/** The address of the database: the one named by the environment, or a cluster of our own. */
async function database() {
  if (process.env.DATABASE_URL) {
    await ensureNpmPackages();
    return process.env.DATABASE_URL;
  }
  await ensurePostgres();
  await ensureNpmPackages();
  return ensureDatabase(await startCluster(`${DATA}pg`), 'evenrun');
}

function sessionSecret() {
  const file = `${DATA}session-secret`;
  if (!existsSync(file)) writeFileSync(file, randomBytes(32).toString('hex'), { mode: 0o600 });
  return readFileSync(file, 'utf8').trim();
}

async function serve(port, development, environment) {
  const address = `http://127.0.0.1:${port}`;
  const command = development
    ? ['node_modules/next/dist/bin/next', 'dev', '-H', '127.0.0.1', '-p', String(port)]
    : serveCommand(port);
  const child = spawn(process.execPath, command, {
    cwd: ROOT,
    env: { ...process.env, ...environment },
    stdio: ['ignore', development ? 'inherit' : 'ignore', 'inherit'],
  });
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'])
    process.on(signal, () => child.kill('SIGTERM'));
  const ended = new Promise((resolve) => child.on('exit', (code) => resolve(code ?? 0)));
  writeFileSync(RUNNING, JSON.stringify({ pid: process.pid, address }));
  await Promise.race([answering(port), ended]);
  if (child.exitCode === null) announce(address);
  const code = await ended;
  rmSync(RUNNING, { force: true });
  say('Evenrun has stopped. Its database still runs; “npm run stop” ends it.');
  process.exitCode = code;
}

async function answering(port) {
  while (!(await portTaken(port))) await new Promise((resolve) => setTimeout(resolve, 200));
}

function announce(address) {
  say(`\nEvenrun is ready at ${address}`);
  const file = `${ROOT}seeders/demo-sign-ins.json`;
  if (!existsSync(file)) return;
  say('Demo sign-ins (an invented plant; change them before real use):');
  for (const { email, password, role, site } of JSON.parse(readFileSync(file, 'utf8')))
    say(`  ${email.padEnd(34)} ${password.padEnd(20)} ${role}, ${site}`);
  say('Ctrl-C stops the web server; “npm run stop” ends the database.');
}
