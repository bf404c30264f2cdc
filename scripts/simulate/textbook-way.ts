import type { FittedWeight, PointVector } from '@/lib/domain/balancing/job-input';
import {
  angleDeg,
  divide,
  fromPolar,
  multiply,
  scale,
  size,
  subtract,
  ZERO,
  type Complex,
} from '@/lib/domain/complex';
import { TARGET_MM_S, type SimJob } from './draw-job';
import { asMade, firstTrial } from './trial-choice';
import { Workshop } from './workshop';
import type { Outcome } from './outcome';

/**
 * The textbook way without any check: one base run, one trial run per plane, the formula, the correction,
 * a check run, and one trim with the same coefficients where the target is missed.
 * Source: influence coefficient method, S. S. Rao, Mechanical Vibrations, ch. 9 (from memory).
 */
export function textbookWay(job: SimJob): Outcome {
  const shop = new Workshop(job);
  const base = shop.start('base')[0]?.vectors ?? [];
  const points = pointsUsed(job, base);
  const before = phasors(base, points);
  const columns = job.planes.map((_, i) => {
    const trial = firstTrial(job, i + 1, job.trialDeg);
    shop.fit(trial, 'trial');
    const after = phasors(shop.start('trial')[0]?.vectors ?? [], points);
    shop.takeOff(trial);
    const u = fromPolar(trial.massG * trial.radiusMm, trial.angleDeg);
    return after.map((v, p) => divide(subtract(v, before[p] ?? ZERO), u));
  });
  let now = before;
  for (let attempt = 0; attempt < 2; attempt += 1) {
    const correction = solved(columns, now);
    if (correction.some((u) => !Number.isFinite(size(u)))) break;
    correction.forEach((u, i) => shop.fit(weightOf(job, i, u), 'correction'));
    shop.fitted();
    const check = shop.start('check')[0]?.vectors ?? [];
    now = phasors(check, points);
    if (check.every(({ amplitude }) => amplitude <= TARGET_MM_S)) break;
  }
  return {
    slip: job.slip,
    worst: shop.worst,
    atEnd: shop.worstPoint(),
    starts: shop.starts,
    explainedBy: null,
    stopped: null,
  };
}

/** As many points as planes: the loudest one for one plane. */
function pointsUsed({ planes }: SimJob, base: readonly PointVector[]): number[] {
  if (planes.length === 2) return base.map((_, p) => p);
  const loudest = Math.max(...base.map(({ amplitude }) => amplitude));
  return [base.findIndex(({ amplitude }) => amplitude === loudest)];
}

function phasors(vectors: readonly PointVector[], points: readonly number[]): Complex[] {
  return points.map((p) => {
    const vector = vectors[p];
    return vector ? fromPolar(vector.amplitude, vector.lagDeg) : ZERO;
  });
}

/** `H·C = −V` for one or two planes, by determinants. */
function solved(columns: readonly Complex[][], now: readonly Complex[]): Complex[] {
  const [a = [], b] = columns;
  const [h11 = ZERO, h21 = ZERO] = a;
  const [v1 = ZERO, v2 = ZERO] = now;
  if (!b) return [scale(divide(v1, h11), -1)];
  const [h12 = ZERO, h22 = ZERO] = b;
  const det = subtract(multiply(h11, h22), multiply(h12, h21));
  return [
    scale(divide(subtract(multiply(v1, h22), multiply(h12, v2)), det), -1),
    scale(divide(subtract(multiply(h11, v2), multiply(v1, h21)), det), -1),
  ];
}

function weightOf({ planes }: SimJob, index: number, u: Complex): FittedWeight {
  const radiusMm = planes[index]?.radiusMm ?? 1;
  return asMade({
    planeId: index + 1,
    radiusMm,
    massG: size(u) / radiusMm,
    angleDeg: angleDeg(u),
  });
}
