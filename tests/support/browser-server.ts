import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { buildIfStale } from '../../scripts/lib/build.mjs';
import { ensureDatabase, migrate, seedIfEmpty } from '../../scripts/lib/database.mjs';
import { waitForLock } from '../../scripts/lib/lock.mjs';
import { freePort } from '../../scripts/lib/ports.mjs';
import { endProcess } from '../../scripts/lib/processes.mjs';
import { startTestCluster } from '../../scripts/lib/test-cluster.mjs';
import { startWebServer } from '../../scripts/lib/web-server.mjs';

const BUILD = '.next-test';

/** The product as built, on a database of its own with the demo plant; its address is EVENRUN_BASE_URL. */
export default async function setup() {
  // A product that runs already, with the demo plant in it: what a person tries while writing a test.
  if (process.env.EVENRUN_BASE_URL) return;
  const given = process.env.TEST_DATABASE_URL;
  const cluster = given ? { url: given, end: () => Promise.resolve() } : await startTestCluster();
  const files = mkdtempSync(`${tmpdir()}/evenrun-files-`);
  const environment = {
    DATABASE_URL: await ensureDatabase(cluster.url, 'evenrun_browser'),
    SESSION_SECRET: 'a secret for tests only, forty characters',
    EVENRUN_DATA_DIR: files,
    EVENRUN_DIST: BUILD,
  };
  await migrate(environment.DATABASE_URL);
  await seedIfEmpty(environment);
  await build(environment);
  const end = await serve(environment);
  return async () => {
    await end();
    rmSync(files, { recursive: true, force: true });
    await cluster.end();
  };
}

async function build(environment: Record<string, string>): Promise<void> {
  const lock = await waitForLock('browser-build');
  try {
    await buildIfStale(BUILD, environment);
  } finally {
    lock.free();
  }
}

async function serve(environment: Record<string, string>): Promise<() => Promise<void>> {
  const port = await freePort();
  const server = await startWebServer({
    port,
    environment,
    // A test run cut short must not leave the server behind.
    onStart: (child) => process.once('exit', () => child.kill('SIGKILL')),
  });
  if (!server.ready) throw new Error('The web server of the browser suite ended at once.');
  process.env.EVENRUN_BASE_URL = `http://127.0.0.1:${port}`;
  return () => endProcess(server.child.pid ?? 0);
}
