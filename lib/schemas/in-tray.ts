import type { DelimiterName } from './upload-input';

export type UploadState = 'waiting' | 'held' | 'kept' | 'withdrawn';
export type ZoneLetter = 'A' | 'B' | 'C' | 'D';
export type Reason = { code: string; message: string };

/** Which uploads a list shows. */
export type InTrayFilter = { state: UploadState | 'open' | 'all' };

/** One file of the in-tray with the record made of it, if there is one. */
export type InTrayRow = {
  uploadId: number;
  fileName: string;
  sizeBytes: number;
  at: string;
  person: string;
  state: UploadState;
  site: { id: number; name: string; timeZone: string };
  point: { id: number; label: string; machineId: number; machineTag: string } | null;
  record: {
    id: number;
    takenAt: string;
    reasons: Reason[];
    overallMmS: number | null;
    zone: ZoneLetter | null;
  } | null;
  /** Why a waiting file cannot be read as proposed. */
  problem: string | null;
  /** What a person must still say about a waiting file. */
  questions: string[];
};

export type InTrayDto = {
  rows: InTrayRow[];
  counts: Record<UploadState, number>;
  /** How many uploads the filter has; the rows are the first of them. */
  found: number;
};

export type ColumnDto = {
  index: number;
  name: string;
  role: 'time' | 'signal' | 'tacho' | 'ignore';
  unit: 'g' | 'm/s2' | 'mm/s' | 'in/s' | 'um' | 'mil' | 's' | 'ms' | 'us' | null;
};

export type LayoutDto = {
  delimiter: DelimiterName;
  decimalMark: 'point' | 'comma' | null;
  encoding: string;
  headerRow: boolean;
  columns: ColumnDto[];
  sampleRateHz: number | null;
  speedRpm: number | null;
};

/** A reduced curve of a record, extremes kept. */
export type CurveDto = { seconds: number[]; values: number[]; sampleCount: number };

export type PlotDto = CurveDto & {
  quantity: 'acceleration' | 'velocity' | 'displacement';
  unit: string;
  sampleRateHz: number;
  rateSource: 'time column' | 'stated';
  durationS: number;
  /** Instants of the tacho's edges, s; none without a tacho. */
  turns: number[];
  doubts: string[];
};

/** How a file reads with a layout: what the preview shows. */
export type PreviewDto = {
  layout: LayoutDto;
  questions: { message: string; field: string; blocking: boolean }[];
  rows: { row: number; cells: string[] }[];
  /** The sentence that stops it from being read, if one does. */
  problem: string | null;
  plot: PlotDto | null;
};

export type PointChoice = { id: number; label: string; machine: string };

export type UploadPageDto = {
  upload: {
    id: number;
    fileName: string;
    sizeBytes: number;
    at: string;
    person: string;
    state: UploadState;
    site: { id: number; name: string; timeZone: string; decimalMark: '.' | ',' };
    pointId: number | null;
    recordId: number | null;
  };
  /** The saved layout it is read by, “Analyser X, version 2”. */
  layoutName: string | null;
  preview: PreviewDto;
  points: PointChoice[];
  /** The point whose names stand in the file's name, where only one does. */
  suggestedPointId: number | null;
};

/** What became of one file that was dropped. */
export type UploadOutcome = {
  fileName: string;
  received: {
    uploadId: number;
    questions: string[];
    problem: string | null;
    layoutName: string | null;
  } | null;
  /** Why it was refused, with the address of the file that is here already where that is why. */
  refusal: { message: string; link: string | null } | null;
};

/** A point files may be dropped for, with its site. */
export type DropPoint = PointChoice & { siteId: number };
