/** An influence coefficient of the book, size per kg·mm and turn. */
export type BookCoefficientDto = {
  planeName: string;
  pointLabel: string;
  sizePerKgMm: number;
  deg: number;
};

/** What the book offers instead of trial runs, or in words why it offers nothing. */
export type BookOfferDto =
  | { failure: string; empty: boolean }
  | {
      failure: null;
      grade: 'good' | 'with care';
      speedRpm: number;
      lines: (BookCoefficientDto & {
        count: number;
        spreadPct: number | null;
        converted: boolean;
      })[];
    };

/** Coefficients of the book that this job uses, as they were when a person took them. */
export type ReuseDto = {
  grade: 'good' | 'with care';
  speedRpm: number;
  at: string;
  person: string;
  confirmed: string[];
  reason: string | null;
  lines: BookCoefficientDto[];
};

/** The answer put on the fixed positions of one plane: the best choice for each number of positions. */
export type PlacementDto = {
  planeId: number;
  planeName: string;
  pieceG: number;
  /** So much may remain, g·mm. */
  targetGmm: number;
  failure: string | null;
  choices: {
    weights: { positionId: number; label: string; massG: number }[];
    totalG: number;
    residualGmm: number;
    meetsTarget: boolean;
    /** No other combination of as many positions leaves less. */
    proven: boolean;
    proposed: boolean;
    expected: { label: string; amplitude: number }[];
  }[];
};

/** A trial run against what the book knows of the same plane and point. */
export type TrialComparisonDto = {
  planeName: string;
  pointLabel: string;
  ratio: number;
  turnDeg: number;
  agrees: boolean;
  sensesSuspect: boolean;
};

/** The signed job before this one on the same rotor, and what has happened since. */
export type LastJobDto = {
  id: number;
  number: number;
  closedAt: string;
  before: number | null;
  after: number | null;
  unit: string;
  sameSetup: boolean;
  events: { at: string; kind: string; text: string }[];
};

/** A plane as asked for and as recorded, as one weight at the plane's radius, against rotation. */
export type AsFittedPlane = {
  planeName: string;
  askedG: number;
  askedDeg: number;
  fittedG: number;
  fittedDeg: number;
  isFar: boolean;
};

export type AsFittedDto = {
  planes: AsFittedPlane[];
  /** What the points should read with everything as recorded. */
  expected: { label: string; amplitude: number; lagDeg: number }[];
};

export type TrialProposalDto = {
  planeId: number;
  massG: number;
  basis: string;
  forceN: number;
  forcePctOfLoad: number;
  angleDeg: number;
  expectedChange: number | null;
  /** Where the coefficient book expects the weight to lower the reading; null without a book. */
  loweringDeg: number | null;
};
