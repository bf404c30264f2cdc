import type { DecimalMark } from '@/lib/format';

/** Said above every chart: quantity, unit with detection, point, date. */
export type ChartTitle = {
  /** “Overall velocity”. */
  quantity: string;
  /** “mm/s rms”. */
  unit: string;
  /** “KX-2, bearing A horizontal”. */
  point: string;
  /** “3 Feb 2026, 14:05 CET”, or the period. */
  date?: string;
  /** Of the site; a point where left out. */
  decimalMark?: DecimalMark;
};

/** The stretch of the x axis in sight. */
export type ChartRange = { from: number; to: number };

export type Cell = string | number | null;

/** The numbers behind a chart; made only when a person asks for them. */
export type Numbers = {
  fileName: string;
  head: readonly string[];
  rows: () => readonly (readonly Cell[])[];
};

/** Plot area inside the drawing, in pixels. */
export type PlotBox = {
  left: number;
  top: number;
  width: number;
  height: number;
};

export function titleText({ quantity, unit, point, date }: ChartTitle): string {
  return [`${quantity}, ${unit}`, point, date].filter(Boolean).join(' · ');
}
