import type { Failure } from '../result';

/** Why a file cannot be read, with the place where that is known. Rows count from 1, as lines do. */
export type IntakeFailure = Failure<
  | 'EMPTY_FILE'
  | 'NOT_TEXT'
  | 'NO_NUMBERS'
  | 'THOUSANDS_SEPARATORS'
  | 'MIXED_DECIMAL_MARKS'
  | 'COMMA_TWICE'
  | 'LAYOUT_UNDECIDED'
  | 'RATE_UNKNOWN'
  | 'NOT_A_NUMBER'
  | 'EMPTY_CELL'
  | 'NOT_FINITE'
  | 'ABSURD_VALUE'
  | 'RAGGED_ROW'
  | 'EMPTY_ROW'
  | 'TOO_FEW_ROWS'
  | 'TOO_MANY_ROWS'
  | 'TIME_NOT_RISING'
  | 'TIME_GAP'
  | 'TIME_UNEVEN'
> & { readonly row?: number; readonly column?: string; readonly value?: string };

type Place = { readonly row?: number; readonly column?: string; readonly value?: string };

/**
 * A failure that names file, row, column and value before saying what was expected.
 * Example: `pump.csv, row 12, column "acceleration_g": "abc" is not a number; …`.
 */
export function intakeFailure(
  code: IntakeFailure['code'],
  fileName: string,
  place: Place,
  sentence: string,
): { readonly ok: false; readonly failure: IntakeFailure } {
  const where = [
    fileName,
    place.row === undefined ? '' : `row ${place.row}`,
    place.column === undefined ? '' : `column "${place.column}"`,
  ].filter((part) => part !== '');
  return { ok: false, failure: { code, message: `${where.join(', ')}: ${sentence}`, ...place } };
}
