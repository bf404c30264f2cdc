import 'server-only';
import { weightN } from '@/lib/domain/balancing/centrifugal-force';
import { proposeTrial } from '@/lib/domain/balancing/trial-proposal';
import { ok } from '@/lib/domain/result';
import type { SolvedTrialWeight } from '@/lib/schemas/workbench-weights';
import { trialWeightInput } from '@/lib/schemas/workbench-weights-input';
import { computation } from '../computation';

/** A trial weight that is heard and does no harm. */
export const trialWeight = computation(
  { permission: 'workbench:use', input: trialWeightInput },
  (given) => {
    const { radiusMm, speedRpm, rotorMassKg, planeLimitG, amplitudeNow, perKgMm } = given;
    const known =
      amplitudeNow === null || perKgMm === null ? null : { amplitudeNow, perGmm: perKgMm / 1000 };
    const proposal = proposeTrial({
      ...{ radiusMm, speedRpm, rotorMassKg, planeLimitG },
      // Half the weight on the nearest bearing, where two planes are balanced.
      bearingLoadN: given.planes === 'two' ? weightN(rotorMassKg) / 2 : null,
      response: known,
    });
    return ok<SolvedTrialWeight>({ ...proposal, radiusMm, speedRpm });
  },
);
