import type { VibrationQuantity } from '../signal/quantity';
import type { LayoutColumn, SignalUnit, TimeUnit } from './column-layout';

/** What the name of a column gives away. */
export type ColumnMeaning = Pick<LayoutColumn, 'role' | 'quantity' | 'unit'>;

const SIGNAL_UNITS: readonly (readonly [RegExp, SignalUnit])[] = [
  [/ (m s2|m s s|m s 2|ms2) /, 'm/s2'],
  [/ mm s /, 'mm/s'],
  [/ (in s|inch s|ips) /, 'in/s'],
  [/ (um|microns?|micrometers?|micrometres?) /, 'um'],
  [/ (mil|mils) /, 'mil'],
  [/ g /, 'g'],
];

const QUANTITY_OF_UNIT: Readonly<Record<SignalUnit, VibrationQuantity>> = {
  g: 'acceleration',
  'm/s2': 'acceleration',
  'mm/s': 'velocity',
  'in/s': 'velocity',
  um: 'displacement',
  mil: 'displacement',
};

const QUANTITY_WORDS: readonly (readonly [RegExp, VibrationQuantity])[] = [
  [/ (acceleration|accel|acc|beschleunigung) /, 'acceleration'],
  [/ (velocity|vel|geschwindigkeit|schwinggeschwindigkeit) /, 'velocity'],
  [/ (displacement|disp|weg|schwingweg) /, 'displacement'],
];

/**
 * Reads role, quantity and unit from a column's name, in the spellings exports use: our plain layout
 * (`time_s`, `acceleration_m_s2`, `acceleration_g`, `velocity_mm_s`, `displacement_um`, `tacho`) and
 * names with units in brackets (`Time [ms]`, `a (m/s²)`, `x in µm`). A unit that contradicts the
 * quantity's word is not taken. Null when the name says nothing.
 *
 * Example: `columnMeaning('Velocity (mm/s)')` is a signal, velocity, mm/s.
 */
export function columnMeaning(name: string): ColumnMeaning | null {
  const words = wordsOf(name);
  if (/^ (t|time|zeit|zeitstempel|timestamp|seconds|sec) /.test(words)) {
    return { role: 'time', quantity: null, unit: timeUnit(words) };
  }
  if (/ (tacho|tach|tachometer|pulse|trigger|mark|drehzahlimpuls) /.test(words)) {
    return { role: 'tacho', quantity: null, unit: null };
  }
  return signalMeaning(words);
}

/** Whether every cell of a row is a unit or empty, as in the second header row of some exports. */
export function isUnitRow(cells: readonly string[]): boolean {
  const named = cells.filter((cell) => cell.trim() !== '');
  const isUnit = (cell: string): boolean => {
    const words = wordsOf(cell);
    return /^ (s|ms|us|sec|v|-)? ?$/.test(words) || SIGNAL_UNITS.some(([p]) => p.test(words));
  };
  return named.length > 0 && named.every((cell) => wordsOf(cell).length <= 8 && isUnit(cell));
}

/** The quantity a unit belongs to. */
export function quantityOfUnit(unit: SignalUnit): VibrationQuantity {
  return QUANTITY_OF_UNIT[unit];
}

function signalMeaning(words: string): ColumnMeaning | null {
  const unit = firstMatch(SIGNAL_UNITS, words);
  const quantity = firstMatch(QUANTITY_WORDS, words);
  if (unit === null) return quantity === null ? null : { role: 'signal', quantity, unit };
  const ofUnit = QUANTITY_OF_UNIT[unit];
  const agreed = quantity === null || quantity === ofUnit;
  return { role: 'signal', quantity: quantity ?? ofUnit, unit: agreed ? unit : null };
}

function firstMatch<T>(table: readonly (readonly [RegExp, T])[], words: string): T | null {
  return table.find(([pattern]) => pattern.test(words))?.[1] ?? null;
}

function timeUnit(words: string): TimeUnit {
  if (/ (ms|msec|milliseconds) /.test(words)) return 'ms';
  return / (us|usec|microseconds) /.test(words) ? 'us' : 's';
}

function wordsOf(name: string): string {
  const plain = name
    .toLowerCase()
    .replace(/[µμ]/g, 'u')
    .replace(/²/g, '2')
    .replace(/\^/g, '')
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
  return ` ${plain} `;
}
