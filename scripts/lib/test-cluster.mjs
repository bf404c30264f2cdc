import { mkdirSync, readdirSync } from 'node:fs';
import { removeCluster, startCluster } from './cluster.mjs';
import { DATA } from './places.mjs';
import { beganAt, isAlive } from './processes.mjs';
import { say } from './say.mjs';

const PREFIX = 'test-pg-';

/** A fast, throw-away cluster for one test run; what killed runs left behind is cleared first. */
export async function startTestCluster() {
  mkdirSync(DATA, { recursive: true });
  await clearLeftovers();
  const folder = `${DATA}/${PREFIX}${process.pid}-${beganAt(process.pid)}`;
  const url = await startCluster(folder, { fast: true });
  return { url, end: () => removeCluster(folder) };
}

async function clearLeftovers() {
  for (const name of readdirSync(DATA).filter((entry) => entry.startsWith(PREFIX))) {
    const [pid, began] = name.slice(PREFIX.length).split('-');
    if (isAlive(Number(pid)) && beganAt(pid) === began) continue;
    await removeCluster(`${DATA}/${name}`).catch(() =>
      say(`The folder .data/${name} of an earlier run belongs to another user and was left alone.`),
    );
  }
}
