/** One plain line on the terminal. */
export function say(line) {
  process.stdout.write(`${line}\n`);
}

/** Ends a script with one plain sentence that names the remedy, and no stack trace. */
export class Stop extends Error {}

/** Runs a script's main function; a `Stop` is one sentence, anything else is a bug and shows its trace. */
export async function runMain(main) {
  try {
    await main();
  } catch (error) {
    if (error instanceof Stop) process.stderr.write(`${error.message}\n`);
    else process.stderr.write(`${error?.stack ?? error}\n`);
    process.exitCode = 1;
  }
}
