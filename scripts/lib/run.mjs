import { spawn } from 'node:child_process';

/** The variable that names, in the environment of all it starts, the run that started it. */
export const RUN = 'EVENRUN_RUN';

const living = new Set();

/**
 * Runs a program to its end and hands back `{ code, output }`, both streams together. One that `outlives` this run
 * does not count as left behind by it.
 */
export function run(program, args, { input, outlives = false, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const stdin = input === undefined ? 'ignore' : 'pipe';
    const env = { ...(options.env ?? process.env), ...(outlives ? { [RUN]: undefined } : {}) };
    const child = spawn(program, args, { stdio: [stdin, 'pipe', 'pipe'], ...options, env });
    living.add(child);
    let output = '';
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8');
      stream.on('data', (text) => (output += text));
    }
    child.on('error', (error) => {
      living.delete(child);
      reject(error);
    });
    child.on('close', (code) => {
      living.delete(child);
      resolve({ code: code ?? 1, output });
    });
    if (input !== undefined) child.stdin.end(input);
  });
}

/** Ends what `run` has started and not yet seen the end of. */
export function endChildren() {
  for (const child of living) child.kill('SIGTERM');
}

/** Whether a program can be found. */
export async function has(program) {
  return (await run('sh', ['-c', `command -v ${program}`])).code === 0;
}
