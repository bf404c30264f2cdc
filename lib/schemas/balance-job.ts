import type {
  AsFittedDto,
  BookOfferDto,
  LastJobDto,
  PlacementDto,
  ReuseDto,
  TrialComparisonDto,
  TrialProposalDto,
} from './balance-job-parts';
import type { Step } from '@/lib/domain/balance-job/next-step';
import type { RepeatTest } from '@/lib/domain/balancing/repeat-test';
import type { SlipTest } from '@/lib/domain/balancing/slip-tests';
import type { FitEvidence } from './fit-evidence';

export type JobState =
  'opened' | 'base taken' | 'answered' | 'signed' | 'stopped safe' | 'not a balance job';

export type JobListRow = {
  id: number;
  number: number;
  siteName: string;
  machineId: number;
  machineTag: string;
  machineName: string;
  kind: string;
  state: JobState;
  openedAt: string;
  openedBy: string;
  closedAt: string | null;
  /** Largest 1x of the first base run and of the last run, in the job's unit. */
  before: number | null;
  after: number | null;
  unit: string;
};

export type PositionDto = { id: number; label: string; angleDeg: number; maxG: number | null };

export type PlaneDto = {
  id: number;
  name: string;
  radiusMm: number;
  fromAM: number | null;
  kind: 'free' | 'fixed positions';
  maxGTotal: number | null;
  pieceG: number | null;
  positions: PositionDto[];
};

export type PointDto = { id: number; label: string; bearing: string; direction: string };

export type SetupDto = {
  number: number;
  mark: string;
  tachoDeg: number;
  tachoEdge: string;
  rotationFromDriveEnd: 'clockwise' | 'counter-clockwise';
};

export type NewJobDto = {
  machine: { id: number; tag: string; name: string; confinedSpace: boolean };
  rotorName: string;
  setup: SetupDto;
  planes: PlaneDto[];
  points: PointDto[];
  ledger: LedgerWeightDto[];
  openJobId: number | null;
  estimates: number;
};

export type LedgerWeightDto = {
  id: number;
  planeId: number;
  planeName: string;
  positionLabel: string | null;
  massG: number;
  massSource: 'scale' | 'nominal';
  radiusMm: number;
  angleDeg: number;
  purpose: 'trial' | 'correction' | 'found';
  fixing: string;
  permanent: boolean;
  fittedAt: string;
  fittedBy: string;
  stays: boolean | null;
  endedAt: string | null;
  ending: string | null;
  endReason: string | null;
  endedBy: string | null;
  enteredAngleDeg: number;
  enteredSense: 'against' | 'with';
} & FitEvidence;

export type RunVectorDto = {
  pointId: number;
  amplitude: number;
  lagDeg: number;
  overall: number | null;
  entered: { amplitude: number; unit: string; phaseDeg: number; phaseSense: string } | null;
  recordId: number | null;
};

export type RunDto = {
  id: number;
  number: number;
  purpose: 'base' | 'trial' | 'check';
  takenAt: string;
  speedRpm: number;
  state: 'kept' | 'held' | 'lined through';
  stateReason: string | null;
  /** Number of the run that this one corrects; null for a run that was made. */
  corrects: number | null;
  person: string;
  vectors: RunVectorDto[];
  /** Ids of the job's weights that were on the rotor. */
  weightIds: number[];
};

export type VectorChoice = { recordId: number; takenAt: string; amplitude: number; lagDeg: number };

export type PointPrediction = {
  pointId: number;
  label: string;
  amplitude: number;
  lagDeg: number;
  /** Radius within which the check run should come out; null where the scatter is not known. */
  band: number | null;
};

export type PlaneAnswer = {
  planeId: number;
  planeName: string;
  radiusMm: number;
  massG: number;
  angleDeg: number;
  unbalanceGmm: number;
  forceN: number;
  uncertaintyG: number | null;
  uncertaintyDeg: number | null;
  totalMassG: number;
  totalAngleDeg: number;
};

export type AnswerDto = {
  kind: 'correction' | 'trim';
  method: string;
  fingerprint: string;
  planes: PlaneAnswer[];
  predicted: PointPrediction[];
  condition: { number: number; verdict: 'good' | 'caution' | 'withhold' };
  /** True where the exact answer is withheld and the planes carry equal weights instead. */
  staticPair: boolean;
  coefficients: {
    planeId: number;
    pointId: number;
    sizePerKgMm: number;
    deg: number;
    rePerGmm: number;
    imPerGmm: number;
  }[];
  misfit: number;
  parts: {
    static: { massG: number; angleDeg: number };
    couple: { massG: number; angleDeg: number };
  } | null;
  warnings: string[];
};

