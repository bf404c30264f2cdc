import { createHash } from 'node:crypto';
import { existsSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { ROOT } from './places.mjs';
import { Stop, say } from './say.mjs';
import { run } from './run.mjs';

const STAMP = `${ROOT}node_modules/.evenrun-lock`;

/** Installs the packages of the lock file where they are missing or the lock file has changed. */
export async function ensureNpmPackages() {
  const wanted = createHash('sha256')
    .update(readFileSync(`${ROOT}package-lock.json`))
    .digest('hex');
  if (existsSync(STAMP) && readFileSync(STAMP, 'utf8') === wanted) return;
  if (installedByHand()) return;
  say('Installing the npm packages of the lock file …');
  const { code, output } = await run('npm', ['ci', '--no-audit', '--no-fund'], { cwd: ROOT });
  if (code !== 0) throw new Stop(npmSentence(output));
  writeFileSync(STAMP, wanted);
}

/** npm’s own note of an install is newer than the lock file: a developer ran npm here. */
function installedByHand() {
  const note = `${ROOT}node_modules/.package-lock.json`;
  return existsSync(note) && statSync(note).mtimeMs >= statSync(`${ROOT}package-lock.json`).mtimeMs;
}

function npmSentence(output) {
  if (/ENOSPC|no space left/i.test(output))
    return 'The disk is full: the npm packages could not be installed. Free some space and run the command again.';
  if (/ENOTFOUND|EAI_AGAIN|ECONNREFUSED|ETIMEDOUT|network/i.test(output))
    return 'The npm registry cannot be reached. Check the network, then run the command again.';
  const line =
    output.split('\n').find((text) => /npm error/i.test(text)) ?? output.trim().split('\n').at(-1);
  return `npm ci failed (${line?.trim()}). Mend that, then run the command again.`;
}
