import type { Sense } from '../domain/drawing/face-view';
import type { NamedPosition } from '../domain/drawing/rotor-place';
import type { DecimalMark } from '../format';

/** Text of a cell; with an address where the screen leads somewhere. */
export type ReportCell = string | { text: string; href: string };

export type ReportColumn = { label: string; numeric?: boolean };

/** A struck row stays readable: it was lined through. */
export type ReportRow = { cells: ReportCell[]; struck?: boolean };

export type ReportTable = {
  kind: 'table';
  caption: string;
  columns: ReportColumn[];
  rows: ReportRow[];
};

export type ReportFact = { label: string; value: string };

export type ReportWeight = {
  id: number;
  massG: number;
  /** Degrees against rotation from the mark. */
  angleDeg: number;
  label: string;
  state: 'on' | 'trial' | 'removed';
};

/** One plane with what hangs on it. */
export type ReportFace = {
  plane: {
    name: string;
    radiusMm: number;
    rotationFromDriveEnd: Sense;
    positions?: NamedPosition[];
    markLabel: string;
    decimalMark: DecimalMark;
  };
  weights: ReportWeight[];
};

export type ReportStep = {
  id: number;
  label: string;
  purpose: 'base' | 'trial' | 'check';
  amplitude: number;
  lagDeg: number;
};

/** The 1x vector of one point from the first run to the last. */
export type ReportWalk = {
  title: string;
  unit: string;
  counts: Sense;
  decimalMark: DecimalMark;
  steps: ReportStep[];
};

/** A photo that was kept with the job; the hash tells that it is still the same picture. */
export type ReportPhoto = {
  id: number;
  widthPx: number;
  heightPx: number;
  caption: string;
  sha256: string;
};

export type ReportBlock =
  | ReportTable
  | { kind: 'facts'; facts: ReportFact[] }
  | { kind: 'text'; text: string; look: 'plain' | 'quiet' | 'strong' }
  | { kind: 'faces'; faces: ReportFace[] }
  | { kind: 'walks'; walks: ReportWalk[] }
  | { kind: 'photos'; photos: ReportPhoto[] };

export type ReportSection = { title: string; note?: string; blocks: ReportBlock[] };

/**
 * A report as plain data: every number is formatted already, so that screen, print and PDF say the same
 * to the last digit.
 */
export type Report = {
  title: string;
  /** Short, for the head of each page: “KX-2 · job 4”. */
  about: string;
  /** “revision 2”, or that it is a draft. */
  revision: string;
  isDraft: boolean;
  contentHash: string | null;
  /** How angles and phase are meant; stands on every page. */
  convention: string;
  /** “printed 3 Feb 2026, 14:05 CET by Nora Field”. */
  made: string;
  decimalMark: DecimalMark;
  sections: ReportSection[];
};
