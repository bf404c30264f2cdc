import type { VibrationQuantity } from '../signal/quantity';

/** What separates columns; null for a file of one column. */
export type Delimiter = ',' | ';' | '\t' | null;
/** The decimal mark of a whole file; never decided value by value. */
export type DecimalMark = 'point' | 'comma';
/** How the bytes of a file spell text. */
export type TextEncoding = 'utf-8' | 'utf-16le' | 'utf-16be' | 'latin-1';
/** Units a signal column may come in. */
export type SignalUnit = 'g' | 'm/s2' | 'mm/s' | 'in/s' | 'um' | 'mil';
/** Units a time column may come in. */
export type TimeUnit = 's' | 'ms' | 'us';

/** One column of a file and what it is read as; `index` counts from 0. */
export type LayoutColumn = {
  readonly index: number;
  readonly role: 'time' | 'signal' | 'tacho' | 'ignore';
  readonly name: string;
  readonly quantity: VibrationQuantity | null;
  readonly unit: SignalUnit | TimeUnit | null;
};

/**
 * How a file's columns are read, confirmed by a person and kept under a name. Plain data. A null
 * `decimalMark`, or a signal column without quantity and unit, is undecided and cannot be read yet.
 * `sampleRateHz` and `speedRpm` belong to the file at hand, not to its shape.
 */
export type ColumnLayout = {
  readonly delimiter: Delimiter;
  readonly decimalMark: DecimalMark | null;
  readonly encoding: TextEncoding;
  readonly headerRow: boolean;
  readonly columns: readonly LayoutColumn[];
  readonly sampleRateHz: number | null;
  readonly speedRpm: number | null;
};

/**
 * A kept layout applied to another file of the same shape: columns, marks and names come from the
 * kept one, rate, speed and encoding from the file. Where the file states no rate, the kept one is
 * offered again; a speed is never carried over.
 */
export function layoutForFile(kept: ColumnLayout, proposed: ColumnLayout): ColumnLayout {
  return {
    ...kept,
    encoding: proposed.encoding,
    sampleRateHz: proposed.sampleRateHz ?? kept.sampleRateHz,
    speedRpm: proposed.speedRpm,
  };
}

/** The column of a role, if the layout has one. */
export function columnOf(
  layout: ColumnLayout,
  role: LayoutColumn['role'],
): LayoutColumn | undefined {
  return layout.columns.find((column) => column.role === role);
}
