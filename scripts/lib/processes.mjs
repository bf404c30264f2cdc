import { readdirSync, readFileSync, realpathSync } from 'node:fs';

/** Whether a process of this id lives, of whatever user; one that has ended and was not fetched does not. */
export function isAlive(pid) {
  const [state] = statusOf(pid);
  return state !== undefined && state !== 'Z' && state !== 'X';
}

/** When a process began, in the kernel's ticks: with the id it names one process, even after a restart. */
export function beganAt(pid) {
  return statusOf(pid)[19] ?? '';
}

/** The fields of the kernel's line on a process, from its state on; none where there is no such process. */
function statusOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  } catch {
    return [];
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
  if (!isAlive(pid)) return;
  signal(pid, 'SIGKILL');
  const last = Date.now() + 2000;
  while (isAlive(pid) && Date.now() < last) await pause(50);
}

/** Ends the processes that were started with this variable in their environment. */
export async function endMarked(variable, value) {
  const mark = `\0${variable}=${value}\0`;
  const marked = readdirSync('/proc')
    .map(Number)
    .filter((pid) => pid > 0 && environmentOf(pid).includes(mark));
  await Promise.all(marked.map((pid) => endProcess(pid)));
}

/** Empty where the process is another user's. */
function environmentOf(pid) {
  try {
    return `\0${readFileSync(`/proc/${pid}/environ`, 'utf8')}`;
  } catch {
    return '';
  }
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
