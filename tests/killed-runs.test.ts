import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { rmSync } from 'node:fs';
import { afterEach, expect, it } from 'vitest';
import { takeLock } from '../scripts/lib/lock.mjs';
import { DATA } from '../scripts/lib/places.mjs';
import { beganAt, isAlive } from '../scripts/lib/processes.mjs';

const LOCKS = new URL('../scripts/lib/lock.mjs', import.meta.url).href;
const RUN = new URL('../scripts/lib/run.mjs', import.meta.url).href;
const NAME = `trial-${process.pid}`;
const started: number[] = [];

afterEach(() => {
  for (const pid of started.splice(0)) if (isAlive(pid)) process.kill(pid, 'SIGKILL');
  rmSync(`${DATA}/${NAME}.lock`, { force: true });
});

it('a lock belongs to the process that lives and has it', async () => {
  const holder = await holding();
  expect(await takeLock(NAME)).toEqual({
    holder: { pid: holder.pid, began: beganAt(holder.pid) },
  });
});

it('the lock of a killed process is taken over, and what it left working is ended', async () => {
  const holder = await holding();
  expect([holder.work, holder.server].map(isAlive)).toEqual([true, true]);
  holder.child.kill('SIGKILL');
  await once(holder.child, 'exit');
  const lock = await takeLock(NAME);
  // The second one is what a database server is: meant to go on.
  expect([holder.work, holder.server].map(isAlive)).toEqual([false, true]);
  lock.free?.();
});

/** A process that takes a lock, starts a program that works and one that outlives it, and says their ids. */
async function holding() {
  const code = `
    const { takeLock } = await import('${LOCKS}');
    const { run } = await import('${RUN}');
    await takeLock('${NAME}');
    const begin = (name, options) =>
      run('sh', ['-c', 'echo $0 $$ >&3; exec sleep 60', name], {
        stdio: ['ignore', 'pipe', 'pipe', 1],
        ...options,
      });
    void begin('work');
    void begin('server', { outlives: true });`;
  const env = { ...process.env, EVENRUN_RUN: undefined };
  const child = spawn(process.execPath, ['--input-type=module', '-e', code], { env });
  started.push(child.pid ?? 0);
  const ids = await idsFrom(child);
  const [work = 0, server = 0] = [ids.get('work'), ids.get('server')];
  started.push(work, server);
  return { child, pid: child.pid ?? 0, work, server };
}

function idsFrom(child: ChildProcess): Promise<Map<string, number>> {
  return new Promise((resolve) => {
    let said = '';
    child.stdout?.on('data', (text) => {
      said += String(text);
      const ids = new Map<string, number>();
      for (const [, name = '', id] of said.matchAll(/(\w+) (\d+)\n/g)) ids.set(name, Number(id));
      if (ids.size === 2) resolve(ids);
    });
  });
}
