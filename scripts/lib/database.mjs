import { existsSync } from 'node:fs';
import { ROOT } from './places.mjs';
import { postgresPrograms } from './postgres.mjs';
import { run } from './run.mjs';
import { Stop } from './say.mjs';

/** The address of another database on the same server. */
export function databaseUrl(url, name) {
  const other = new URL(url);
  other.pathname = `/${name}`;
  return other.href;
}

/** Makes a database on a cluster of ours where it is missing, and hands back its address. */
export async function ensureDatabase(clusterUrl, name) {
  const psql = `${postgresPrograms()}/psql`;
  const ask = (sql) => run(psql, [clusterUrl, '-XAtq', '-c', sql]);
  const found = await ask(`select 1 from pg_database where datname = '${name}'`);
  if (found.output.trim() !== '1') {
    const made = await ask(`create database ${name}`);
    if (made.code !== 0)
      throw new Stop(`The database ${name} could not be made (${made.output.trim()}).`);
  }
  return databaseUrl(clusterUrl, name);
}

/** Brings a database to the newest migration. */
export async function migrate(url) {
  const { code, output } = await run(
    process.execPath,
    ['--import', 'tsx', 'node_modules/@mikro-orm/cli/cli.js', 'migration:up'],
    { cwd: ROOT, env: { ...process.env, DATABASE_URL: url } },
  );
  if (code === 0) return;
  if (/No space left on device/i.test(output))
    throw new Stop(
      'The disk is full: the database could not be migrated. Free some space and run the command again.',
    );
  if (/ECONNREFUSED|ENOTFOUND|password authentication failed/i.test(output))
    throw new Stop(
      'The database of DATABASE_URL cannot be reached with this user and password. Check DATABASE_URL, then run the command again.',
    );
  throw new Stop(
    `The database could not be migrated:\n${output.trim().split('\n').slice(0, 12).join('\n')}`,
  );
}

/** Fills an empty database with the demo plant; says what it did. */
export async function seedIfEmpty(url, environment) {
  if (!existsSync(`${ROOT}scripts/seed-if-empty.ts`)) return '';
  const { code, output } = await run(
    process.execPath,
    ['--conditions=react-server', '--import', 'tsx', 'scripts/seed-if-empty.ts'],
    { cwd: ROOT, env: { ...process.env, ...environment, DATABASE_URL: url } },
  );
  if (code !== 0) throw new Stop(`The demo plant could not be seeded:\n${output.trim()}`);
  return output.trim();
}
