import { existsSync, readdirSync } from 'node:fs';
import { aptInstall } from './apt.mjs';
import { Stop } from './say.mjs';

const VERSIONS = '/usr/lib/postgresql';
const CLUSTERS = '/etc/postgresql-common/createcluster.conf';

/** The folder of the programs of one PostgreSQL version, or of the newest; null where it is not installed. */
export function postgresPrograms(version) {
  if (!existsSync(VERSIONS)) return null;
  const found = readdirSync(VERSIONS)
    .filter((name) => !version || name === version)
    .filter((name) => existsSync(`${VERSIONS}/${name}/bin/initdb`))
    .sort((a, b) => Number(b) - Number(a));
  return found[0] ? `${VERSIONS}/${found[0]}/bin` : null;
}

/** Installs PostgreSQL where it is missing, without letting Debian start a cluster of its own on 5432. */
export async function ensurePostgres() {
  if (postgresPrograms()) return;
  const noCluster = `mkdir -p "$(dirname ${CLUSTERS})" && echo 'create_main_cluster = false' >> ${CLUSTERS}`;
  await aptInstall(['postgresql'], 'PostgreSQL', noCluster);
  if (!postgresPrograms())
    throw new Stop(
      `PostgreSQL was installed, but no initdb is under ${VERSIONS}. Set DATABASE_URL to a server you have.`,
    );
}
