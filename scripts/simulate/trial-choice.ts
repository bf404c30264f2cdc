import type { FittedWeight } from '@/lib/domain/balancing/job-input';
import { trialCapG } from '@/lib/domain/balancing/trial-proposal';
import { STANDARD_GRAVITY_M_S2 } from '@/lib/domain/units';
import type { SimJob } from './draw-job';

/** A trial that is too small has this share of what the person would have chosen. */
const TOO_SMALL = 0.06;

/** What a typed mass is of the real one where the decimal point was lost. */
export const MASS_TYPED = 10;

/** The first trial weight that the person chooses for a plane, as it is entered. */
export function firstTrial(job: SimJob, planeId: number, angleDeg: number): FittedWeight {
  const typed = job.slip === 'trial mass typed × 10' && planeId === 1 ? MASS_TYPED : 1;
  const share = job.trialShare * (job.slip === 'trial too small' ? TOO_SMALL : 1) * typed;
  const radiusMm = job.planes[planeId - 1]?.radiusMm ?? 0;
  return { planeId, radiusMm, angleDeg, massG: tenth(Math.max(0.1, share * capG(job, radiusMm))) };
}

/** 10 % of the static load: of half the rotor's weight where there are two planes. */
export function capG(job: SimJob, radiusMm: number): number {
  return trialCapG({ radiusMm, speedRpm: job.speedRpm, loadN: loadN(job) });
}

export function loadN({ rotor, planes }: SimJob): number {
  return (rotor.massKg * STANDARD_GRAVITY_M_S2) / planes.length;
}

/** Weights are made to 0.1 g and hung to 1°. */
export function asMade(weight: FittedWeight): FittedWeight {
  return { ...weight, massG: tenth(weight.massG), angleDeg: Math.round(weight.angleDeg) % 360 };
}

function tenth(massG: number): number {
  return Math.round(10 * massG) / 10;
}
