import { chmodSync, existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { createHash } from 'node:crypto';
import { run } from './run.mjs';
import { Stop, say } from './say.mjs';

/**
 * Where a cluster's data folder is and whom it belongs to. PostgreSQL refuses to run as root, so root hands it
 * to the user `postgres`, whom a folder like /root may shut out: then the data lies under /var/lib.
 */
export async function clusterPlace(folder) {
  const root = process.getuid() === 0;
  const note = `${folder}/pg-place`;
  const data = existsSync(note) ? readFileSync(note, 'utf8').trim() : `${folder}/pg`;
  if (existsSync(data)) return existing(data, root);
  if (!root) return { data, owner: {} };
  const owner = await postgresUser();
  makeReachable(folder);
  if (await canEnter(folder, owner)) return { data, owner };
  const elsewhere = `/var/lib/evenrun-${createHash('sha256').update(folder).digest('hex').slice(0, 12)}`;
  say(
    `The user “postgres”, whom the database runs as, cannot enter ${folder}: its data is kept in ${elsewhere}.`,
  );
  writeFileSync(note, elsewhere);
  return { data: elsewhere, owner };
}

function existing(data, root) {
  const { uid, gid } = statSync(data);
  if (root) return { data, owner: { uid, gid } };
  if (uid === process.getuid()) return { data, owner: {} };
  throw new Stop(
    `The database in ${data} was made by another user. Run the command as root, or remove ${data} to begin with an empty one.`,
  );
}

async function postgresUser() {
  const ids = ['-u', '-g'].map(async (flag) =>
    Number((await run('id', [flag, 'postgres'])).output),
  );
  const [uid, gid] = await Promise.all(ids);
  if (uid && gid) return { uid, gid };
  throw new Stop(
    'There is no user “postgres” to run the database as. Install Debian’s package postgresql, or run the command as another user than root.',
  );
}

/** Lets other users pass through, though not look into, the folder that holds the data folder. */
function makeReachable(folder) {
  mkdirSync(folder, { recursive: true });
  chmodSync(folder, (statSync(folder).mode & 0o777) | 0o011);
}

async function canEnter(folder, owner) {
  return (await run('test', ['-x', folder], { cwd: '/', ...owner })).code === 0;
}
