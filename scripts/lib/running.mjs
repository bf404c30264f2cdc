import { lives, readLock, takeLock } from './lock.mjs';
import { portTrouble } from './ports.mjs';
import { endProcess } from './processes.mjs';
import { Stop } from './say.mjs';

const LOCK = 'start';

/** Makes this process the one that runs the product from this folder. */
export async function becomeTheOne() {
  const lock = await takeLock(LOCK);
  if (lock.free) return lock;
  const { pid, address } = lock.holder;
  throw new Stop(
    address
      ? `Evenrun runs from this folder already, at ${address} (process ${pid}). Use that one, or end it with “npm run stop” first.`
      : `Evenrun is being started from this folder already (process ${pid}). Wait for that one, or end it with “kill ${pid}”.`,
  );
}

/** Ends the start that runs from this folder, and what a killed one left; hands back what it wrote, or null. */
export async function endTheOne() {
  const holder = readLock(LOCK);
  if (holder && lives(holder)) await endProcess(holder.pid);
  const lock = await takeLock(LOCK);
  if (!lock.free)
    throw new Stop(
      `Evenrun (process ${lock.holder.pid}) could not be ended: another user started it. Run “npm run stop” as that user or as root.`,
    );
  lock.free();
  return holder;
}

/** Says in words why the web server could not listen on a port. */
export async function checkWebPort(port) {
  const trouble = await portTrouble(port);
  if (trouble === null) return;
  const other = port === 3001 ? 3002 : 3001;
  throw new Stop(
    trouble === 'EACCES'
      ? `Port ${port} may only be used by root. Choose one above 1023, for example PORT=${other} npm start.`
      : `Port ${port} is taken by another program. Choose another, for example PORT=${other} npm start.`,
  );
}
