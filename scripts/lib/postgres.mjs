import { existsSync, readdirSync } from 'node:fs';
import { aptInstall, writeAsRoot } from './apt.mjs';
import { Stop } from './say.mjs';

const VERSIONS = '/usr/lib/postgresql';

/** The folder of PostgreSQL's programs, newest version first; null where it is not installed. */
export function postgresPrograms() {
  if (!existsSync(VERSIONS)) return null;
  const found = readdirSync(VERSIONS)
    .filter((version) => existsSync(`${VERSIONS}/${version}/bin/initdb`))
    .sort((a, b) => Number(b) - Number(a));
  return found[0] ? `${VERSIONS}/${found[0]}/bin` : null;
}

/** Installs PostgreSQL where it is missing, without letting Debian start a cluster of its own. */
export async function ensurePostgres() {
  const before = postgresPrograms();
  if (before) return before;
  await writeAsRoot(
    '/etc/postgresql-common/createcluster.conf',
    'create_main_cluster = false\n',
    'PostgreSQL',
  );
  await aptInstall(['postgresql'], 'PostgreSQL');
  const after = postgresPrograms();
  if (after) return after;
  throw new Stop(
    `PostgreSQL was installed, but no initdb is under ${VERSIONS}. Set DATABASE_URL to a server you have.`,
  );
}
