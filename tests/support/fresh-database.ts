import { inject } from 'vitest';
import { Client } from 'pg';

let made = 0;

/** A migrated, empty database of its own for one test file. */
export async function freshDatabase(): Promise<{ url: string; close: () => Promise<void> }> {
  const clusterUrl = inject('clusterUrl');
  made += 1;
  const name = `evenrun_test_${process.pid}_${Date.now()}_${made}`;
  await execute(clusterUrl, `create database ${name} template evenrun_template`);
  const url = new URL(clusterUrl);
  url.pathname = `/${name}`;
  process.env.SESSION_SECRET ??= 'a secret for tests only, forty characters';
  return {
    url: url.href,
    close: () => execute(clusterUrl, `drop database if exists ${name} with (force)`),
  };
}

async function execute(url: string, sql: string): Promise<void> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    await client.query(sql);
  } finally {
    await client.end();
  }
}
