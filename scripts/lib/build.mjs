import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { ROOT } from './places.mjs';
import { run } from './run.mjs';
import { Stop } from './say.mjs';

const SOURCES = [
  'app',
  'components',
  'entities',
  'lib',
  'public',
  'mikro-orm.config.ts',
  'next.config.mjs',
  'package-lock.json',
  'postcss.config.mjs',
  'tailwind.config.ts',
  'tsconfig.json',
];

/** Builds the product into a folder unless the build there was made of these very sources. */
export async function buildIfStale(folder, environment) {
  const stamp = `${ROOT}${folder}/evenrun-sources`;
  const wanted = sourcesHash();
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return false;
  const { code, output } = await run(
    process.execPath,
    ['node_modules/next/dist/bin/next', 'build'],
    {
      cwd: ROOT,
      env: { ...process.env, ...environment, EVENRUN_DIST: folder, NEXT_TELEMETRY_DISABLED: '1' },
    },
  );
  if (code !== 0) {
    if (/ENOSPC/.test(output))
      throw new Stop(
        'The disk is full: the product could not be built. Free some space and run the command again.',
      );
    throw new Stop(
      `The product could not be built:\n${output.trim().split('\n').slice(-40).join('\n')}`,
    );
  }
  writeFileSync(stamp, wanted);
  return true;
}

/** The command that serves a build on the loopback interface. */
export function serveCommand(port) {
  return ['node_modules/next/dist/bin/next', 'start', '-H', '127.0.0.1', '-p', String(port)];
}

function sourcesHash() {
  const hash = createHash('sha256');
  for (const source of SOURCES) addTo(hash, source);
  return hash.digest('hex');
}

function addTo(hash, path) {
  const full = `${ROOT}${path}`;
  if (!existsSync(full)) return;
  if (statSync(full).isDirectory()) {
    for (const name of readdirSync(full).sort()) addTo(hash, `${path}/${name}`);
    return;
  }
  hash.update(path).update('\0').update(readFileSync(full)).update('\0');
}
