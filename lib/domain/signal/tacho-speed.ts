import { rpm, type Rpm } from '../units';

/** Speed over the whole turns between the first and the last tacho edge. */
export type TachoSpeed = {
  readonly speedRpm: Rpm;
  readonly spreadPct: number;
  readonly turns: number;
};

/**
 * Mean speed `60·turns/(last edge − first edge)` in r/min and its spread, the longest minus the
 * shortest turn as a share of the mean turn, in percent. `edgesS` rising, at least 2. With a 0/1
 * column the spread cannot be less than about two samples a turn.
 *
 * Example: edges at 0, 0.04, 0.08 s are 2 turns at 1500 r/min with 0 % spread.
 */
export function tachoSpeed(edgesS: Float64Array): TachoSpeed {
  const turns = edgesS.length - 1;
  const first = edgesS[0] ?? 0;
  const meanTurnS = ((edgesS[turns] ?? 0) - first) / turns;
  let longest = -Infinity;
  let shortest = Infinity;
  for (let i = 1; i <= turns; i++) {
    const turnS = (edgesS[i] ?? 0) - (edgesS[i - 1] ?? 0);
    longest = Math.max(longest, turnS);
    shortest = Math.min(shortest, turnS);
  }
  return {
    speedRpm: rpm(60 / meanTurnS),
    spreadPct: (100 * (longest - shortest)) / meanTurnS,
    turns,
  };
}
