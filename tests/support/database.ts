import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import type { TestProject } from 'vitest/node';
import { ensureDatabase, migrate } from '../../scripts/lib/database.mjs';
import { startTestCluster } from '../../scripts/lib/test-cluster.mjs';

declare module 'vitest' {
  export interface ProvidedContext {
    clusterUrl: string;
  }
}

const TEMPLATE = 'evenrun_template';

/** A server with a migrated template database, which each test file clones. */
export default async function setup(project: TestProject) {
  const given = process.env.TEST_DATABASE_URL;
  const cluster = given ? { url: given, end: () => Promise.resolve() } : await startTestCluster();
  await migrate(await ensureDatabase(cluster.url, TEMPLATE));
  project.provide('clusterUrl', cluster.url);
  const files = mkdtempSync(`${tmpdir()}/evenrun-files-`);
  process.env.SESSION_SECRET ??= 'a secret for tests only, forty characters';
  process.env.EVENRUN_DATA_DIR = files;
  return async () => {
    rmSync(files, { recursive: true, force: true });
    await cluster.end();
  };
}
