import { linkSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { DATA } from './places.mjs';
import { beganAt, endMarked, isAlive, pause } from './processes.mjs';
import { RUN } from './run.mjs';

/**
 * Takes a lock of this project, kept as a file with the holder's process in it. Hands back `{ note, free }`,
 * or `{ holder }` where a living process has it. A lock whose process was killed is taken over, once all that
 * the killed one left working (a build, an install, a web server) has been ended.
 */
export async function takeLock(name) {
  mkdirSync(DATA, { recursive: true });
  process.env[RUN] ??= `${process.pid}-${beganAt(process.pid)}`;
  const file = `${DATA}/${name}.lock`;
  const mine = `${file}.${process.pid}`;
  const content = (more) =>
    JSON.stringify({ pid: process.pid, began: beganAt(process.pid), ...more });
  writeFileSync(mine, content({}));
  try {
    for (;;) {
      if (linked(mine, file)) break;
      const holder = readLock(name);
      if (holder && lives(holder)) return { holder };
      if (holder) await endMarked(RUN, `${holder.pid}-${holder.began}`);
      // Somebody else may have taken it over meanwhile.
      if (readLock(name)?.pid === holder?.pid) rmSync(file, { force: true });
    }
  } finally {
    rmSync(mine, { force: true });
  }
  const note = (more) => {
    writeFileSync(mine, content(more));
    renameSync(mine, file);
  };
  return { note, free: () => rmSync(file, { force: true }) };
}

/** Takes a lock, waiting until whoever has it is done. */
export async function waitForLock(name) {
  for (;;) {
    const lock = await takeLock(name);
    if (lock.free) return lock;
    await pause(500);
  }
}

/** What the holder of a lock wrote, whether it still lives or not; null where there is none. */
export function readLock(name) {
  try {
    return JSON.parse(readFileSync(`${DATA}/${name}.lock`, 'utf8'));
  } catch {
    return null;
  }
}

export function lives({ pid, began }) {
  return isAlive(pid) && beganAt(pid) === began;
}

function linked(from, to) {
  try {
    linkSync(from, to);
    return true;
  } catch (error) {
    if (error.code === 'EEXIST') return false;
    throw error;
  }
}
