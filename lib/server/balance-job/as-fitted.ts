import 'server-only';
import type { Answer } from '@/entities/answer';
import type { WeightOnRotor } from '@/entities/balance-job';
import { angleDeg, fromPolar, size, subtract, sum } from '@/lib/domain/complex';
import { predictRun } from '@/lib/domain/balancing/predict-run';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import type { AsFittedDto, AsFittedPlane } from '@/lib/schemas/balance-job-parts';
import { weightsNow } from './job-input';
import type { LoadedJob } from './load-job';
import { changedOnRotor } from './weights-on-rotor';

/** From this share of the asked unbalance up, what was fitted is not what was asked for (practice). */
const FAR_SHARE = 0.25;

/**
 * What was recorded after the newest answer beside what it asked for, and what the points should read with
 * it, before anything is started; null where nothing was fitted for an answer.
 */
export function asFitted(loaded: LoadedJob): AsFittedDto | null {
  const answer = loaded.answers.at(-1);
  const asked = answer?.result.answer?.add;
  if (!answer || !asked || loaded.step.step !== 'fit correction') return null;
  const planes = asked.flatMap((plane): AsFittedPlane[] => {
    const fitted = fittedFor(loaded, answer, plane.planeId);
    if (fitted.length === 0) return [];
    const got = sum(fitted.map((w) => fromPolar(w.massG * w.radiusMm, w.angleDeg)));
    const off = size(subtract(got, fromPolar(plane.unbalanceGmm, plane.angleDeg)));
    return [
      {
        planeName: plane.planeName,
        askedG: plane.massG,
        askedDeg: plane.angleDeg,
        fittedG: size(got) / plane.radiusMm,
        fittedDeg: angleDeg(got),
        isFar: off > FAR_SHARE * plane.unbalanceGmm,
      },
    ];
  });
  if (planes.length === 0) return null;
  const solution = solveJob(answer.inputs);
  if (!solution.ok) return null;
  const expected = predictRun(solution.value, answer.inputs, weightsNow(loaded));
  return {
    planes,
    expected: expected.map(({ pointId, amplitude, lagDeg }) => ({
      label: loaded.points.find(({ id }) => id === pointId)?.label ?? '',
      amplitude,
      lagDeg,
    })),
  };
}

/** What came on for an answer in a plane, and what older weights came off after it. */
function fittedFor(loaded: LoadedJob, answer: Answer, planeId: number): WeightOnRotor[] {
  const own = new Set(
    loaded.weights.filter(({ answerNumber }) => answerNumber === answer.number).map(({ id }) => id),
  );
  const gone = new Set(
    loaded.removed
      .filter(({ endedAt }) => endedAt && endedAt >= answer.acceptedAt)
      .map(({ id }) => id),
  );
  return changedOnRotor(loaded).filter(
    (weight) =>
      weight.planeId === planeId && (own.has(weight.weightId) || gone.has(weight.weightId)),
  );
}
