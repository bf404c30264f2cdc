import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { causeOf, tellingLine } from './causes.mjs';
import { clusterUrl, initialise } from './cluster-files.mjs';
import { clusterPlace } from './cluster-owner.mjs';
import { freePort, portTrouble } from './ports.mjs';
import { postgresPrograms } from './postgres.mjs';
import { isAlive, pause, worksIn } from './processes.mjs';
import { run } from './run.mjs';
import { Stop } from './say.mjs';

/** Somebody took the port in this very moment; or the last processes of a killed server still end. */
const PASSING = /could not (bind|create any TCP)|pre-existing shared memory block/i;

/**
 * Starts a PostgreSQL cluster of this project's own, unless it runs already, and hands back its address:
 * loopback only, no unix socket, a port of its own that it keeps, a password. `fast` is for tests: a power cut
 * may lose everything.
 */
export async function startCluster(folder, { fast = false } = {}) {
  mkdirSync(folder, { recursive: true });
  const cluster = { folder, fast, ...(await clusterPlace(folder)) };
  cluster.programs = programsFor(cluster.data);
  if (!existsSync(cluster.data)) await initialise(cluster);
  const running = runningPort(cluster.data);
  const port = running ?? (await start(cluster));
  return clusterUrl(folder, port);
}

/** Ends a cluster; says whether there was one to end. */
export async function stopCluster(folder, mode = 'fast') {
  if (!existsSync(`${folder}/pg`) && !existsSync(`${folder}/pg-place`)) return false;
  const { data, owner } = await clusterPlace(folder);
  if (!existsSync(data) || runningPort(data) === null) return false;
  const { code, output } = await run(
    `${programsFor(data)}/pg_ctl`,
    ['-D', data, '-m', mode, '-w', 'stop'],
    { cwd: '/', ...owner },
  );
  if (code === 0) return true;
  throw new Stop(`The database did not stop (${tellingLine(output)}). Run the command again.`);
}

/** Ends a cluster and removes its folder. */
export async function removeCluster(folder) {
  await stopCluster(folder, 'immediate');
  const place = `${folder}/pg-place`;
  if (existsSync(place))
    rmSync(readFileSync(place, 'utf8').trim(), { recursive: true, force: true });
  rmSync(folder, { recursive: true, force: true });
}

/** A cluster can only be read by the version of PostgreSQL that made it. */
function programsFor(data) {
  const file = `${data}/PG_VERSION`;
  const version = existsSync(file) ? readFileSync(file, 'utf8').trim() : undefined;
  const programs = postgresPrograms(version);
  if (programs) return programs;
  throw new Stop(
    `The database in ${data} needs PostgreSQL ${version}, which is not installed. Install Debian’s package postgresql-${version}, then run the command again.`,
  );
}

async function start(cluster, attempt = 1) {
  const port = await choosePort(cluster.folder);
  const log = `${cluster.data}/server.log`;
  rmSync(log, { force: true });
  const { code, output } = await run(
    `${cluster.programs}/pg_ctl`,
    ['-D', cluster.data, '-l', log, '-w', '-t', '120', '-o', settings(port, cluster.fast), 'start'],
    { cwd: '/', outlives: true, ...cluster.owner },
  );
  if (code === 0) return port;
  const said = existsSync(log) ? readFileSync(log, 'utf8') : output;
  if (PASSING.test(said) && attempt < 10) {
    await pause(500);
    return start(cluster, attempt + 1);
  }
  throw new Stop(
    causeOf(said) ??
      `The database did not start (${tellingLine(said)}). Its whole log is ${log}; mend that, then run the command again.`,
  );
}

function settings(port, fast) {
  const options = [
    `port=${port}`,
    'listen_addresses=127.0.0.1',
    "unix_socket_directories=''",
    'max_connections=100',
    ...(fast ? ['fsync=off', 'synchronous_commit=off', 'full_page_writes=off'] : []),
  ];
  return options.map((option) => `-c ${option}`).join(' ');
}

/** The port used before, unless somebody else has it by now. */
async function choosePort(folder) {
  const file = `${folder}/pg-port`;
  const kept = existsSync(file) ? Number(readFileSync(file, 'utf8')) : 0;
  if (kept > 0 && (await portTrouble(kept)) === null) return kept;
  const port = await freePort();
  writeFileSync(file, String(port));
  return port;
}

/** The port of the server running on this data, or null; the note of a killed one is cleared away. */
function runningPort(data) {
  const note = `${data}/postmaster.pid`;
  if (!existsSync(note)) return null;
  const [pid, , , port] = readFileSync(note, 'utf8').split('\n');
  if (isAlive(Number(pid)) && worksIn(Number(pid), data)) return Number(port);
  rmSync(note, { force: true });
  return null;
}
