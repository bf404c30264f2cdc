import type { Support } from './limit-set-data';
import { coversSpeed } from './zone';

/** What of a machine decides which limits hold. */
export type MachineFacts = {
  readonly powerKw: number | null;
  readonly support: Support | 'unknown';
  readonly speedRpm: number;
};

/** What a limit set holds for: above `powerMinKw`, up to `powerMaxKw`, speeds both ends included. */
export type LimitSetRange = {
  readonly powerMinKw: number | null;
  readonly powerMaxKw: number | null;
  readonly speedMinRpm: number | null;
  readonly speedMaxRpm: number | null;
  readonly support: Support | 'any';
};

/** One way in which a limit set does not fit a machine, in a sentence with its remedy. */
export type FitWarning = {
  readonly field: 'powerKw' | 'support' | 'speedRpm';
  readonly message: string;
};

/**
 * How a limit set does not fit a machine; empty when it fits. A warning, never a refusal: the set
 * may be used with a reason. Unknown power and unknown support raise no warning.
 *
 * Example: 315 kW under group 2 (above 15 kW to 300 kW) warns about the power.
 */
export function fitWarnings(range: LimitSetRange, machine: MachineFacts): FitWarning[] {
  const warnings: FitWarning[] = [];
  const { powerKw, support, speedRpm } = machine;
  if (powerKw !== null && !coversPower(range, powerKw))
    warnings.push({
      field: 'powerKw',
      message: `The machine has ${String(powerKw)} kW, the limits hold ${powerWords(range)}: choose the set for this power.`,
    });
  if (range.support !== 'any' && support !== 'unknown' && support !== range.support)
    warnings.push({
      field: 'support',
      message: `The machine stands on ${support} support, the limits hold for ${range.support}: choose the set for ${support} support.`,
    });
  if (!coversSpeed(range, speedRpm))
    warnings.push({
      field: 'speedRpm',
      message: `${String(speedRpm)} r/min is outside the speeds the limits hold for: choose a set for this speed.`,
    });
  return warnings;
}

function coversPower({ powerMinKw, powerMaxKw }: LimitSetRange, powerKw: number): boolean {
  return powerKw > (powerMinKw ?? -Infinity) && powerKw <= (powerMaxKw ?? Infinity);
}

function powerWords({ powerMinKw, powerMaxKw }: LimitSetRange): string {
  const above = powerMinKw === null ? '' : `above ${String(powerMinKw)} kW`;
  const upTo = powerMaxKw === null ? '' : `up to ${String(powerMaxKw)} kW`;
  return [above, upTo].filter(Boolean).join(' and ');
}
