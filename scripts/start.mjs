import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import { buildIfStale } from './lib/build.mjs';
import { checkNode } from './lib/check-node.mjs';
import { checkPlace } from './lib/check-place.mjs';
import { startCluster } from './lib/cluster.mjs';
import { ensureDatabase, migrate, seedIfEmpty } from './lib/database.mjs';
import { ensureNpmPackages } from './lib/npm-packages.mjs';
import { chosenDatabase, ownSettings, webPort } from './lib/own-settings.mjs';
import { DATA, ROOT } from './lib/places.mjs';
import { ensurePostgres } from './lib/postgres.mjs';
import { endChildren } from './lib/run.mjs';
import { becomeTheOne, checkWebPort } from './lib/running.mjs';
import { runMain, say } from './lib/say.mjs';
import { startWebServer } from './lib/web-server.mjs';

const BEGUN = Date.now();

await runMain(async () => {
  checkNode();
  checkPlace();
  const development = process.argv.includes('--dev');
  const port = webPort();
  mkdirSync(DATA, { recursive: true });
  const lock = await becomeTheOne();
  const interrupted = endOnSignal(lock);
  try {
    await checkWebPort(port);
    const settings = ownSettings(await databaseAddress());
    await migrate(settings.DATABASE_URL);
    const seeded = await seedIfEmpty(settings);
    if (seeded) say(seeded);
    if (!development) await buildIfStale('.next', settings);
    await serve({ port, development, settings, lock, interrupted });
  } finally {
    lock.free();
  }
});

/** The database named by DATABASE_URL, or that of a cluster of our own. */
async function databaseAddress() {
  const given = chosenDatabase();
  if (!given) await ensurePostgres();
  await ensureNpmPackages();
  return given || ensureDatabase(await startCluster(DATA), 'evenrun');
}

/** Until the web server runs, a signal ends the set-up; after that it is passed on. */
function endOnSignal(lock) {
  const state = { server: null, ended: false };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'])
    process.on(signal, () => {
      state.ended = true;
      if (state.server) return state.server.kill('SIGTERM');
      endChildren();
      lock.free();
      process.exit(130);
    });
  return state;
}

async function serve({ port, development, settings, lock, interrupted }) {
  const address = `http://127.0.0.1:${port}`;
  const server = await startWebServer({
    port,
    development,
    environment: settings,
    quiet: !development,
    onStart: (child) => {
      interrupted.server = child;
      lock.note({ address });
    },
  });
  if (server.ready) announce(address);
  const code = await server.ended;
  if (!chosenDatabase())
    say('Evenrun has stopped. Its database runs on; “npm run stop” ends that too.');
  process.exitCode = interrupted.ended ? 0 : code;
}

function announce(address) {
  const seconds = Math.round((Date.now() - BEGUN) / 1000);
  say(`\nEvenrun is ready at ${address} (after ${seconds} s).`);
  const file = `${ROOT}seeders/demo-sign-ins.json`;
  if (existsSync(file)) {
    say('Sign-ins of the demo plant, which is invented:');
    for (const { email, password, role, site } of JSON.parse(readFileSync(file, 'utf8')))
      say(`  ${email.padEnd(32)} ${password.padEnd(20)} ${role}, ${site}`);
  }
  say(
    `Ctrl-C ends the web server${chosenDatabase() ? '' : '; “npm run stop” ends the database as well'}.`,
  );
}