export type TrialCheck = {
  planeId: number;
  planeName: string;
  pointLabel: string;
  changePct: number;
  changeOverNoise: number | null;
  verdict: 'refuse' | 'wide' | 'good' | 'unknown';
  thirtyRule: boolean;
};

export type ToleranceDto = {
  grade: number;
  permissibleGmm: number;
  planes: {
    name: string;
    permissibleGmm: number;
    residualGmm: number;
    residualDeg: number;
    uncertaintyGmm: number | null;
    verdict: string;
  }[];
};

export type CheckVerdict = {
  runId: number;
  points: {
    pointId: number;
    label: string;
    before: number;
    now: number;
    lagDeg: number;
    predicted: { amplitude: number; lagDeg: number } | null;
    /** Size of the difference vector between what was predicted and what was read. */
    miss: number | null;
    band: number | null;
    reductionPct: number;
  }[];
};

/** One slip supposed, and how far the check run would be from what it makes expected. */
export type SlipExplanation = Pick<SlipTest, 'slip' | 'words' | 'miss' | 'inside'> & {
  /** A person may say that this is what happened. */
  confirmable: boolean;
};

export type BalanceJobDto = {
  id: number;
  number: number;
  state: JobState;
  kind: string;
  unit: 'mm/s rms' | 'µm p-p';
  phaseSense: 'lag' | 'lead';
  angleSense: 'against' | 'with';
  reason: string;
  targets: { oneX: number | null; zone: 'A' | 'B' | null; grade: boolean };
  startsAllowed: number | null;
  /** Starts that the job needs at least: base, trials, check, trim. */
  startsPlanned: number;
  cleaned: 'yes' | 'no' | 'cannot be' | null;
  /** Machines of the same area whose speed is so near that the readings can beat. */
  neighbours: { tag: string; speedRpm: number }[];
  lastJob: LastJobDto | null;
  /** The base is in zone D: a trial weight needs the consent of an engineer. */
  needsConsent: boolean;
  openedAt: string;
  openedBy: string;
  closedAt: string | null;
  closingNote: string | null;
  site: { id: number; name: string; timeZone: string; decimalMark: '.' | ',' };
  machine: { id: number; tag: string; name: string; nominalSpeedRpm: number };
  rotor: { name: string; massKg: number | null; grade: number | null; behaviour: string };
  setup: SetupDto;
  limits: {
    title: string;
    edition: string;
    /** Of the boundaries; records signed early do not carry it and were judged in mm/s rms. */
    unit?: string;
    bAb: number;
    bBc: number;
    bCd: number;
  } | null;
  planes: PlaneDto[];
  points: PointDto[];
  runs: RunDto[];
  /** Weights fitted in this job, in the order fitted. */
  weights: LedgerWeightDto[];
  /** Weights from before this job: those on the rotor, and those that came off during the job. */
  olderWeights: LedgerWeightDto[];
  /** Recent 1x vectors with phase from uploads, by point. */
  choices: { pointId: number; vectors: VectorChoice[] }[];
  step: Step;
  repeats: { pointId: number; test: RepeatTest | null }[];
  trialProposal: TrialProposalDto | null;
  trialChecks: TrialCheck[];
  book: BookOfferDto | null;
  reuse: ReuseDto | null;
  trialsAgainstBook: TrialComparisonDto[];
  accepted: (AnswerDto & { number: number; acceptedAt: string; acceptedBy: string })[];
  /** What the arithmetic says now: an answer to accept, or why there is none. */
  answer: AnswerDto | null;
  answerFailure: string | null;
  /** The answer on the fixed positions of its planes; empty where planes are free. */
  placements: PlacementDto[];
  /** Between fitting and the check run: what was recorded beside what was asked for. */
  asFitted: AsFittedDto | null;
  check: CheckVerdict | null;
  /** What may have gone wrong, best explanation first; empty where the check run was as predicted. */
  slips: SlipExplanation[];
  tolerance: ToleranceDto | null;
  signOffs: {
    personName: string;
    role: string;
    statement: string;
    at: string;
    contentHash: string;
  }[];
};
