import type { Actor } from '@/lib/schemas/actor';
import type { SolvedRuns } from '@/lib/schemas/workbench';
import { solveRuns } from '@/lib/server/workbench/solve-runs';
import scenarios from '@/tests/reference/data/balancing-scenarios.json';

/** Whoever may read may compute. */
export const reader: Actor = {
  personId: 1,
  name: 'R',
  email: 'r@example.test',
  role: 'reader',
  sites: [],
};

export type Runs = Parameters<typeof solveRuns>[1];
export type Polar = { amp: number; deg: number };

/** Readings as a form sends them: text. */
export const readings = (list: readonly Polar[]) =>
  list.map(({ amp, deg }) => ({ amplitude: String(amp), phaseDeg: String(deg) }));
/** Readings of a reference file that keeps them as pairs. */
export const polars = (list: readonly (readonly number[])[]): Polar[] =>
  list.map(([amp = NaN, deg = NaN]) => ({ amp, deg }));

/** A trial at 100 mm that comes off again, unless said otherwise. */
export const trial = (
  weight: readonly number[],
  run: readonly Polar[],
  over: Partial<Runs['trials'][number]> = {},
): Runs['trials'][number] => ({
  massG: weight[0] ?? NaN,
  angleDeg: weight[1] ?? NaN,
  radiusMm: 100,
  stays: 'taken off',
  readings: readings(run),
  ...over,
});

export function runs(over: Partial<Runs> & Pick<Runs, 'base' | 'trials'>): Runs {
  return {
    unit: 'mm/s rms',
    phaseSense: 'lag',
    angleSense: 'against',
    rotationFromDriveEnd: 'clockwise',
    speedRpm: '990',
    rotorMassKg: '',
    planes: over.trials.map(() => ({ radiusMm: 100 })),
    ...over,
  };
}

// Scenario S02: invented plant; expected values computed by an independent implementation.
const { S02 } = scenarios.scenarios;
export const s02 = (over: Partial<Runs> = {}) =>
  runs({
    planes: [{ radiusMm: '700' }, { radiusMm: '700' }],
    base: readings(S02.inputs.base),
    trials: S02.inputs.trial.map(({ g, deg, radius_mm: radiusMm, run }) =>
      trial([g, deg], run, { radiusMm }),
    ),
    ...over,
  });

export async function solved(input: Runs): Promise<SolvedRuns> {
  const result = await solveRuns(reader, input);
  if (!result.ok) throw new Error(result.failure.message);
  return result.value;
}

export async function refused(input: Runs) {
  const result = await solveRuns(reader, input);
  if (result.ok) throw new Error('solved, where it had to be refused');
  return result.failure;
}
