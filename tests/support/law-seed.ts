import { configureGlobal } from 'fast-check';

/**
 * Laws are tried on the same drawn values in every run, so that a run can be repeated and a change is
 * judged by the change. EVENRUN_SEED=<whole number> draws others; a counterexample found that way
 * becomes an example of its own in the test.
 */
const seed = Number(process.env['EVENRUN_SEED'] ?? '20261201');
if (!Number.isInteger(seed)) throw new Error('EVENRUN_SEED must be a whole number.');
configureGlobal({ seed });
