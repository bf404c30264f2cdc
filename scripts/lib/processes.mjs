import { readFileSync, realpathSync } from 'node:fs';

/** Whether a process of this id lives; one of another user counts too. */
export function isAlive(pid) {
  if (!Number.isInteger(pid) || pid <= 0) return false;
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
}

/** When a process began, in the kernel's ticks: with the id it names one process, even after a restart. */
export function beganAt(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? '';
  } catch {
    return '';
  }
}

/** Whether a process works in this very folder. */
export function worksIn(pid, folder) {
  try {
    return realpathSync(`/proc/${pid}/cwd`) === realpathSync(folder);
  } catch {
    return false;
  }
}

/** Asks a process to end and waits for it; after the time given it is ended without asking. */
export async function endProcess(pid, patienceMs = 10_000) {
  const until = Date.now() + patienceMs;
  signal(pid, 'SIGTERM');
  while (isAlive(pid) && Date.now() < until) await pause(50);
  if (isAlive(pid)) signal(pid, 'SIGKILL');
}

export function pause(ms) {
  return new Promise((resolve) => setTimeout(resolve, ms));
}

function signal(pid, name) {
  try {
    process.kill(pid, name);
  } catch {
    // It has ended by itself.
  }
}
