import { rmSync } from 'node:fs';
import { ROOT } from './places.mjs';
import { run } from './run.mjs';

/** The checks made by one tool each, in order; each passes or fails as a whole. */
export const TOOLS = {
  format: { script: 'format:check' },
  lint: { script: 'lint' },
  types: { script: 'types', before: clearOldRouteTypes },
  architecture: { script: 'architecture' },
  unused: { script: 'unused' },
  'type-coverage': { script: 'type-coverage' },
  migrations: { script: 'db:check' },
};

/** Runs one check. */
export async function runTool(name, env) {
  const { script, before } = TOOLS[name];
  before?.();
  const { code, output } = await run('npm', ['run', '--silent', script], { cwd: ROOT, env });
  return { passed: code === 0, output };
}

/** Types of routes that no longer exist, left by an earlier browser suite, would not compile. */
function clearOldRouteTypes() {
  rmSync(`${ROOT}.next-test/types`, { recursive: true, force: true });
}
