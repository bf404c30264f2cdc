import { ZERO } from '../complex';
import type { JobInput } from './job-input';
import type { PointNoise } from './reading-noise';
import type { ResponseModel } from './response-model';
import { trialResponse, type TrialResponse } from './trial-response';
import type { WeightStep } from './weight-steps';

/** Whether a trial weight was heard, at each point and as a whole. */
export type TrialCheck = {
  readonly runId: number;
  readonly beforeRunIds: readonly number[];
  readonly planeIds: readonly number[];
  readonly points: readonly (TrialResponse & { readonly pointId: number })[];
  /** The best of the points: a trial must be heard somewhere. */
  readonly changeOverNoise: number | null;
  readonly verdict: TrialResponse['verdict'];
};

const ORDER: readonly TrialResponse['verdict'][] = ['good', 'unknown', 'wide', 'refuse'];

/**
 * The response check of every trial run that the coefficients rest on.
 * Source: see `trialResponse`. Example: S08 → ratio 0.58, `refuse`.
 */
export function trialChecks(
  input: JobInput,
  steps: readonly WeightStep[],
  known: { readonly noise: readonly PointNoise[]; readonly model: ResponseModel },
): TrialCheck[] {
  const { runIds, source } = known.model;
  const used = steps.filter(
    ({ run }) => source !== 'stored' && run.purpose === 'trial' && runIds.includes(run.id),
  );
  return used.map((step) => {
    const points = input.points.map((point, p) => {
      const deviation = known.noise.find(({ pointId }) => pointId === point.id)?.deviation ?? null;
      const noise = deviation === null ? null : { deviation, repeats: step.before.runs.length };
      const before = step.before.vectors[p] ?? ZERO;
      return { pointId: point.id, ...trialResponse(before, step.after[p] ?? ZERO, noise) };
    });
    const ratios = points.map(({ changeOverNoise }) => changeOverNoise).filter((r) => r !== null);
    return {
      runId: step.run.id,
      beforeRunIds: step.before.runs.map(({ id }) => id),
      planeIds: step.planeIds,
      points,
      changeOverNoise: ratios.length > 0 ? Math.max(...ratios) : null,
      verdict:
        ORDER.find((verdict) => points.some((point) => point.verdict === verdict)) ?? 'unknown',
    };
  });
}
