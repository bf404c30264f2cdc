import { execFile } from 'node:child_process';
import { Client } from 'pg';

/** A checksum of every reading, to the last digit. */
export const READINGS_SUM = `
  select md5(string_agg(concat_ws(' ', m.tag, p.label, r.kind, r.value, r.zone, r.taken_at), ','
    order by m.tag, p.label, r.kind, r.taken_at, r.status)) as sum
  from reading r join point p on p.id = r.point_id join machine m on m.id = p.machine_id`;

/** A checksum of every weight. */
export const WEIGHTS_SUM = `
  select md5(string_agg(concat_ws(' ', o.serial, w.mass_g, w.angle_deg, w.fitted_at, w.ending), ','
    order by o.serial, w.fitted_at)) as sum
  from weight w join rotor o on o.id = w.rotor_id`;

/** How a seeding ended. */
export type Ran = { code: number; output: string; seconds: number };

/** The script that a first start runs. */
export function seed(url: string, files: string): Promise<Ran> {
  const started = performance.now();
  const env = { ...process.env, DATABASE_URL: url, EVENRUN_DATA_DIR: files };
  const script = ['--conditions=react-server', '--import', 'tsx', 'scripts/seed-if-empty.ts'];
  return new Promise((resolve) => {
    const child = execFile(process.execPath, script, { env }, (_error, stdout, stderr) => {
      const seconds = (performance.now() - started) / 1000;
      resolve({ code: child.exitCode ?? 1, output: stdout + stderr, seconds });
    });
  });
}

/** How many rows a table has. */
export async function countOf(url: string, table: string): Promise<unknown> {
  const [row] = await ask(url, `select count(*)::int as n from ${table}`);
  return row?.n;
}

/** One statement on a connection of its own. */
export async function ask(url: string, sql: string): Promise<Record<string, unknown>[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(sql)).rows;
  } finally {
    await client.end();
  }
}
