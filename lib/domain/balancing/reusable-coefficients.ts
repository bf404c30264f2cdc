import { fail, ok, type Result } from '../result';
import { summariseCoefficient, type CoefficientGrade } from './coefficient-book';
import type { StoredCoefficient } from './job-input';

/** One estimate of a coefficient as the book keeps it, per g·mm, and the job that taught it. */
export type BookEstimate = {
  readonly jobId: number;
  readonly planeId: number;
  readonly pointId: number;
  readonly speedRpm: number;
  readonly rePerGmm: number;
  readonly imPerGmm: number;
  /** The fit over all runs of a job counts instead of its trials. */
  readonly source: 'trial' | 'fitted weight' | 'fit over all runs';
  /** Measured under another set-up and converted: its grade is one step lower. */
  readonly converted?: boolean;
};

/** What the book offers for one plane and point. */
export type ReusableCoefficient = StoredCoefficient & {
  readonly count: number;
  readonly spreadPct: number | null;
  readonly grade: CoefficientGrade;
  readonly jobIds: readonly number[];
  readonly converted: boolean;
};

/** Coefficients for every plane and point of a job, without a trial run. */
export type ReusableBook = {
  readonly coefficients: readonly ReusableCoefficient[];
  /** Mean speed of the estimates, r/min. */
  readonly speedRpm: number;
  /** The worst grade among them. */
  readonly grade: 'good' | 'with care';
};

type Named = { readonly id: number; readonly name: string };

/** Speeds further apart than this do not compare, % (practice). */
const SPEED_PCT = 1;
const WORST: readonly CoefficientGrade[] = ['not for reuse', 'with care', 'good'];

/**
 * The coefficients that a job may take from the book instead of trial runs: for every plane and point the
 * mean over past jobs (one estimate a job) at a speed within 1 % of now, with spread and grade.
 *
 * @param estimates per g·mm, of one rotor, set-up and unit
 * @param of planes and points of the job, and its speed now in r/min
 * @returns the book, or a failure in words: empty, another speed, a gap, estimates that disagree
 * Source: practice (no published source). @example S05: three jobs, spread 5.4 % → `good`
 */
export function reusableCoefficients(
  estimates: readonly BookEstimate[],
  of: {
    readonly planes: readonly Named[];
    readonly points: readonly Named[];
    readonly speedRpm: number;
  },
): Result<ReusableBook> {
  if (estimates.length === 0)
    return fail(
      'book-empty',
      'No earlier job has taught how this rotor answers under this set-up.',
    );
  const near = estimates.filter(
    ({ speedRpm }) => (100 * Math.abs(speedRpm - of.speedRpm)) / of.speedRpm <= SPEED_PCT,
  );
  if (near.length === 0) return speedFailure(estimates, of.speedRpm);
  const chosen = onePerJob(near);
  const coefficients: ReusableCoefficient[] = [];
  for (const plane of of.planes)
    for (const point of of.points) {
      const own = preferMeasured(
        chosen.filter((e) => e.planeId === plane.id && e.pointId === point.id),
      );
      const entry = summariseCoefficient(own.map((e) => ({ re: e.rePerGmm, im: e.imPerGmm })));
      if (!entry) return gapFailure(plane, point);
      const { rePerGmm, imPerGmm, spreadPerGmm, spreadPct, count } = entry;
      const converted = own.some((e) => e.converted === true);
      const grade = converted ? lowered(entry.grade) : entry.grade;
      const jobIds = own.map(({ jobId }) => jobId);
      const ids = { planeId: plane.id, pointId: point.id };
      coefficients.push({
        ...ids,
        rePerGmm,
        imPerGmm,
        spreadPerGmm,
        spreadPct,
        grade,
        count,
        jobIds,
        converted,
      });
    }
  const grade = WORST.find((worst) => coefficients.some((c) => c.grade === worst)) ?? 'with care';
  if (grade === 'not for reuse')
    return unconfirmed(coefficients) ?? spreadFailure(coefficients, of);
  const used = chosen.map(({ speedRpm }) => speedRpm);
  return ok({
    coefficients,
    grade,
    speedRpm: used.reduce((total, speed) => total + speed, 0) / used.length,
  });
}

/** What was measured under this set-up goes before what was converted to it. */
function preferMeasured(estimates: readonly BookEstimate[]): readonly BookEstimate[] {
  const measured = estimates.filter(({ converted }) => converted !== true);
  return measured.length > 0 ? measured : estimates;
}

/** Estimates that agree well enough, and are not for reuse only because they were converted. */
function unconfirmed(coefficients: readonly ReusableCoefficient[]): Result<never> | null {
  const doubtful = coefficients.filter(({ grade }) => grade === 'not for reuse');
  if (doubtful.some(({ spreadPct, converted }) => !converted || (spreadPct ?? 0) > 20)) return null;
  return fail(
    'converted-only',
    'The estimates were measured with the tacho or a sensor set otherwise. Converted they count one grade less, which is not enough here: make the trial runs once under this set-up.',
  );
}

/** Until a check run confirms it, a converted coefficient counts one grade less. */
function lowered(grade: CoefficientGrade): CoefficientGrade {
  return grade === 'good' ? 'with care' : 'not for reuse';
}

/**
 * One estimate for each job, plane and point: the fit over all runs of a job goes before its trials, which
 * may have been put right since.
 * Example: a job's trial and its fit over all runs count as the latter alone.
 */
export function onePerJob<
  Estimate extends Pick<BookEstimate, 'jobId' | 'planeId' | 'pointId' | 'source'>,
>(estimates: readonly Estimate[]): Estimate[] {
  const best = new Map<string, Estimate>();
  for (const estimate of estimates) {
    const key = [estimate.jobId, estimate.planeId, estimate.pointId].join(' ');
    const known = best.get(key);
    if (!known || known.source === 'trial') best.set(key, estimate);
  }
  return [...best.values()];
}

function speedFailure(estimates: readonly BookEstimate[], speedRpm: number): Result<never> {
  const speeds = [...new Set(estimates.map((e) => e.speedRpm.toFixed(0)))].join(', ');
  return fail(
    'speed-differs',
    `The coefficient book knows this rotor at ${speeds} r/min, and the base was taken at ${speedRpm.toFixed(0)} r/min, more than ${SPEED_PCT} % away. Run at that speed or make trial runs.`,
  );
}

function gapFailure(plane: Named, point: Named): Result<never> {
  return fail(
    'coefficient-missing',
    `The coefficient book has nothing for plane ${plane.name} at ${point.name}. Make the trial runs.`,
  );
}

function spreadFailure(
  coefficients: readonly ReusableCoefficient[],
  { planes, points }: { readonly planes: readonly Named[]; readonly points: readonly Named[] },
): Result<never> {
  const worst = coefficients.reduce((most, c) =>
    (c.spreadPct ?? 0) > (most.spreadPct ?? 0) ? c : most,
  );
  const plane = planes.find(({ id }) => id === worst.planeId)?.name ?? '';
  const point = points.find(({ id }) => id === worst.pointId)?.name ?? '';
  return fail(
    'estimates-disagree',
    `The estimates for plane ${plane} at ${point} spread over ${(worst.spreadPct ?? 0).toFixed(0)} % (limit 20 %): the rotor no longer answers as it did. Make trial runs, and look for a changed support, a moved mark or a crack.`,
  );
}
