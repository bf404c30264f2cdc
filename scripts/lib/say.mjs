import { appendFileSync } from 'node:fs';
import { causeOf } from './causes.mjs';
import { DATA } from './places.mjs';

/** One plain line on the terminal. */
export function say(line) {
  process.stdout.write(`${line}\n`);
}

/** Ends a script with one plain sentence that names the remedy, and no stack trace. */
export class Stop extends Error {}

/** Runs a script's main function; whatever ends it early is told in one sentence. */
export async function runMain(main) {
  try {
    await main();
  } catch (error) {
    process.stderr.write(`${error instanceof Stop ? error.message : unexpected(error)}\n`);
    process.exitCode = 1;
  }
}

function unexpected(error) {
  const said = error instanceof Error ? error.message : String(error);
  const cause = causeOf(`${error?.code} ${said}`);
  if (cause) return cause;
  try {
    appendFileSync(`${DATA}/error.log`, `${error?.stack ?? said}\n`);
  } catch {
    return `This could not be done: ${said}.`;
  }
  return `This could not be done: ${said}. The particulars are in .data/error.log.`;
}
