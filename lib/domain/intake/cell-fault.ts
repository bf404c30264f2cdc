import type { DecimalMark } from './column-layout';
import { intakeFailure, type IntakeFailure } from './intake-failure';

/** Where a cell stands. */
export type CellPlace = {
  readonly fileName: string;
  readonly row: number;
  readonly column: string;
  readonly mark: DecimalMark;
};

/** A sample as large as this or larger is a broken export, whatever its unit. */
export const ABSURD_SIZE = 1e9;

type Refused = { readonly ok: false; readonly failure: IntakeFailure };

/** What is wrong with a cell that should have held a number, in words that name it. */
export function cellFault({ fileName, row, column, mark }: CellPlace, text: string): Refused {
  const value = text.trim().slice(0, 40);
  const place = { row, column, value };
  if (value === '') {
    const sentence = 'the cell is empty; every row needs a number here.';
    return intakeFailure('EMPTY_CELL', fileName, place, sentence);
  }
  if (/^[+-]?(nan|inf|infinity|#n\/a|n\/a)$/i.test(value)) {
    const sentence = `"${value}" is not a sample; record again or export without such rows.`;
    return intakeFailure('NOT_FINITE', fileName, place, sentence);
  }
  if (Math.abs(Number(value.replace(',', '.'))) >= ABSURD_SIZE) {
    const sentence = `${value} is absurdly large; check the unit and the export.`;
    return intakeFailure('ABSURD_VALUE', fileName, place, sentence);
  }
  const example = mark === 'comma' ? 'with a decimal comma, such as 0,25' : 'such as 0.25';
  const sentence = `"${value}" is not a number; expected one ${example}.`;
  return intakeFailure('NOT_A_NUMBER', fileName, place, sentence);
}

/** A row with more or fewer cells than the others. */
export function raggedRow(fileName: string, row: number, cells: number, expected: number): Refused {
  const sentence = `the row has ${cells} cells and the others ${expected}; export the file again.`;
  return intakeFailure('RAGGED_ROW', fileName, { row }, sentence);
}

/** An empty row between rows of samples, where samples may be missing. */
export function emptyRow(fileName: string, row: number): Refused {
  const sentence = 'the row is empty and samples follow; export the file without gaps.';
  return intakeFailure('EMPTY_ROW', fileName, { row }, sentence);
}
