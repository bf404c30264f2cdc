import 'server-only';
import { createHash } from 'node:crypto';
import type { Answer as SolvedAnswer } from '@/lib/domain/balancing/build-answer';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import type { PolarUnbalance } from '@/lib/domain/balancing/weights-ledger';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { angleDeg, size } from '@/lib/domain/complex';
import type { AnswerDto } from '@/lib/schemas/balance-job';

/** A solved job's answer as a card shows it; null where no answer is given. */
export function answerDto(
  input: JobInput,
  solution: JobSolution,
  kind: 'correction' | 'trim',
): AnswerDto | null {
  const { answer } = solution;
  if (!answer) return null;
  return {
    kind,
    method: solution.method,
    fingerprint: fingerprintOf(input, answer),
    planes: answer.add.map((plane) => {
      const total = answer.total.find(({ planeId }) => planeId === plane.planeId) ?? plane;
      return {
        planeId: plane.planeId,
        planeName: plane.planeName,
        radiusMm: plane.radiusMm,
        massG: plane.massG,
        angleDeg: plane.angleDeg,
        unbalanceGmm: plane.unbalanceGmm,
        forceN: plane.forceN,
        uncertaintyG: plane.uncertaintyG,
        uncertaintyDeg: plane.uncertaintyDeg,
        totalMassG: total.massG,
        totalAngleDeg: total.angleDeg,
      };
    }),
    predicted: answer.predicted.map((point) => ({
      ...point,
      label: input.points.find(({ id }) => id === point.pointId)?.label ?? '',
    })),
    condition: solution.condition,
    staticPair: answer.kind === 'static pair',
    coefficients: solution.model.coefficients.map(({ planeId, pointId, rePerGmm, imPerGmm }) => ({
      planeId,
      pointId,
      rePerGmm,
      imPerGmm,
      sizePerKgMm: 1000 * size({ re: rePerGmm, im: imPerGmm }),
      deg: angleDeg({ re: rePerGmm, im: imPerGmm }),
    })),
    misfit: solution.allRuns?.misfitRms ?? solution.model.misfitRms,
    parts: partsOf(input, answer),
    warnings: warningsOf(solution),
  };
}

function warningsOf(solution: JobSolution): string[] {
  const withheld = solution.withheld ? [solution.withheld.failure.message] : [];
  return [...withheld, ...solution.notices.map(({ message }) => message)];
}

function partsOf(input: JobInput, answer: SolvedAnswer): AnswerDto['parts'] {
  const radiusMm = input.planes[0]?.radiusMm;
  if (!answer.staticPart || !answer.couplePart || !radiusMm) return null;
  const inGrams = (part: PolarUnbalance) => ({
    massG: part.unbalanceGmm / radiusMm,
    angleDeg: part.angleDeg,
  });
  return { static: inGrams(answer.staticPart), couple: inGrams(answer.couplePart) };
}

/** What the answer was computed from and what it says, as one short text. */
function fingerprintOf(input: JobInput, answer: SolvedAnswer): string {
  const said = JSON.stringify([
    input.runs.map(({ id }) => id),
    input.weightsNow,
    answer.add.map(({ planeId, massG, angleDeg: deg }) => [planeId, massG, deg]),
  ]);
  return createHash('sha256').update(said).digest('hex').slice(0, 32);
}
