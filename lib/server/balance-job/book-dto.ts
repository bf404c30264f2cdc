import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Person } from '@/entities/person';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import type { ReusableBook } from '@/lib/domain/balancing/reusable-coefficients';
import { trialsAgainstBook } from '@/lib/domain/balancing/trials-against-book';
import { angleDeg, size } from '@/lib/domain/complex';
import type { Result } from '@/lib/domain/result';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type {
  BookCoefficientDto,
  BookOfferDto,
  TrialComparisonDto,
} from '@/lib/schemas/balance-job-parts';
import { coefficientOffer } from './coefficient-offer';
import { jobInput } from './job-input';
import type { LoadedJob } from './load-job';

type BookPart = Pick<BalanceJobDto, 'book' | 'reuse' | 'trialsAgainstBook'> & {
  /** For the proposal of a trial weight. */
  offered: ReusableBook | null;
};

/** What the coefficient book means for a job: offered, in use, or a check of its trials. */
export async function bookPart(em: EntityManager, loaded: LoadedJob): Promise<BookPart> {
  const { step, weights, reuse } = loaded;
  const closed = loaded.job.closedAt !== null;
  if (reuse || closed || step.step === 'base')
    return {
      book: null,
      reuse: await reuseDto(em, loaded),
      trialsAgainstBook: [],
      offered: null,
    };
  const offer = await coefficientOffer(em, loaded);
  const tried = weights.some(({ purpose }) => purpose === 'trial');
  return {
    book: step.step === 'fit trial' && !tried ? offerDto(loaded, offer) : null,
    reuse: null,
    offered: offer.ok ? offer.value : null,
    trialsAgainstBook: offer.ok ? comparisons(loaded, jobInput(loaded), offer.value) : [],
  };
}

function offerDto(loaded: LoadedJob, offer: Result<ReusableBook>): BookOfferDto {
  if (!offer.ok)
    return { failure: offer.failure.message, empty: offer.failure.code === 'book-empty' };
  const { coefficients, grade, speedRpm } = offer.value;
  return {
    failure: null,
    grade,
    speedRpm,
    lines: coefficients.map((c) => ({
      ...lineOf(loaded, c),
      count: c.count,
      spreadPct: c.spreadPct,
      converted: c.converted,
    })),
  };
}

type Stored = { planeId: number; pointId: number; rePerGmm: number; imPerGmm: number };

function lineOf({ planes, points }: LoadedJob, c: Stored): BookCoefficientDto {
  const h = { re: c.rePerGmm, im: c.imPerGmm };
  return {
    planeName: planes.find(({ id }) => id === c.planeId)?.name ?? '',
    pointLabel: points.find(({ id }) => id === c.pointId)?.label ?? '',
    sizePerKgMm: 1000 * size(h),
    deg: angleDeg(h),
  };
}

async function reuseDto(em: EntityManager, loaded: LoadedJob): Promise<BalanceJobDto['reuse']> {
  const { reuse } = loaded;
  if (!reuse) return null;
  const person = await em.findOneOrFail(Person, reuse.person.id);
  return {
    grade: reuse.grade,
    speedRpm: reuse.speedRpm,
    at: reuse.at.toISOString(),
    person: person.name,
    confirmed: reuse.confirmed,
    reason: reuse.reason ?? null,
    lines: reuse.coefficients.map((c) => lineOf(loaded, c)),
  };
}

function comparisons(
  loaded: LoadedJob,
  input: JobInput,
  { coefficients }: ReusableBook,
): TrialComparisonDto[] {
  return trialsAgainstBook(input, coefficients).map((trial) => ({
    planeName: loaded.planes.find(({ id }) => id === trial.planeId)?.name ?? '',
    pointLabel: loaded.points.find(({ id }) => id === trial.pointId)?.label ?? '',
    ratio: trial.ratio,
    turnDeg: trial.turnDeg,
    agrees: trial.agrees,
    sensesSuspect: trial.sensesSuspect,
  }));
}
