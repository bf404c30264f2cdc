import 'server-only';
import { speedDifferencePct } from '@/lib/domain/balance-job/speed-difference';
import type { LoadedJob } from './load-job';

/** A run further off than this is held (common practice; no published source). */
const HOLD_PCT = 1;

/** Share of the machine's range by which a speed may lie beside it. */
const BESIDE_RANGE = 0.01;

/** Why a run of this speed is none of this machine or cannot be compared with the base, or null. */
export function speedDoubt(loaded: LoadedJob, speedRpm: number): string | null {
  return outsideRange(loaded, speedRpm) ?? unlikeTheBase(loaded, speedRpm);
}

function outsideRange({ job }: LoadedJob, speedRpm: number): string | null {
  const { speedMinRpm: low, speedMaxRpm: high } = job.machine.$;
  if (speedRpm >= low * (1 - BESIDE_RANGE) && speedRpm <= high * (1 + BESIDE_RANGE)) return null;
  return (
    `The speed is ${speedRpm} r/min, and this machine runs at ${low} to ${high} r/min. ` +
    'Line the run through if it is a slip, or let an engineer keep it.'
  );
}

function unlikeTheBase(loaded: LoadedJob, speedRpm: number): string | null {
  const kept = loaded.runs.filter(({ run }) => run.state === 'kept');
  const off = speedDifferencePct(
    kept.map(({ run }) => run.speedRpm),
    speedRpm,
  );
  if (off === null || off <= HOLD_PCT) return null;
  return (
    `The speed is off by ${off.toFixed(2)} % from the runs so far (limit ${HOLD_PCT} %): ` +
    'size and lag change with speed. Repeat the run at the same speed, or let an engineer keep it.'
  );
}
