import 'server-only';
import { ledgerSum } from '@/lib/domain/balancing/weights-ledger';
import { ok } from '@/lib/domain/result';
import type { SolvedCombined } from '@/lib/schemas/workbench-weights';
import { combineInput } from '@/lib/schemas/workbench-weights-input';
import { computation } from '../computation';
import { typedAngles } from './typed-angles';

/** Several weights of one plane as one at a radius. */
export const combine = computation(
  { permission: 'workbench:use', input: combineInput },
  (given) => {
    const { weights, angleSense, toRadiusMm } = given;
    const angles = typedAngles(
      weights.map(({ angleDeg }, i) => ({ deg: angleDeg, field: `weights.${i}.angleDeg` })),
      angleSense,
    );
    if (!angles.ok) return angles;
    const hung = weights.map((weight, i) => ({
      ...weight,
      planeId: 1,
      angleDeg: angles.value[i] ?? 0,
    }));
    const { unbalanceGmm, angleDeg, equivalentMassG } = ledgerSum(hung, toRadiusMm);
    const total = weights.reduce((sum, { massG }) => sum + massG, 0);
    return ok<SolvedCombined>({
      ...{ unbalanceGmm, angleDeg, angleSense, radiusMm: toRadiusMm, massG: equivalentMassG },
      sumOverOne: equivalentMassG > 1e-9 * total ? total / equivalentMassG : null,
    });
  },
);
