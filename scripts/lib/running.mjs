import { lives, readLock, takeLock } from './lock.mjs';
import { ROOT } from './places.mjs';
import { portTrouble } from './ports.mjs';
import { endProcess, worksIn } from './processes.mjs';
import { Stop } from './say.mjs';

const LOCK = 'start';

/** Makes this process the one that runs the product from this folder. */
export async function becomeTheOne() {
  const before = readLock(LOCK);
  const lock = takeLock(LOCK);
  if (lock.free) {
    // The web server of a start that was killed lives on, holding the port.
    if (before && worksIn(before.server, ROOT)) await endProcess(before.server);
    return lock;
  }
  const { pid, address } = lock.holder;
  throw new Stop(
    address
      ? `Evenrun runs from this folder already, at ${address} (process ${pid}). Use that one, or end it with “npm run stop” first.`
      : `Evenrun is being started from this folder already (process ${pid}). Wait for that one, or end it with “kill ${pid}”.`,
  );
}

/** The start that runs from this folder, or null. */
export function theOneRunning() {
  const holder = readLock(LOCK);
  return holder && lives(holder) ? holder : null;
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
