import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { DATA } from './places.mjs';
import { takeLock } from './lock.mjs';
import { endChildren } from './run.mjs';
import { Stop } from './say.mjs';
import { startTestCluster } from './test-cluster.mjs';

/**
 * What a test run has for itself: a database server, a folder for scratch files, and an environment that leads
 * away from whatever the person at this terminal has set. `end` removes it all, a signal too.
 */
export async function testSurroundings(needsDatabase) {
  mkdirSync(DATA, { recursive: true });
  const lock = await takeLock('test');
  if (!lock.free)
    throw new Stop(
      `Another npm test runs in this folder (process ${lock.holder.pid}). Wait until it has ended, then run the command again.`,
    );
  const ends = [lock.free];
  const end = async () => {
    while (ends.length > 0) await ends.pop()();
  };
  endOnSignal(end);
  const scratch = mkdtempSync(`${tmpdir()}/evenrun-test-`);
  ends.push(() => rmSync(scratch, { recursive: true, force: true }));
  const env = {
    ...process.env,
    NEXT_TELEMETRY_DISABLED: '1',
    SESSION_SECRET: 'a secret for tests only, forty characters',
    EVENRUN_DATA_DIR: `${scratch}/files`,
  };
  for (const name of ['NODE_ENV', 'EVENRUN_DIST', 'TEST_DATABASE_URL', 'DATABASE_URL'])
    delete env[name];
  if (needsDatabase) await addDatabase(env, ends, end);
  return { env, scratch, end };
}

async function addDatabase(env, ends, end) {
  try {
    const cluster = await startTestCluster();
    ends.push(cluster.end);
    env.TEST_DATABASE_URL = cluster.url;
    env.DATABASE_URL = cluster.url;
  } catch (error) {
    await end();
    throw error;
  }
}

function endOnSignal(end) {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'])
    process.on(signal, () => {
      endChildren();
      void end().finally(() => process.exit(130));
    });
}
