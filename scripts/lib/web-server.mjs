import { spawn } from 'node:child_process';
import { ROOT } from './places.mjs';
import { waitForAnswer } from './ports.mjs';

/**
 * Starts the web server on the loopback interface as a child of this process, so that its id is known, and
 * waits until it answers. `ended` resolves with its exit code; `ready` is false where it ended before.
 *
 * @param {{
 *   port: number;
 *   environment: Record<string, string>;
 *   development?: boolean;
 *   quiet?: boolean;
 *   onStart?: (child: import('node:child_process').ChildProcess) => void;
 * }} options
 */
export async function startWebServer({ port, environment, development, quiet = true, onStart }) {
  const child = spawn(
    process.execPath,
    [
      'node_modules/next/dist/bin/next',
      development ? 'dev' : 'start',
      '-H',
      '127.0.0.1',
      '-p',
      String(port),
    ],
    {
      cwd: ROOT,
      env: {
        ...process.env,
        ...environment,
        NODE_ENV: development ? 'development' : 'production',
        NEXT_TELEMETRY_DISABLED: '1',
      },
      stdio: ['ignore', quiet ? 'ignore' : 'inherit', 'inherit'],
    },
  );
  onStart?.(child);
  const ended = new Promise((resolve) => child.on('exit', (code) => resolve(code ?? 0)));
  const ready = await Promise.race([waitForAnswer(port).then(() => true), ended.then(() => false)]);
  return { child, ended, ready };
}
