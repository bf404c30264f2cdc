import { existsSync, mkdirSync, readdirSync } from 'node:fs';
import { removeCluster, startCluster } from './cluster.mjs';
import { DATA } from './places.mjs';

const PREFIX = 'test-pg-';

/** A fast, throw-away cluster for one test run; what killed runs left behind is cleared first. */
export async function startTestCluster() {
  mkdirSync(DATA, { recursive: true });
  await clearLeftovers();
  const folder = `${DATA}${PREFIX}${process.pid}`;
  const url = await startCluster(folder, { fast: true });
  return { url, end: () => removeCluster(folder) };
}

async function clearLeftovers() {
  for (const name of readdirSync(DATA).filter((entry) => entry.startsWith(PREFIX))) {
    const pid = Number(name.slice(PREFIX.length));
    if (!isAlive(pid) && existsSync(`${DATA}${name}`)) await removeCluster(`${DATA}${name}`);
  }
}

function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}
