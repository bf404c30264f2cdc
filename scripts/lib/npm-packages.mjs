import { createHash } from 'node:crypto';
import { existsSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { causeOf, tellingLine } from './causes.mjs';
import { lives, readLock, waitForLock } from './lock.mjs';
import { ROOT } from './places.mjs';
import { has, run } from './run.mjs';
import { Stop, say } from './say.mjs';

const LOCK_FILE = `${ROOT}package-lock.json`;
const CI = ['ci', '--include=dev', '--no-audit', '--no-fund'];
const STAMP = `${ROOT}node_modules/.evenrun-lock`;

/** Installs the packages of the lock file where they are missing or the lock file has changed. */
export async function ensureNpmPackages() {
  if (areInstalled()) return;
  const lock = await waitForLock('packages');
  try {
    if (!areInstalled()) await install();
  } finally {
    lock.free();
  }
}

function areInstalled() {
  if (existsSync(STAMP) && readFileSync(STAMP, 'utf8') === wanted()) return true;
  // npm's own note of an install is newer than the lock file: a developer ran npm here.
  const note = `${ROOT}node_modules/.package-lock.json`;
  return existsSync(note) && statSync(note).mtimeMs >= statSync(LOCK_FILE).mtimeMs;
}

function wanted() {
  return createHash('sha256').update(readFileSync(LOCK_FILE)).digest('hex');
}

async function install() {
  const server = readLock('start');
  if (server?.address && lives(server))
    throw new Stop(
      `The npm packages have to be installed anew, which would disturb Evenrun running at ${server.address}. Stop that one first, then run the command again.`,
    );
  if (!(await has('npm')))
    throw new Stop('npm is missing. Install Node.js 20 with its npm, then run the command again.');
  say('Installing the npm packages of package-lock.json; this takes a minute or two …');
  // Without its log level, a silent “npm run” would silence the reason of a failure.
  const { code, output } = await run('npm', [...CI, '--loglevel=error'], { cwd: ROOT });
  if (code !== 0)
    throw new Stop(
      causeOf(output) ??
        `The npm packages could not be installed (${tellingLine(output)}). Mend that, then run the command again.`,
    );
  writeFileSync(STAMP, wanted());
}
