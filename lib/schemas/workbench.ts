import type { PositionShare } from '@/lib/domain/balancing/split-onto-positions';
import type { AnswerDto, TrialCheck } from './balance-job';

/** What typed runs come to. */
export type SolvedRuns = {
  unit: 'mm/s rms' | 'µm p-p';
  rotationFromDriveEnd: 'clockwise' | 'counter-clockwise';
  /** How degrees were typed; every angle here counts against rotation. */
  angleSense: 'against' | 'with';
  planes: { id: number; name: string; radiusMm: number }[];
  points: { id: number; label: string }[];
  /** Null where nothing may be fitted; `refusal` says why. */
  answer: AnswerDto | null;
  refusal: string | null;
  /** How clearly each trial weight was heard. */
  trialChecks: TrialCheck[];
  /** Force of each plane's weight at the speed of the runs, % of the rotor's weight; null without its mass. */
  forcePctOfRotorWeight: (number | null)[];
  /** Trial weights that stay on the rotor. */
  staying: { planeId: number; massG: number; angleDeg: number }[];
  /** The readings of each point, run after run, in lag. */
  walks: { label: string; amplitude: number; lagDeg: number }[][];
};

export type SolvedTolerance = {
  gradeMmS: number;
  specificUm: number;
  totalGmm: number;
  /** At the bearings, where the geometry is given. */
  bearings:
    | { name: 'A' | 'B'; permissibleGmm: number; residualGmm: number | null; met: boolean | null }[]
    | null;
  isOverhung: boolean;
};

export type SolvedSplit = {
  /** `forceN`: at the speed typed; null without one. */
  shares: (PositionShare & { forceN: number | null })[];
  /** How degrees were typed; every angle here counts against rotation. */
  angleSense: 'against' | 'with';
  /** The weight as it was split, against rotation. */
  massG: number;
  angleDeg: number;
  /** Sum of the shares over the weight: never below 1. */
  sumOverWhole: number;
  radiusMm: number;
  rotationFromDriveEnd: 'clockwise' | 'counter-clockwise';
  positions: { label: string; angleDeg: number }[];
};
