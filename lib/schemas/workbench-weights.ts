import type { TrialProposal } from '@/lib/domain/balancing/trial-proposal';
import type { PhaselessAnswer } from '@/lib/domain/balancing/without-phase';
import type { SixPlaceResult } from '@/lib/domain/balancing/six-place-check';

/** How degrees were typed; every angle of a result counts against rotation. */
type Counted = { angleSense: 'against' | 'with' };

export type SolvedTrialWeight = TrialProposal & { radiusMm: number; speedRpm: number };

export type SolvedWithoutPhase = Counted &
  PhaselessAnswer & {
    unit: 'mm/s rms' | 'µm p-p';
    radiusMm: number;
    rotationFromDriveEnd: 'clockwise' | 'counter-clockwise';
    runs: { angleDeg: number; amplitude: number; fitted: number }[];
  };

export type SolvedSixPlaces = Counted & SixPlaceResult & { knownGmm: number };

export type SolvedPieces = Counted & {
  massG: number;
  angleDeg: number;
  radiusMm: number;
  rotationFromDriveEnd: 'clockwise' | 'counter-clockwise';
  positions: { label: string; angleDeg: number }[];
  choices: {
    weights: { label: string; massG: number; angleDeg: number }[];
    totalG: number;
    residualGmm: number;
    meetsTarget: boolean;
    proven: boolean;
    proposed: boolean;
  }[];
};

export type SolvedCombined = Counted & {
  unbalanceGmm: number;
  angleDeg: number;
  radiusMm: number;
  massG: number;
  /** Sum of the masses over the one mass: above 3 a clean-up saves weight. */
  sumOverOne: number | null;
};

export type SolvedRows = {
  planes: { name: string; unbalanceGmm: number; angleDeg: number; atLimit: boolean }[];
  /** What every row shows then, and before. */
  rows: { label: string; before: number; after: number }[];
  rmsBefore: number;
  rmsAfter: number;
  /** No correction within the limits can have less. */
  rmsAtLeast: number;
  condition: { number: number; verdict: 'good' | 'caution' | 'withhold' };
  /** The same without limits; null where no limit holds it back. */
  unlimited: { name: string; unbalanceGmm: number; angleDeg: number }[] | null;
};
