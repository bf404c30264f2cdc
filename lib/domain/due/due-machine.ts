import type { ZoneBoundaries } from '../severity/zone';
import type { TrendReading } from '../trends/trend-line';

/** How much hangs on a machine, A the most. */
export type Criticality = 'A' | 'B' | 'C' | 'D';

/**
 * A kept reading of the point that rules: `value` is the overall in the band of the limits, `oneX` the
 * 1x size in the same unit and detector, `lagDeg` its lag. Null: not measured, or of another set-up.
 */
export type DueReading = TrendReading & {
  readonly oneX: number | null;
  readonly lagDeg: number | null;
  readonly speedRpm: number | null;
};

/** What the Due board has to know of a machine. */
export type DueMachine = {
  readonly tag: string;
  readonly criticality: Criticality;
  readonly boundaries: ZoneBoundaries;
  readonly readings: readonly DueReading[];
  /** Days of balances, other events that break the trend, and new set-ups. */
  readonly breakDays: readonly number[];
  /** Age of the last reading, days, ≥ 0. */
  readonly readingAgeDays: number;
  /** 1x size horizontal over vertical at the bearing that rules; null: not measured. */
  readonly horizontalOverVertical: number | null;
  /** 1x lag horizontal less vertical, degrees; null: not measured. */
  readonly horizontalLessVerticalLagDeg: number | null;
  readonly daysSinceBalance: number | null;
  /** Median days between its balances; null: not known. */
  readonly balanceLifeDays: number | null;
  readonly balancesInYear: number;
  /** Open findings that speak against balancing, in words. */
  readonly blockingFindings: readonly string[];
};

/** One factor of the score, 0 to 1, with what went in and why it is so. */
export type DuePart = {
  readonly key:
    | 'share'
    | 'phase'
    | 'direction'
    | 'horizontal to vertical'
    | 'severity'
    | 'time left'
    | 'growth'
    | 'consequence'
    | 'balance age';
  /** The letter of the formula. */
  readonly symbol: 'L_share' | 'L_phase' | 'L_direction' | 'L_hv' | 'Z' | 'T' | 'G' | 'C' | 'A';
  readonly value: number;
  readonly inputs: readonly DueFigure[];
  readonly because: string;
};

/** A number that went into a part, unrounded, with its unit; null: not known. */
export type DueFigure = {
  readonly label: string;
  readonly value: number | null;
  readonly unit: string;
};
