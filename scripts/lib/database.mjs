import { existsSync } from 'node:fs';
import { causeOf, fullDisk, tellingLine } from './causes.mjs';
import { ROOT } from './places.mjs';
import { postgresPrograms } from './postgres.mjs';
import { run } from './run.mjs';
import { Stop } from './say.mjs';

const SEED = 'scripts/seed-if-empty.ts';

/** Makes a database on a cluster of ours where it is missing, and hands back its address. */
export async function ensureDatabase(clusterUrl, name) {
  const found = await ask(clusterUrl, `select 1 from pg_database where datname = '${name}'`);
  if (found.trim() !== '1') await ask(clusterUrl, `create database ${name}`);
  return databaseUrl(clusterUrl, name);
}

/** Brings a database to the newest migration. */
export async function migrate(url) {
  const { code, output } = await run(
    process.execPath,
    ['--import', 'tsx', 'node_modules/@mikro-orm/cli/cli.js', 'migration:up'],
    { cwd: ROOT, env: { ...process.env, DATABASE_URL: url } },
  );
  if (code !== 0) throw new Stop(databaseSentence(url, output));
}

/** Fills an empty database with the demo plant; hands back what it says it did. */
export async function seedIfEmpty(environment) {
  if (!existsSync(`${ROOT}${SEED}`)) return '';
  const { code, output } = await run(
    process.execPath,
    ['--conditions=react-server', '--import', 'tsx', SEED],
    { cwd: ROOT, env: { ...process.env, ...environment } },
  );
  if (code === 0) return output.trim();
  throw new Stop(
    causeOf(output) ??
      `The demo plant could not be put into the database (${tellingLine(output)}). Mend that, then run the command again.`,
  );
}

function databaseUrl(url, name) {
  const other = new URL(url);
  other.pathname = `/${name}`;
  return other.href;
}

/** The password goes by the environment: other users can read a program's arguments. */
async function ask(url, sql) {
  const { hostname, port, username, password } = new URL(url);
  const address = ['-h', hostname, '-p', port, '-U', username, '-d', 'postgres'];
  const { code, output } = await run(
    `${postgresPrograms()}/psql`,
    [...address, '-w', '-XAtq', '-c', sql],
    { env: { ...process.env, PGPASSWORD: decodeURIComponent(password) } },
  );
  if (code === 0) return output;
  if (/password authentication failed/.test(output))
    throw new Stop(
      'The database does not accept the password in .data/pg-password. Put the right file back, or remove .data/pg to begin with an empty database.',
    );
  throw new Stop(causeOf(output) ?? `The database answered: ${tellingLine(output)}.`);
}

function databaseSentence(url, output) {
  const { host, pathname, username } = new URL(url);
  const name = pathname.slice(1);
  const full = fullDisk(output);
  if (full) return full;
  if (/ECONNREFUSED|ENOTFOUND|EAI_AGAIN|ETIMEDOUT|EHOSTUNREACH|Connection terminated/.test(output))
    return `No database server answers at ${host}. Check DATABASE_URL and that the server runs, then run the command again.`;
  if (/authentication failed|28P01|28000|no pg_hba.conf/.test(output))
    return `The database server at ${host} does not accept the user “${username}” with this password. Check DATABASE_URL, then run the command again.`;
  if (/database ".*" does not exist|3D000/.test(output))
    return `There is no database “${name}” at ${host}. Create it (createdb ${name}) or name another in DATABASE_URL, then run the command again.`;
  if (/42501|permission denied/.test(output))
    return `The user “${username}” may not make tables in the database “${name}”. Make that user its owner, then run the command again.`;
  return (
    causeOf(output) ??
    `The database could not be brought up to date (${tellingLine(output)}). Mend that, then run the command again.`
  );
}
