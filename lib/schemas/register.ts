import type { LedgerWeightDto, PlaneDto, SetupDto } from './balance-job';

export type ZoneLetter = 'A' | 'B' | 'C' | 'D';

export type PlantBookRow = {
  id: number;
  tag: string;
  name: string;
  siteId: number;
  siteName: string;
  areaName: string;
  kind: string;
  nominalSpeedRpm: number;
  criticality: 'A' | 'B' | 'C' | 'D';
  state: 'active' | 'retired';
  zone: ZoneLetter | null;
  worstPoint: string | null;
  overall: number | null;
  oneX: number | null;
  readAt: string | null;
  balancedAt: string | null;
};

export type PlantBookDto = {
  rows: PlantBookRow[];
  /** All machines of the sites, before text and area narrowed them. */
  all: number;
  areas: { siteName: string; areaName: string; machines: number }[];
};

export type PointStanding = {
  id: number;
  label: string;
  bearingId: number;
  direction: string;
  overall: number | null;
  zone: ZoneLetter | null;
  readAt: string | null;
  recordId: number | null;
  oneX: number | null;
  lagDeg: number | null;
};

export type BearingDto = {
  id: number;
  label: string;
  place: 'driver' | 'driven' | 'gear';
  type: string | null;
};

export type LedgerPlane = PlaneDto & {
  weights: LedgerWeightDto[];
  sum: { unbalanceGmm: number; angleDeg: number; equivalentMassG: number; cleanUp: boolean } | null;
};

export type CoefficientLine = {
  planeName: string;
  pointLabel: string;
  unit: string;
  speedRpm: number;
  sizePerKgMm: number;
  deg: number;
  count: number;
  spreadPct: number | null;
  grade: 'good' | 'with care' | 'not for reuse';
};

export type MachinePageDto = {
  id: number;
  tag: string;
  name: string;
  aliases: string[];
  kind: string;
  state: 'active' | 'retired';
  retiredReason: string | null;
  site: { id: number; name: string; timeZone: string; decimalMark: '.' | ',' };
  areaName: string;
  powerKw: number | null;
  speedMinRpm: number;
  speedMaxRpm: number;
  nominalSpeedRpm: number;
  drive: 'direct' | 'belt' | 'gear' | 'variable speed';
  criticality: string;
  support: string;
  missing: string[];
  worst: { pointId: number; label: string; zone: ZoneLetter | null; overall: number } | null;
  balancedAt: string | null;
  bearings: BearingDto[];
  points: PointStanding[];
  rotor: {
    name: string;
    serial: string;
    massKg: number | null;
    balanceGrade: number | null;
    overhung: boolean;
  } | null;
  planes: LedgerPlane[];
  coefficients: CoefficientLine[];
  jobs: {
    id: number;
    number: number;
    kind: string;
    state: string;
    openedAt: string;
    closedAt: string | null;
  }[];
  events: {
    id: number;
    at: string;
    kind: string;
    text: string;
    person: string;
    balanceJobId: number | null;
  }[];
  setups: (SetupDto & { reason: string; validFrom: string; validTo: string | null })[];
  limits: {
    title: string;
    edition: string;
    citation: string;
    bAb: number;
    bBc: number;
    bCd: number;
    reason: string;
  } | null;
};

export type PointPageDto = {
  id: number;
  label: string;
  bearing: string;
  direction: string;
  mounting: string | null;
  machine: { id: number; tag: string; name: string };
  site: { name: string; timeZone: string; decimalMark: '.' | ',' };
  records: {
    id: number;
    takenAt: string;
    state: 'kept' | 'held' | 'lined through';
    source: 'waveform' | 'typed';
    overall: number | null;
    zone: ZoneLetter | null;
    oneX: number | null;
    lagDeg: number | null;
    speedRpm: number | null;
  }[];
};

export type PointTrendDto = {
  overall: { at: string; value: number; recordId: number }[];
  oneX: { at: string; value: number; lagDeg: number | null; recordId: number }[];
  limits: { label: string; value: number }[];
  events: { id: string; at: string; label: string; jobId: number | null; breaksTrend: boolean }[];
};

export type MachineFormDto = {
  id: number;
  tag: string;
  name: string;
  kind: string;
  powerKw: number | null;
  speedMinRpm: number;
  speedMaxRpm: number;
  nominalSpeedRpm: number;
  drive: string;
  lineHz: number;
  criticality: string;
  support: string;
  areaName: string;
  state: 'active' | 'retired';
};

export type NewMachineDto = {
  sites: { id: number; name: string }[];
  areas: { siteId: number; name: string }[];
  limitSets: { id: number; label: string }[];
};
