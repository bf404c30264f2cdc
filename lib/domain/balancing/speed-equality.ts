import { speedDifferencePct } from '../balance-job/speed-difference';

/** A run as far as its speed matters. */
export type SpeedRun = {
  readonly id: number;
  readonly speedRpm: number;
  readonly speedAccepted?: boolean;
};

/** How equal the speeds of a job's runs are. */
export type SpeedEquality = {
  readonly meanRpm: number;
  readonly worstPct: number;
  readonly worstRunId: number | null;
  /** `hold`: no correction is computed unless an engineer kept the run. */
  readonly verdict: 'good' | 'warn' | 'hold';
};

/** Site defaults (common practice). */
const WARN_ABOVE_PCT = 0.5;
const HOLD_ABOVE_PCT = 1;

/**
 * Compares the speed of every run with the mean of the runs before it: above 0.5 % warn, above 1 %
 * hold, unless an engineer accepted that run's speed.
 * Source: common practice (no single published source).
 * Example: 1482 then 1441 r/min → 2.77 %, `hold`.
 */
export function speedEquality(runs: readonly SpeedRun[]): SpeedEquality {
  const differences = runs.map((run, i) => ({
    run,
    pct: speedDifferencePct(
      runs.slice(0, i).map(({ speedRpm }) => speedRpm),
      run.speedRpm,
    ),
  }));
  const open = differences.filter(({ run }) => run.speedAccepted !== true);
  const worst = differences.reduce<{ pct: number; run: SpeedRun | null }>(
    (most, { run, pct }) => ((pct ?? 0) > most.pct ? { pct: pct ?? 0, run } : most),
    { pct: 0, run: null },
  );
  const held = open.some(({ pct }) => (pct ?? 0) > HOLD_ABOVE_PCT);
  return {
    meanRpm: runs.reduce((total, { speedRpm }) => total + speedRpm, 0) / Math.max(1, runs.length),
    worstPct: worst.pct,
    worstRunId: worst.run?.id ?? null,
    verdict: held ? 'hold' : worst.pct > WARN_ABOVE_PCT ? 'warn' : 'good',
  };
}
