import 'server-only';
import { solveWithoutPhase } from '@/lib/domain/balancing/without-phase';
import { ok } from '@/lib/domain/result';
import type { SolvedWithoutPhase } from '@/lib/schemas/workbench-weights';
import { withoutPhaseInput } from '@/lib/schemas/workbench-weights-input';
import { computation } from '../computation';
import { typedAngles } from './typed-angles';

/** One plane without phase: sizes with one weight at three places or more. */
export const withoutPhase = computation(
  { permission: 'workbench:use', input: withoutPhaseInput },
  (given) => {
    const { runs, angleSense, baseAmplitude, trialMassG } = given;
    const angles = typedAngles(
      runs.map(({ angleDeg }, i) => ({ deg: angleDeg, field: `runs.${i}.angleDeg` })),
      angleSense,
    );
    if (!angles.ok) return angles;
    const counted = runs.map(({ amplitude }, i) => ({
      amplitude,
      angleDeg: angles.value[i] ?? 0,
    }));
    const answer = solveWithoutPhase({ baseAmplitude, trialMassG, runs: counted });
    if (!answer.ok) return answer;
    const { unit, radiusMm, rotationFromDriveEnd } = given;
    return ok<SolvedWithoutPhase>({
      ...answer.value,
      ...{ unit, radiusMm, rotationFromDriveEnd, angleSense },
      runs: counted.map((run, i) => ({ ...run, fitted: answer.value.fitted[i] ?? 0 })),
    });
  },
);
