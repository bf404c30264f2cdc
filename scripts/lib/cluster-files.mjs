import { randomBytes } from 'node:crypto';
import {
  chownSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { causeOf, tellingLine } from './causes.mjs';
import { run } from './run.mjs';
import { Stop } from './say.mjs';

/** Makes the data folder of a cluster that asks every connection for a password kept beside it. */
export async function initialise({ folder, data, owner, programs }) {
  const password = randomBytes(24).toString('hex');
  writeFileSync(passwordFile(folder), password, { mode: 0o600 });
  // Made beside its place and moved there when complete, so that an interrupted start leaves no half of one.
  const making = `${data}.new`;
  rmSync(making, { recursive: true, force: true });
  mkdirSync(making, { mode: 0o700 });
  giveTo(making, owner);
  const { code, output } = await withPasswordFile(password, owner, (file) =>
    run(`${programs}/initdb`, ['-D', making, `--pwfile=${file}`, ...SETTINGS], {
      cwd: '/',
      ...owner,
    }),
  );
  if (code !== 0) {
    rmSync(making, { recursive: true, force: true });
    throw new Stop(
      causeOf(output) ??
        `The database could not be set up (${tellingLine(output)}). Mend that, then run the command again.`,
    );
  }
  renameSync(making, data);
}

const SETTINGS = ['-U', 'evenrun', '-E', 'UTF8', '--locale=C.UTF-8', '--auth=scram-sha-256'];

/** The address of a running cluster, password included. */
export function clusterUrl(folder, port) {
  const file = passwordFile(folder);
  if (existsSync(file))
    return `postgresql://evenrun:${readFileSync(file, 'utf8').trim()}@127.0.0.1:${port}/postgres`;
  throw new Stop(
    `The password file ${file} of the database is missing. Put it back, or remove ${folder}/pg to begin with an empty database.`,
  );
}

function passwordFile(folder) {
  return `${folder}/pg-password`;
}

async function withPasswordFile(password, owner, action) {
  const folder = mkdtempSync(`${tmpdir()}/evenrun-`);
  try {
    const file = `${folder}/password`;
    writeFileSync(file, password, { mode: 0o600 });
    giveTo(file, owner);
    giveTo(folder, owner);
    return await action(file);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function giveTo(path, { uid, gid }) {
  if (uid !== undefined) chownSync(path, uid, gid);
}
