import 'server-only';
import { AsyncLocalStorage } from 'node:async_hooks';

const pinned = new AsyncLocalStorage<Date>();

/** The time queries and commands go by: now, unless they run inside `atTime`. */
export function clockNow(): Date {
  return pinned.getStore() ?? new Date();
}

/** Runs work as if it were that time: for seeders, which write a past through the commands. */
export function atTime<Value>(time: Date, work: () => Promise<Value>): Promise<Value> {
  return pinned.run(time, work);
}
