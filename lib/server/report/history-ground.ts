import 'server-only';
import type { Loaded } from '@mikro-orm/postgresql';
import type { Coefficient } from '@/entities/answer';
import type { BalanceJob, Run, RunVector } from '@/entities/balance-job';
import type { Machine } from '@/entities/machine';
import type { RotorStay } from '@/entities/rotor';
import type { Weight } from '@/entities/weight';
import type { DecimalMark } from '@/lib/format';
import type { LedgerPlane } from '@/lib/schemas/register';

/** Everything a machine's history is told from, oldest first. */
export type HistoryGround = {
  machine: Machine;
  site: { name: string; timeZone: string; decimalMark: DecimalMark };
  stays: Loaded<RotorStay, 'rotor'>[];
  jobs: Loaded<BalanceJob, 'openedBy' | 'rotor'>[];
  runs: Run[];
  vectors: Loaded<RunVector, 'point'>[];
  weights: Loaded<Weight, 'plane' | 'position' | 'fittedBy' | 'endedBy' | 'job' | 'rotor'>[];
  coefficients: Loaded<Coefficient, 'plane' | 'point' | 'setup' | 'job'>[];
  /** What hangs on the rotor that runs now. */
  planes: LedgerPlane[];
  asked: { by: string; at: Date };
};
