import { ok, type Result } from '../result';
import { ABSURD_SIZE, cellFault, emptyRow, raggedRow } from './cell-fault';
import type { DecimalMark, Delimiter, LayoutColumn } from './column-layout';
import { intakeFailure, type IntakeFailure } from './intake-failure';
import { NumberCursor } from './number-cursor';

/** What to read from the rows of a file; `firstRow` is the line number of the first row of samples. */
export type TablePlan = {
  readonly fileName: string;
  readonly delimiter: Delimiter;
  readonly mark: DecimalMark;
  readonly columns: readonly LayoutColumn[];
  readonly firstRow: number;
};

/** The columns that are read, by index; ignored ones are absent. */
export type NumberColumns = {
  readonly rows: number;
  readonly values: ReadonlyMap<number, Float64Array>;
};

/** Most samples a file may hold. */
export const ROWS_MAX = 10_000_000;

const LINE_FEED = 10;
const RETURN = 13;
const SPACE = 32;
const HASH = 35;

/**
 * Reads the number columns of a regular file (no quotes) in one pass over its bytes, one byte a
 * character, every value correctly rounded. Rows of comments and empty rows at the end are skipped;
 * an empty row in between, a cell that is not a number, and a row of another width are failures that
 * name their row. Files above 10 million rows are refused before anything is allocated.
 */
export function readNumberColumns(
  bytes: Uint8Array,
  plan: TablePlan,
): Result<NumberColumns, IntakeFailure> {
  const start = offsetOfRow(bytes, plan.firstRow);
  const capacity = countRows(bytes, start);
  if (capacity > ROWS_MAX) return tooManyRows(plan.fileName);
  const reader = new RowReader(bytes, plan, capacity);
  const fault = reader.readFrom(start);
  return fault ?? ok(reader.result());
}

/** The refusal of a file that is too long. */
export function tooManyRows(fileName: string): {
  readonly ok: false;
  readonly failure: IntakeFailure;
} {
  const sentence = `the file holds more than ${ROWS_MAX / 1e6} million samples; split the record.`;
  return intakeFailure('TOO_MANY_ROWS', fileName, {}, sentence);
}

/** Where a line starts, as an offset into the bytes; the end if there are not so many lines. */
export function offsetOfRow(bytes: Uint8Array, row: number): number {
  let at = 0;
  for (let line = 1; line < row; line++) {
    const feed = bytes.indexOf(LINE_FEED, at);
    if (feed === -1) return bytes.length;
    at = feed + 1;
  }
  return at;
}

function countRows(bytes: Uint8Array, start: number): number {
  let rows = 0;
  for (let at = start; at < bytes.length; rows++) {
    const feed = bytes.indexOf(LINE_FEED, at);
    at = feed === -1 ? bytes.length : feed + 1;
  }
  return rows;
}

type Refused = { readonly ok: false; readonly failure: IntakeFailure };

class RowReader {
  private readonly cursor: NumberCursor;
  private readonly delimiter: number;
  private readonly targets: readonly (Float64Array | null)[];
  private readonly limits: readonly number[];
  private rows = 0;
  private line: number;

  constructor(
    private readonly bytes: Uint8Array,
    private readonly plan: TablePlan,
    capacity: number,
  ) {
    this.cursor = new NumberCursor(bytes, plan.mark === 'comma' ? 44 : 46);
    this.delimiter = plan.delimiter === null ? -1 : plan.delimiter.charCodeAt(0);
    this.targets = plan.columns.map(({ role }) =>
      role === 'ignore' ? null : new Float64Array(capacity),
    );
    this.limits = plan.columns.map(({ role }) => (role === 'time' ? Infinity : ABSURD_SIZE));
    this.line = plan.firstRow;
  }

  readFrom(start: number): Refused | null {
    const { bytes, cursor } = this;
    let blank = 0;
    for (cursor.position = start; cursor.position < bytes.length; this.line++) {
      const first = this.firstInk(cursor.position);
      if (first === LINE_FEED) blank ||= this.line;
      else if (first !== HASH) {
        const fault = blank > 0 ? emptyRow(this.plan.fileName, blank) : this.readRow();
        if (fault !== null) return fault;
      }
      const feed = bytes.indexOf(LINE_FEED, cursor.position);
      cursor.position = feed === -1 ? bytes.length : feed + 1;
    }
    return null;
  }

  result(): NumberColumns {
    const { rows, targets } = this;
    const values = new Map<number, Float64Array>();
    targets.forEach((target, index) => {
      if (target !== null) {
        values.set(index, target.length === rows ? target : target.slice(0, rows));
      }
    });
    return { rows, values };
  }

  private readRow(): Refused | null {
    const { cursor, bytes, targets } = this;
    const start = cursor.position;
    for (let column = 0; column < targets.length; column++) {
      if (column > 0) {
        if (bytes[cursor.position] !== this.delimiter) return this.ragged(start);
        cursor.position++;
      }
      const target = targets[column] ?? null;
      if (target === null) cursor.position = this.cellEnd(cursor.position);
      else if (!this.readCell(column, target)) return this.fault(column);
    }
    if (!this.isCellEnd(cursor.position) || bytes[cursor.position] === this.delimiter) {
      return this.ragged(start);
    }
    this.rows++;
    return null;
  }

  // On failure the cursor stands at the start of the cell, so that the cell can be quoted.
  private readCell(column: number, target: Float64Array): boolean {
    const start = this.cursor.position;
    const value = this.cursor.read();
    const limit = this.limits[column] ?? 0;
    if (Math.abs(value) < limit && this.isCellEnd(this.cursor.position)) {
      target[this.rows] = value;
      return true;
    }
    this.cursor.position = start;
    return false;
  }

  private fault(column: number): Refused {
    const { fileName, mark, columns } = this.plan;
    const start = this.cursor.position;
    const text = String.fromCharCode(
      ...this.bytes.subarray(start, this.cellEnd(start)).slice(0, 60),
    );
    const name = columns[column]?.name ?? '';
    const place = { fileName, row: this.line, column: name || `${column + 1}`, mark };
    return cellFault(place, text);
  }

  private ragged(start: number): Refused {
    let cells = 1;
    let at = this.cellEnd(start);
    for (; this.bytes[at] === this.delimiter; cells++) at = this.cellEnd(at + 1);
    return raggedRow(this.plan.fileName, this.line, cells, this.targets.length);
  }

  private cellEnd(from: number): number {
    let at = from;
    while (!this.isCellEnd(at)) at++;
    return at;
  }

  private isCellEnd(at: number): boolean {
    const byte = this.bytes[at];
    return byte === undefined || byte === LINE_FEED || byte === RETURN || byte === this.delimiter;
  }

  private firstInk(from: number): number {
    let at = from;
    while (this.bytes[at] === SPACE || this.bytes[at] === RETURN) at++;
    return this.bytes[at] ?? LINE_FEED;
  }
}
