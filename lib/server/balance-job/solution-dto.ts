import 'server-only';
import type { JobInput, PointVector } from '@/lib/domain/balancing/job-input';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { knownResponse } from '@/lib/domain/balancing/known-response';
import type { ReusableBook } from '@/lib/domain/balancing/reusable-coefficients';
import { proposeTrial } from '@/lib/domain/balancing/trial-proposal';
import type { ToleranceDto, TrialCheck } from '@/lib/schemas/balance-job';
import type { TrialProposalDto } from '@/lib/schemas/balance-job-parts';
import { baseRepeats } from './base-repeats';
import type { LoadedJob } from './load-job';

/** How clearly each trial weight was heard, at the point that heard it best. */
export function trialCheckDtos(input: JobInput, { trials }: JobSolution): TrialCheck[] {
  return trials.flatMap((trial) => {
    const [planeId] = trial.planeIds;
    const loudest = [...trial.points].sort((a, b) => b.changePct - a.changePct)[0];
    if (planeId === undefined || !loudest) return [];
    return {
      planeId,
      planeName: input.planes.find(({ id }) => id === planeId)?.name ?? '',
      pointLabel: input.points.find(({ id }) => id === loudest.pointId)?.label ?? '',
      changePct: loudest.changePct,
      changeOverNoise: trial.changeOverNoise,
      verdict: trial.verdict,
      thirtyRule: trial.points.some((point) => point.thirtyRule),
    };
  });
}

/** The estimate in place against the balance quality grade. */
export function toleranceDto({ tolerance }: JobSolution): ToleranceDto | null {
  if (!tolerance) return null;
  return {
    grade: tolerance.gradeMmS,
    permissibleGmm: tolerance.totalGmm,
    planes: tolerance.lines.map((line) => ({
      name: line.name,
      permissibleGmm: line.allowedGmm,
      residualGmm: line.unbalanceGmm,
      residualDeg: line.angleDeg,
      uncertaintyGmm: line.uncertaintyGmm,
      verdict: line.verdict,
    })),
  };
}

/** A first trial weight for the plane whose trial is due; null without a rotor mass. */
export function trialProposal(
  loaded: LoadedJob,
  book: ReusableBook | null,
): TrialProposalDto | null {
  const { step, planes, job } = loaded;
  if (step.step !== 'fit trial') return null;
  const plane = planes.find(({ id }) => id === step.planeId);
  const massKg = job.rotor.$.massKg;
  if (!plane || !massKg) return null;
  const known = book ? knownResponse(plane.id, book.coefficients, baseNow(loaded)) : null;
  const proposal = proposeTrial({
    radiusMm: plane.radiusMm,
    speedRpm: job.machine.$.nominalSpeedRpm,
    rotorMassKg: massKg,
    bearingLoadN: planes.length > 1 ? nearestBearingLoadN(massKg) : null,
    planeLimitG: plane.maxGTotal,
    response: known,
  });
  return {
    planeId: plane.id,
    massG: proposal.massG,
    basis: proposal.basis,
    forceN: proposal.forceN,
    forcePctOfLoad: proposal.forcePctOfLoad,
    angleDeg: proposal.angleDeg,
    expectedChange: proposal.expectedChange,
    loweringDeg: known?.loweringDeg ?? null,
  };
}

/** The base as the repeats have it; the last base run where it was not repeated. */
function baseNow(loaded: LoadedJob): PointVector[] {
  const last = loaded.runs.findLast(({ run }) => run.purpose === 'base' && run.state === 'kept');
  return baseRepeats(loaded).flatMap(({ pointId, test }) => {
    if (test) return [{ pointId, amplitude: test.meanAmplitude, lagDeg: test.meanLagDeg }];
    const single = last?.vectors.find(({ point }) => point.id === pointId);
    return single ? [{ pointId, amplitude: single.amplitude, lagDeg: single.lagDeg }] : [];
  });
}

/** Half the rotor's weight: the usual share where the static load of the bearing is not recorded. */
function nearestBearingLoadN(massKg: number): number {
  return (massKg * 9.80665) / 2;
}
