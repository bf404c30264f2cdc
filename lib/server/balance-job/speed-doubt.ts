import 'server-only';
import { speedDifferencePct } from '@/lib/domain/balance-job/speed-difference';
import type { LoadedJob } from './load-job';

/** A run further off than this is held (common practice; no published source). */
const HOLD_PCT = 1;

/** Why a run of this speed cannot be compared with the base, or null. */
export function speedDoubt(loaded: LoadedJob, speedRpm: number): string | null {
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
