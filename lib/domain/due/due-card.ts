import { fail, ok, type Failure, type Result } from '../result';
import type { Criticality, DueMachine, DuePart, DueReading } from './due-machine';
import { expectedGain, type ExpectedGain } from './expected-gain';
import { laneOf, type Lane } from './lane';
import { likelihoodParts } from './likelihood';
import { standingOf, type Standing } from './standing';
import { urgencyParts } from './urgency';

/** Weights of the five parts of the urgency; they sum to 1. */
export type DueWeights = Readonly<
  Record<'severity' | 'time left' | 'growth' | 'consequence' | 'balance age', number>
>;

/** The weights a site starts with. */
export const DUE_WEIGHTS: DueWeights = {
  severity: 0.35,
  'time left': 0.25,
  growth: 0.15,
  consequence: 0.2,
  'balance age': 0.05,
};

/** One machine on the Due board, with its working. */
export type DueCard = {
  readonly tag: string;
  readonly criticality: Criticality;
  readonly lane: Lane;
  /** 0 to 100: `100·likelihood·urgency`. */
  readonly score: number;
  /** L, 0 to 1: how much speaks for unbalance. */
  readonly likelihood: number;
  /** The bracket, 0 to 1: how soon something should happen. */
  readonly urgency: number;
  /** The nine parts, likelihood first. */
  readonly parts: readonly DuePart[];
  readonly standing: Standing;
  /** If the 1x falls to a quarter; null where no 1x is known. */
  readonly gain: ExpectedGain | null;
  /** 'old reading': ranked, but a fresh reading comes before a place in a stop. */
  readonly mark: 'fresh' | 'old reading';
  /** Three balances in a year ask why. */
  readonly asksWhy: boolean;
  readonly daysSinceBalance: number | null;
  readonly reasons: readonly string[];
};

const OLD_AFTER_DAYS = 45;
const OFTEN_BALANCED = 3;

/**
 * What ranks a machine on the Due board:
 * `score = 100·L·(0.35 Z + 0.25 T + 0.15 G + 0.20 C + 0.05 A)`, `L = L_share·L_phase·L_direction·L_hv`.
 * Two separate questions, is it unbalance and how soon, are multiplied, so that nothing urgent that is
 * not unbalance climbs the rebalance lane. Values in mm/s rms. Fails without readings and where a
 * reading is not a number. The formula is this register's own, on zones and the change rule of
 * ISO 20816-1.
 *
 * Example: L 1 with Z 0.547, T 0.598, G 0.70, C 0.7, A 0.70 scores 62.1.
 */
export function dueCard(
  machine: DueMachine,
  weights: DueWeights = DUE_WEIGHTS,
): Result<DueCard, Failure<'NO_READINGS' | 'NOT_FINITE'>> {
  if (!machine.readings.every(isSound))
    return fail('NOT_FINITE', 'A reading has no number in it: line it through or correct it.');
  const standing = standingOf(machine);
  if (standing === null)
    return fail('NO_READINGS', 'Nothing is measured yet: take a reading first.');
  const forUnbalance = likelihoodParts(machine, standing);
  const forUrgency = urgencyParts(machine, standing);
  const likelihood = forUnbalance.reduce((product, { value }) => product * value, 1);
  const urgency = weighted(forUrgency, weights);
  const parts = [...forUnbalance, ...forUrgency];
  const mark =
    machine.readingAgeDays > OLD_AFTER_DAYS || !standing.isSinceBreak ? 'old reading' : 'fresh';
  return ok({
    tag: machine.tag,
    criticality: machine.criticality,
    lane: laneOf({
      zone: standing.zone,
      likelihood,
      severity: partValue(forUrgency, 'severity'),
      timeLeft: partValue(forUrgency, 'time left'),
      isBlocked: machine.blockingFindings.length > 0,
    }),
    score: 100 * likelihood * urgency,
    likelihood,
    urgency,
    parts,
    standing,
    gain: gainOf(machine, standing),
    mark,
    asksWhy: machine.balancesInYear >= OFTEN_BALANCED,
    daysSinceBalance: machine.daysSinceBalance,
    reasons: [...noteworthy(machine, standing), ...parts.map(({ because }) => because)],
  });
}

function isSound({ day, value, oneX }: DueReading): boolean {
  return Number.isFinite(day) && isSize(value) && (oneX === null || isSize(oneX));
}

function isSize(value: number): boolean {
  return value >= 0 && value < Infinity;
}

function weighted(parts: readonly DuePart[], weights: DueWeights): number {
  const byKey: Readonly<Partial<Record<DuePart['key'], number>>> = weights;
  return parts.reduce((total, { key, value }) => total + (byKey[key] ?? 0) * value, 0);
}

function partValue(parts: readonly DuePart[], key: DuePart['key']): number {
  return parts.find((part) => part.key === key)?.value ?? 0;
}

function gainOf({ boundaries }: DueMachine, { latest }: Standing): ExpectedGain | null {
  return latest.oneX === null ? null : expectedGain(latest.value, latest.oneX, boundaries);
}

function noteworthy(machine: DueMachine, { isSinceBreak, step }: Standing): string[] {
  const notes = machine.blockingFindings.map((finding) => `Open finding: ${finding}.`);
  if (!isSinceBreak)
    notes.push('No reading since the last event on the machine: take a reading first.');
  else if (machine.readingAgeDays > OLD_AFTER_DAYS)
    notes.push(
      `The last reading is ${String(Math.round(machine.readingAgeDays))} days old: take a reading first.`,
    );
  if (step !== null) notes.push('The trend has a step: enter the event behind it.');
  if (machine.balancesInYear >= OFTEN_BALANCED)
    notes.push(`Balanced ${String(machine.balancesInYear)} times in 12 months: ask why.`);
  return notes;
}
