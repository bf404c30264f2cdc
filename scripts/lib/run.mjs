import { spawn } from 'node:child_process';

/**
 * Runs a program to its end and hands back `{ code, output }` (both streams together). With
 * `show: true` the output goes to the terminal as it comes, and is still handed back.
 */
export function run(program, args, { show = false, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { stdio: ['ignore', 'pipe', 'pipe'], ...options });
    let output = '';
    const take = (stream) => (chunk) => {
      output += chunk;
      if (show) stream.write(chunk);
    };
    child.stdout?.on('data', take(process.stdout));
    child.stderr?.on('data', take(process.stderr));
    child.on('error', reject);
    child.on('close', (code) => resolve({ code: code ?? 1, output }));
  });
}

/** Whether a program can be found and runs. */
export async function has(program) {
  try {
    return (await run('sh', ['-c', `command -v ${program}`])).code === 0;
  } catch {
    return false;
  }
}
