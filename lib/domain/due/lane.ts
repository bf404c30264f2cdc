import type { Zone } from '../severity/zone';

/** Lanes of the Due board, in their order. */
export const LANES = [
  'act now',
  'act now, find the cause',
  'rebalance',
  'find the cause',
  'watch',
] as const;
export type Lane = (typeof LANES)[number];

/** What decides the lane. */
export type LaneFacts = {
  readonly zone: Zone;
  /** L, 0 to 1. */
  readonly likelihood: number;
  /** Z and T, 0 to 1. */
  readonly severity: number;
  readonly timeLeft: number;
  readonly isBlocked: boolean;
};

const LIKELY = 0.4;

/**
 * The lane of a machine: zone D acts now; otherwise Z above 0.5 or T above 0 asks for a rebalance;
 * the rest is watched. Where L is below 0.4 or a blocking finding is open, the cause is to be found
 * instead, whatever the zone. The rule is this register's own.
 *
 * Example: zone C with Z 0.63 and L 0 is 'find the cause'.
 */
export function laneOf({ zone, likelihood, severity, timeLeft, isBlocked }: LaneFacts): Lane {
  const isUnbalance = likelihood >= LIKELY && !isBlocked;
  if (zone === 'D') return isUnbalance ? 'act now' : 'act now, find the cause';
  if (severity > 0.5 || timeLeft > 0) return isUnbalance ? 'rebalance' : 'find the cause';
  return 'watch';
}
