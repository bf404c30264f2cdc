import 'server-only';
import type { FittedWeight } from '@/lib/domain/balancing/job-input';
import { isSlip } from '@/lib/domain/balance-job/slip-repair';
import { slipTests } from '@/lib/domain/balancing/slip-tests';
import { weightsKey } from '@/lib/domain/balancing/weight-steps';
import type { CheckVerdict, PlaneDto, SlipExplanation } from '@/lib/schemas/balance-job';
import { fittedWeights, jobInput } from './job-input';
import type { LoadedJob, LoadedRun } from './load-job';

/** Without a known band a miss counts from this share of the base reading up (practice). */
const MISSED_SHARE_OF_BASE = 0.2;

/** Without a known band a slip explains a miss that it makes less than a third (practice). */
const EXPLAINED_SHARE = 1 / 3;

/**
 * How well each common slip explains a check run that was not as predicted, best first; empty where it
 * was as predicted or where nothing was predicted.
 */
export function slipExplanations(
  loaded: LoadedJob,
  planes: readonly PlaneDto[],
  verdict: CheckVerdict | null,
): SlipExplanation[] {
  const check = missedCheck(loaded, verdict);
  if (!check) return [];
  const tests = slipTests({
    job: jobInput(loaded),
    checkRunId: check.run.id,
    fitted: fittedFor(loaded, check),
    pitchDeg: pitchOf(planes),
  });
  if (!tests.ok) return [];
  const entered = tests.value.find(({ slip }) => slip === 'as entered')?.miss ?? 0;
  return tests.value.map(({ slip, words, miss, inside }) => ({
    ...{ slip, words, miss, inside },
    confirmable: isSlip(slip) && (inside ?? miss < EXPLAINED_SHARE * entered),
  }));
}

/** The check run that was not as predicted, or null. */
export function missedCheck(loaded: LoadedJob, verdict: CheckVerdict | null): LoadedRun | null {
  const check = loaded.runs.find(({ run }) => run.id === verdict?.runId);
  if (check?.run.state !== 'kept' || !verdict?.points.some(isMissed)) return null;
  return check;
}

function isMissed({ miss, band, before }: CheckVerdict['points'][number]): boolean {
  return miss !== null && miss > (band ?? MISSED_SHARE_OF_BASE * before);
}

/** The weights that hang in the check run and did not in the run before it. */
function fittedFor({ runs }: LoadedJob, { run }: LoadedRun): FittedWeight[] {
  const before = runs.findLast((one) => one.run.number < run.number && one.run.state === 'kept');
  const known = new Set(
    fittedWeights(before?.run.weightsState ?? []).map((weight) => weightsKey([weight])),
  );
  return fittedWeights(run.weightsState).filter((weight) => !known.has(weightsKey([weight])));
}

/** Degrees from one fixed position to the next, where every plane has as many; otherwise none. */
export function pitchOf(planes: readonly PlaneDto[]): number | null {
  const counts = new Set(planes.map(({ positions }) => positions.length));
  const [count = 0] = counts;
  return counts.size === 1 && count > 1 ? 360 / count : null;
}
