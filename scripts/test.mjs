import { mkdirSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { checkNode } from './lib/check-node.mjs';
import { ensureChromium } from './lib/chromium.mjs';
import { ensureNpmPackages } from './lib/npm-packages.mjs';
import { DATA, ROOT } from './lib/places.mjs';
import { ensurePostgres } from './lib/postgres.mjs';
import { run } from './lib/run.mjs';
import { runMain, say } from './lib/say.mjs';
import { startTestCluster } from './lib/test-cluster.mjs';

const TOOLS = {
  format: ['npm', 'run', '-s', 'format:check'],
  lint: ['npm', 'run', '-s', 'lint'],
  types: ['npm', 'run', '-s', 'types'],
  architecture: ['npm', 'run', '-s', 'architecture'],
  unused: ['npm', 'run', '-s', 'unused'],
  'type-coverage': ['npm', 'run', '-s', 'type-coverage'],
  migrations: ['npm', 'run', '-s', 'db:check'],
};
const SUITES = ['domain', 'reference', 'server', 'browser'];

const total = { passed: 0, failed: 0, skipped: 0 };

await runMain(async () => {
  checkNode();
  const wanted = onlyStages();
  await ensurePostgres();
  await ensureNpmPackages();
  if (wanted('browser')) await ensureChromium();
  mkdirSync(DATA, { recursive: true });
  const scratch = mkdtempSync(`${tmpdir()}/evenrun-test-`);
  const cluster = await startTestCluster();
  const environment = {
    ...process.env,
    NEXT_TELEMETRY_DISABLED: '1',
    TEST_DATABASE_URL: cluster.url,
    DATABASE_URL: cluster.url,
    SESSION_SECRET: 'a secret for tests only, forty characters',
    EVENRUN_DATA_DIR: `${scratch}/files`,
  };
  try {
    for (const name of Object.keys(TOOLS)) if (wanted(name)) await tool(name, environment);
    for (const name of SUITES) if (wanted(name)) await suite(name, environment, scratch);
  } finally {
    await cluster.end();
    rmSync(scratch, { recursive: true, force: true });
  }
  if (total.passed + total.failed === 0) total.failed = 1;
  process.exitCode = total.failed > 0 ? 1 : 0;
  const skipped = total.skipped > 0 ? `, ${total.skipped} skipped` : '';
  say(`${total.passed} passed, ${total.failed} failed${skipped}`);
});

function onlyStages() {
  const index = process.argv.indexOf('--only');
  if (index < 0) return () => true;
  const names = (process.argv[index + 1] ?? '').split(',');
  return (name) => names.includes(name);
}

async function tool(name, env) {
  const begun = Date.now();
  const [program, ...args] = TOOLS[name];
  const { code, output } = await run(program, args, { cwd: ROOT, env });
  total[code === 0 ? 'passed' : 'failed'] += 1;
  report(name, code === 0 ? 'good' : 'FAILED', begun);
  if (code !== 0) say(output);
}

async function suite(name, env, scratch) {
  const begun = Date.now();
  const file = `${scratch}/${name}.json`;
  const args = ['node_modules/vitest/vitest.mjs', 'run', '--project', name];
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${file}`];
  const { code, output } = await run(process.execPath, [...args, ...reporters], {
    cwd: ROOT,
    env: { ...env, NO_COLOR: '1' },
  });
  const counts = countsOf(file);
  // A suite that cannot even be loaded counts no test: it is one failure.
  if (code !== 0 && counts.failed === 0) counts.failed = 1;
  for (const key of Object.keys(total)) total[key] += counts[key];
  report(
    name,
    `${counts.passed} passed, ${counts.failed} failed, ${counts.skipped} left out`,
    begun,
  );
  for (const line of output.split('\n'))
    if (/left out|skipped:/i.test(line)) say(`  ${line.trim()}`);
  if (code !== 0) say(output);
}

function countsOf(file) {
  try {
    const result = JSON.parse(readFileSync(file, 'utf8'));
    return {
      passed: result.numPassedTests,
      failed: result.numFailedTests,
      skipped: result.numPendingTests,
    };
  } catch {
    return { passed: 0, failed: 0, skipped: 0 };
  }
}

function report(name, verdict, begun) {
  say(`${name.padEnd(14)} ${verdict} (${((Date.now() - begun) / 1000).toFixed(0)} s)`);
}
