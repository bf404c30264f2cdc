import { checkNode } from './lib/check-node.mjs';
import { checkPlace } from './lib/check-place.mjs';
import { ensureChromium } from './lib/chromium.mjs';
import { ensureNpmPackages } from './lib/npm-packages.mjs';
import { ensurePostgres } from './lib/postgres.mjs';
import { runMain, say, Stop } from './lib/say.mjs';
import { runSuite, SUITES } from './lib/test-suites.mjs';
import { testSurroundings } from './lib/test-surroundings.mjs';
import { runTool, TOOLS } from './lib/tool-checks.mjs';

const STAGES = [...Object.keys(TOOLS), ...SUITES];
const WITH_DATABASE = ['migrations', 'server', 'browser'];

const total = { passed: 0, failed: 0, skipped: 0 };

await runMain(async () => {
  checkNode();
  checkPlace();
  const stages = wantedStages();
  const needsDatabase = stages.some((stage) => WITH_DATABASE.includes(stage));
  if (needsDatabase) await ensurePostgres();
  await ensureNpmPackages();
  if (stages.includes('browser')) await ensureChromium();
  const surroundings = await testSurroundings(needsDatabase);
  try {
    for (const stage of stages)
      if (stage in TOOLS) await tool(stage, surroundings);
      else await suite(stage, surroundings);
  } finally {
    await surroundings.end();
  }
});

if (total.passed + total.failed === 0) total.failed = 1;
if (total.failed > 0) process.exitCode = 1;
const skipped = total.skipped > 0 ? `, ${total.skipped} skipped` : '';
say(`${total.passed} passed, ${total.failed} failed${skipped}`);

function wantedStages() {
  const index = process.argv.indexOf('--only');
  if (index < 0) return STAGES;
  const names = (process.argv[index + 1] ?? '').split(',');
  const unknown = names.filter((name) => !STAGES.includes(name));
  if (unknown.length === 0) return STAGES.filter((stage) => names.includes(stage));
  throw new Stop(`There is no stage “${unknown[0]}”. Name some of these: ${STAGES.join(', ')}.`);
}

async function tool(name, { env }) {
  const begun = Date.now();
  const result = await runTool(name, env);
  total[result.passed ? 'passed' : 'failed'] += 1;
  report(name, result.passed ? 'passed' : 'FAILED', begun);
  if (!result.passed) say(result.output);
}

async function suite(name, { env, scratch }) {
  const begun = Date.now();
  const result = await runSuite(name, env, scratch);
  for (const key of Object.keys(total)) total[key] += result.counts[key];
  const { passed, failed, skipped: omitted } = result.counts;
  report(name, `${passed} passed, ${failed} failed, ${omitted} skipped`, begun);
  for (const line of remarks(result.output)) say(`  ${line}`);
  if (!result.passed) say(result.output);
}

/** What tests say about checks they could not make. */
function remarks(output) {
  const lines = output.split('\n').map((line) => line.trim());
  return new Set(lines.filter((line) => /^(Skipped|Left out):/i.test(line)));
}

function report(name, verdict, begun) {
  say(`${name.padEnd(14)} ${verdict} (${Math.round((Date.now() - begun) / 1000)} s)`);
}
