import type { Slip } from './slips';

/** How a simulated job went. Readings are those of the worst point, without noise, mm/s rms. */
export type Outcome = {
  readonly slip: Slip;
  /** Base, then every check run. */
  readonly worst: readonly number[];
  readonly atEnd: number;
  readonly starts: number;
  /** The slip that a check run was explained by, or null. */
  readonly explainedBy: string | null;
  /** Why no (further) weight was fitted, or null. */
  readonly stopped: string | null;
};
