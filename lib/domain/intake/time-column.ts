import { ok, type Result } from '../result';
import { intakeFailure, type IntakeFailure } from './intake-failure';

/**
 * A time column to be judged: times as printed, with so many decimals at the coarsest end;
 * `secondsPerUnit` turns them into seconds.
 */
export type TimeColumn = {
  readonly times: Float64Array;
  readonly secondsPerUnit: number;
  readonly decimals: number;
  readonly name: string;
};

const UNEVEN_SHARE = 0.01;
const GAP_RATIO = 1.5;

/**
 * Sample rate in Hz from a time column with even steps. Each step may differ from the mean step by
 * 1 % and by what printing rounds away. Where the rounding cannot tell the rate from a whole number
 * of hertz, that number is taken. A step back, a gap (a step beyond 1.5 mean steps), or an uneven
 * step is a failure that names its row. `rowOf(i)` gives the line of sample i. At least 2 samples.
 *
 * Example: times 0.000000, 0.000078, 0.000156, … printed with 6 decimals are 12 800 Hz.
 */
export function rateOfTimeColumn(
  column: TimeColumn,
  fileName: string,
  rowOf: (sample: number) => number,
): Result<number, IntakeFailure> {
  const { times, secondsPerUnit, decimals, name } = column;
  const last = times.length - 1;
  const from = times[0] ?? 0;
  const to = times[last] ?? 0;
  const worst = worstStep(times, (to - from) / last, decimals);
  if (worst !== null) {
    const row = rowOf(worst.sample);
    return intakeFailure(worst.code, fileName, { row, column: name }, worst.sentence);
  }
  const spanS = (to - from) * secondsPerUnit;
  const rateHz = last / spanS;
  const doubtHz = (rateHz * lastDigitOf(to, decimals)) / (to - from);
  const whole = Math.round(rateHz);
  const indistinct = doubtHz < 0.5 && Math.abs(rateHz - whole) <= doubtHz;
  return ok(indistinct ? whole : rateHz);
}

type WrongStep = {
  readonly sample: number;
  readonly code: 'TIME_NOT_RISING' | 'TIME_GAP' | 'TIME_UNEVEN';
  readonly sentence: string;
};

function worstStep(times: Float64Array, mean: number, decimals: number): WrongStep | null {
  let worst = 0;
  let sample = 0;
  for (let i = 1; i < times.length; i++) {
    const now = times[i] ?? 0;
    const step = now - (times[i - 1] ?? 0);
    const allowed = UNEVEN_SHARE * Math.abs(mean) + lastDigitOf(now, decimals);
    if (step < 0) return notRising(i);
    const excess = Math.abs(step - mean) - allowed;
    if (excess > worst) {
      worst = excess;
      sample = i;
    }
  }
  if (!(mean > 0)) return notRising(1);
  return sample === 0 ? null : describe(times, sample);
}

function notRising(sample: number): WrongStep {
  const sentence = 'the time does not rise from the row before; sort or export the file again.';
  return { sample, code: 'TIME_NOT_RISING', sentence };
}

function describe(times: Float64Array, sample: number): WrongStep {
  const step = (times[sample] ?? 0) - (times[sample - 1] ?? 0);
  const usual = medianStep(times);
  const steps = `the step from the row before is ${format(step)} where ${format(usual)} is usual`;
  return step > GAP_RATIO * usual
    ? { sample, code: 'TIME_GAP', sentence: `${steps}: samples are missing; record again.` }
    : {
        sample,
        code: 'TIME_UNEVEN',
        sentence: `${steps}; export the record at an even sample rate.`,
      };
}

function medianStep(times: Float64Array): number {
  const steps = times.subarray(1).map((time, i) => time - (times[i] ?? 0));
  return steps.sort()[Math.floor(steps.length / 2)] ?? 0;
}

// Two printed times, each half a last digit off, shift their difference by one; a double adds its own.
function lastDigitOf(time: number, decimals: number): number {
  return 10 ** -decimals + Math.abs(time) * 2 ** -51;
}

function format(value: number): string {
  return String(Number(value.toPrecision(4)));
}
