import { TRIAL_STAYED, type SlipHypothesis } from '../balancing/slip-hypotheses';
import { normaliseDeg } from '../units';

/** The slips that a person can confirm, after which the records are put right. */
export const SLIPS = [
  'angles counted with rotation',
  'lead read as lag',
  'fitted 180° off',
  'not fitted',
  'planes swapped',
  'channels swapped',
  'trial left on',
  ...TRIAL_STAYED,
  'earlier weight gone',
  'mass ten times too small',
  'mass ten times too large',
  'one position further',
  'one position back',
] as const satisfies readonly SlipHypothesis['slip'][];

export type Slip = (typeof SLIPS)[number];

/** Whether a slip can be confirmed. Example: `isSlip('as entered')` is false. */
export function isSlip(slip: SlipHypothesis['slip']): slip is Slip {
  return SLIPS.some((candidate) => candidate === slip);
}

/** What a ledger entry says of a weight. */
export type WeightFacts = {
  readonly planeId: number;
  readonly massG: number;
  readonly radiusMm: number;
  readonly angleDeg: number;
};

/** What is known beside the slip. */
export type SlipFacts = {
  readonly planeIds: readonly number[];
  readonly pitchDeg: number | null;
};

/** How the records change once a slip is confirmed; nothing is edited, newer records replace. */
export type SlipRepair = {
  /** Which weights: all of the job, those fitted for the check run, or none. */
  readonly weights: 'all' | 'fitted' | 'none';
  /** What a weight really was; null where it never was on the rotor. */
  readonly weight: (facts: WeightFacts) => WeightFacts | null;
  /** Lead was read as lag in every run; or two points were swapped in the check run. */
  readonly vectors: 'as entered' | 'mirrored' | 'points swapped';
  /** Trial weights recorded as taken off were on in the check run. */
  readonly trialsOn: boolean;
  /** Of those trial weights, by the order of their runs, the one that was on in every run after its own. */
  readonly stayedTrial: number | null;
  /** The job's earlier weights were gone in the check run. */
  readonly earlierGone: boolean;
};

const NOTHING: SlipRepair = {
  weights: 'none',
  weight: (facts) => facts,
  vectors: 'as entered',
  trialsOn: false,
  stayedTrial: null,
  earlierGone: false,
};

/**
 * What must be recorded anew where a person confirms a slip. After the repair the runs as recorded miss the
 * prediction by exactly what the slip test said.
 *
 * @param slip the slip confirmed; angles in degrees against rotation, masses in g
 * Source: list of common slips from practice.
 * Example: 'angles counted with rotation' turns a weight at 75° into one at 285°, in every run.
 */
export function slipRepair(slip: Slip, { planeIds, pitchDeg }: SlipFacts): SlipRepair {
  const fitted = (weight: SlipRepair['weight']): SlipRepair => ({
    ...NOTHING,
    weights: 'fitted',
    weight,
  });
  const turned = (deg: number) =>
    fitted((facts) => ({ ...facts, angleDeg: normaliseDeg(facts.angleDeg + deg) }));
  const massTimes = (factor: number) =>
    fitted((facts) => ({ ...facts, massG: facts.massG * factor }));
  const repairs: Record<Slip, () => SlipRepair> = {
    'angles counted with rotation': () => ({
      ...NOTHING,
      weights: 'all',
      weight: (facts) => ({ ...facts, angleDeg: normaliseDeg(-facts.angleDeg) }),
    }),
    'lead read as lag': () => ({ ...NOTHING, vectors: 'mirrored' }),
    'fitted 180° off': () => turned(180),
    'not fitted': () => fitted(() => null),
    'planes swapped': () =>
      fitted((facts) => ({ ...facts, planeId: otherOf(planeIds, facts.planeId) })),
    'channels swapped': () => ({ ...NOTHING, vectors: 'points swapped' }),
    'trial left on': () => ({ ...NOTHING, trialsOn: true }),
    'first trial stayed on': () => ({ ...NOTHING, stayedTrial: 0 }),
    'second trial stayed on': () => ({ ...NOTHING, stayedTrial: 1 }),
    'third trial stayed on': () => ({ ...NOTHING, stayedTrial: 2 }),
    'earlier weight gone': () => ({ ...NOTHING, earlierGone: true }),
    'mass ten times too small': () => massTimes(1 / 10),
    'mass ten times too large': () => massTimes(10),
    'one position further': () => turned(pitchDeg ?? 0),
    'one position back': () => turned(-(pitchDeg ?? 0)),
  };
  return repairs[slip]();
}

/** The other of two. Example: of [1, 2] other than 1 it is 2. */
export function otherOf(ids: readonly number[], id: number): number {
  return ids.find((candidate) => candidate !== id) ?? id;
}
