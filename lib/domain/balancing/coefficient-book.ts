import { angleDeg, divide, scale, size, subtract, sum, ZERO, type Complex } from '../complex';
import { fail, ok, type Result } from '../result';
import { shortTurnDeg } from '../units';

/** How well estimates of one coefficient agree. */
export type CoefficientGrade = 'good' | 'with care' | 'not for reuse';

/** Several estimates of one coefficient as one. */
export type BookEntry = {
  readonly count: number;
  readonly rePerGmm: number;
  readonly imPerGmm: number;
  /** rms distance of the estimates from their mean (n − 1); null for a single estimate. */
  readonly spreadPerGmm: number | null;
  readonly spreadPct: number | null;
  readonly grade: CoefficientGrade;
  /** Each estimate against the mean. */
  readonly estimates: readonly { readonly ratio: number; readonly turnDeg: number }[];
};

/** What must be the same before a coefficient is used again. */
export type ReuseConditions = { readonly speedRpm: number; readonly setUpId: number };

const GOOD_TO_PCT = 10;
const CARE_TO_PCT = 20;
const SPEED_PCT = 1;

/**
 * Mean, spread and grade of estimates of one influence coefficient (one plane, point, speed, set-up):
 * spread = rms distance from the mean over the size of the mean, n − 1; up to 10 % good, up to 20 %
 * with care, above that not for reuse. A single estimate is `with care`. Null for no estimates.
 *
 * @param estimates per g·mm
 * Source: practice (no published source). @example S05: three jobs, spread 5.4 %, `good`
 */
export function summariseCoefficient(estimates: readonly Complex[]): BookEntry | null {
  const count = estimates.length;
  if (count === 0) return null;
  const mean = scale(sum(estimates), 1 / count);
  const distances = estimates.map((h) => size(subtract(h, mean)));
  const spreadPerGmm = count > 1 ? Math.hypot(...distances) / Math.sqrt(count - 1) : null;
  const spreadPct = spreadPerGmm === null ? null : (100 * spreadPerGmm) / size(mean);
  return {
    count,
    rePerGmm: mean.re,
    imPerGmm: mean.im,
    spreadPerGmm,
    spreadPct,
    grade: gradeOf(spreadPct),
    estimates: estimates.map((h) => {
      const { ratio, turnDeg } = compareVectors(h, mean);
      return { ratio, turnDeg };
    }),
  };
}

/**
 * Grade of a spread in %. Example: 5.4 is `good`, 12 `with care`, 25 `not for reuse`; unknown (null) is
 * `with care`.
 */
export function gradeOf(spreadPct: number | null): CoefficientGrade {
  if (spreadPct === null) return 'with care';
  if (spreadPct <= GOOD_TO_PCT) return 'good';
  return spreadPct <= CARE_TO_PCT ? 'with care' : 'not for reuse';
}

/**
 * Whether a stored coefficient may be used without a trial run: the same set-up and a speed within 1 %.
 *
 * @returns the speed difference in %, or a failure that says which condition fails
 * Source: practice (no published source). Example: 1500 against 1485 r/min is 1.01 % off: refused.
 */
export function checkReuse(
  stored: ReuseConditions,
  now: ReuseConditions,
): Result<{ readonly speedDifferencePct: number }> {
  if (stored.setUpId !== now.setUpId)
    return fail(
      'set-up-differs',
      'The stored coefficient belongs to another set-up of mark, tacho and sensors, so it cannot be used here. Make a trial run.',
    );
  const off = (100 * Math.abs(now.speedRpm - stored.speedRpm)) / stored.speedRpm;
  if (off <= SPEED_PCT) return ok({ speedDifferencePct: off });
  return fail(
    'speed-differs',
    `The stored coefficient is for ${stored.speedRpm.toFixed(0)} r/min and the machine runs at ${now.speedRpm.toFixed(0)} r/min, ${off.toFixed(2)} % apart (limit ${SPEED_PCT} %). Run at that speed or make a trial run.`,
  );
}

/** What a new coefficient says beside the stored one. */
export type StoredComparison = {
  readonly ratio: number;
  readonly turnDeg: number;
  readonly agrees: boolean;
  /** The size agrees and the turn is about minus twice the typed angle. */
  readonly sensesSuspect: boolean;
};

const RATIO = { least: 0.7, most: 1.4 };
const TURN_DEG = 25;

/**
 * A new coefficient against the stored one, as soon as the trial run is in: agrees within a ratio of
 * 0.7 to 1.4 and 25°. Where the turn is about −2 times the typed trial angle, degrees were probably
 * counted with rotation (or lead read as lag).
 *
 * @param typedDeg angle of the trial weight as entered, against rotation
 * Source: derived; a weight counted the other way turns the coefficient by −2·angle.
 * @example S07: ratio 0.966, −151.5° against −2·75 = −150° → senses suspect
 */
export function compareWithStored(
  fresh: Complex,
  stored: Complex,
  typedDeg: number,
): StoredComparison {
  const { ratio, turnDeg } = compareVectors(fresh, stored);
  const sizeAgrees = ratio >= RATIO.least && ratio <= RATIO.most;
  const agrees = sizeAgrees && Math.abs(turnDeg) <= TURN_DEG;
  const fromMirror = Math.abs(shortTurnDeg(-2 * typedDeg, turnDeg));
  return {
    ratio,
    turnDeg,
    agrees,
    sensesSuspect: sizeAgrees && !agrees && fromMirror <= TURN_DEG,
  };
}

/**
 * How one coefficient compares with another: ratio of sizes and short turn from the other to it.
 * Source: definition. Example: 0.381 at 10.0° against 0.369 at 2.9° is 1.03 and 7.1°.
 */
export function compareVectors(
  one: Complex,
  other: Complex,
): { readonly ratio: number; readonly turnDeg: number; readonly differencePct: number } {
  const quotient = size(other) === 0 ? ZERO : divide(one, other);
  return {
    ratio: size(quotient),
    turnDeg: shortTurnDeg(0, angleDeg(quotient)),
    differencePct: 100 * Math.hypot(quotient.re - 1, quotient.im),
  };
}
