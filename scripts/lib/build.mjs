import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { causeOf, fullDisk } from './causes.mjs';
import { ROOT } from './places.mjs';
import { run } from './run.mjs';
import { Stop, say } from './say.mjs';

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
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  say('Building the product; this takes a minute or two …');
  // A build cut short must not pass for the one before it.
  rmSync(stamp, { force: true });
  const { code, output } = await keepingTypeSettings(() => nextBuild(folder, environment));
  if (code !== 0) throw new Stop(buildSentence(output));
  writeFileSync(stamp, wanted);
}

function nextBuild(folder, environment) {
  return run(process.execPath, ['node_modules/next/dist/bin/next', 'build'], {
    cwd: ROOT,
    env: { ...process.env, ...environment, NODE_ENV: 'production', EVENRUN_DIST: folder },
  });
}

/** Next.js writes the folder it builds into to tsconfig.json: a change nobody made, and a new build each time. */
async function keepingTypeSettings(action) {
  const file = `${ROOT}tsconfig.json`;
  const before = readFileSync(file, 'utf8');
  try {
    return await action();
  } finally {
    if (readFileSync(file, 'utf8') !== before) writeFileSync(file, before);
  }
}

function buildSentence(output) {
  const cause = /EACCES/.test(output) ? causeOf(output) : fullDisk(output);
  if (cause) return cause;
  if (/heap out of memory|SIGKILL/.test(output))
    return 'The product could not be built: the machine ran out of memory. Free about 2 GB, then run the command again.';
  const last = output.trim().split('\n').slice(-40).join('\n');
  return `The product could not be built. The compiler said:\n${last}`;
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
