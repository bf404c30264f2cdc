import type { CurveDto, Reason, ZoneLetter } from './in-tray';

export type RecordState = 'kept' | 'held' | 'lined through';
export type PlaceDto = { pointId: number; label: string; machineId: number; machineTag: string };

export type ReadingValueDto = {
  kind: string;
  value: number;
  unit: string;
  bandLowHz: number | null;
  bandHighHz: number | null;
  zone: ZoneLetter | null;
  limits: { title: string; edition: string; bAb: number; bBc: number; bCd: number } | null;
};

export type OrderDto = {
  order: number;
  frequencyHz: number;
  amplitudeRmsMmS: number;
  lagDeg: number | null;
};

/** How the values of a record were made. */
export type MethodDto = {
  method: string;
  madeAt: string;
  blockLength: number;
  averages: number;
  dfHz: number;
  enbwBins: number;
  band: { lowHz: number; highHz: number };
  speedRpm: number | null;
  speedSource: 'tacho' | 'spectrum' | 'stated' | null;
  speedSpreadPct: number | null;
  turns: number | null;
  tachoRepair: string | null;
  tachoFault: string | null;
  oneXShare: number | null;
  orders: OrderDto[];
};

export type ReadingPageDto = {
  recordId: number;
  state: RecordState;
  source: 'waveform' | 'typed';
  reasons: Reason[];
  decisionReason: string | null;
  note: string | null;
  takenAt: string;
  createdAt: string;
  person: string;
  statedSpeedRpm: number | null;
  site: {
    id: number;
    name: string;
    timeZone: string;
    decimalMark: '.' | ',';
    phaseShown: 'lag' | 'lead';
  };
  machineName: string;
  place: PlaceDto;
  /** Where it was said to be taken, if it counts for another point now. */
  declared: PlaceDto | null;
  upload: { id: number; fileName: string; sizeBytes: number; sha256: string } | null;
  /** The record this one corrects, and the one that corrects it. */
  supersedesId: number | null;
  correctedById: number | null;
  waveform: {
    sampleRateHz: number;
    sampleCount: number;
    durationS: number;
    quantity: 'acceleration' | 'velocity' | 'displacement';
    /** As received, and as shown. */
    receivedUnit: string;
    shownUnit: string;
    withTacho: boolean;
  } | null;
  values: ReadingValueDto[];
  vector: {
    amplitude: number;
    unit: string;
    lagDeg: number | null;
    speedRpm: number;
    scatter: number | null;
    setupNumber: number | null;
  } | null;
  made: MethodDto | null;
  /** Calculated defect frequencies of the bearing at the record's speed. */
  marks: { label: string; frequencyHz: number }[];
  /** For a held record: points whose last record resembles it, nearest first. */
  suggestions: { pointId: number; label: string; distanceDb: number }[];
  /** Where it may be moved to; given where somebody may still move it. */
  points: { id: number; label: string; machine: string }[];
  earlierId: number | null;
  laterId: number | null;
};

/** A stretch of a record for the screen. */
export type WaveformDataDto = CurveDto & { unit: string; durationS: number; turns: number[] };

export type SpectrumKind = 'velocity' | 'acceleration' | 'envelope';

/** Lines of a spectrum for the screen, peaks kept. */
export type SpectrumDataDto = {
  kind: SpectrumKind;
  unit: string;
  hz: number[];
  values: number[];
  dfHz: number;
  /** “Hann, 1 block of 16384 samples, line spacing 0.781 Hz”. */
  settings: { blockLength: number; averages: number; lowHz: number; highHz: number };
};
