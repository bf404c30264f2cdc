import { existsSync, readFileSync } from 'node:fs';
import { ROOT } from './places.mjs';
import { run } from './run.mjs';

/** The suites of vitest, in order: from the quickest to the one that drives a browser. */
export const SUITES = ['domain', 'reference', 'server', 'browser'];

/** Runs one suite. */
export async function runSuite(name, env, scratch) {
  const report = `${scratch}/${name}.json`;
  const { code, output } = await run(
    process.execPath,
    [
      'node_modules/vitest/vitest.mjs',
      'run',
      '--project',
      name,
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${report}`,
    ],
    { cwd: ROOT, env: { ...env, NO_COLOR: '1' } },
  );
  const counts = countsOf(report);
  if (code !== 0 && counts.failed === 0) counts.failed = 1;
  return { counts, output, passed: code === 0 };
}

/** A test file that cannot even be loaded has no test that failed: it counts as one. */
function countsOf(report) {
  if (!existsSync(report)) return { passed: 0, failed: 0, skipped: 0 };
  const result = JSON.parse(readFileSync(report, 'utf8'));
  const unloaded = result.testResults.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some(isFailed),
  );
  return {
    passed: result.numPassedTests,
    failed: result.numFailedTests + unloaded.length,
    skipped: result.numPendingTests + result.numTodoTests,
  };
}

function isFailed(test) {
  return test.status === 'failed';
}
