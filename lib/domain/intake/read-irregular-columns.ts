import Papa from 'papaparse';
import { ok, type Result } from '../result';
import { ABSURD_SIZE, cellFault, emptyRow, raggedRow } from './cell-fault';
import type { DecimalMark, LayoutColumn } from './column-layout';
import type { IntakeFailure } from './intake-failure';
import { ROWS_MAX, tooManyRows, type NumberColumns, type TablePlan } from './read-number-columns';

const ONE_COLUMN = '\u001f';
const SHAPES: Readonly<Record<DecimalMark, RegExp>> = {
  point: /^ *[+-]?(\d+(\.\d*)?|\.\d+)(e[+-]?\d+)? *$/i,
  comma: /^ *[+-]?(\d+(,\d*)?|,\d+)(e[+-]?\d+)? *$/i,
};

/**
 * The same as `readNumberColumns` for files with quoted cells, through papaparse; `text` starts at
 * the plan's first row. Slower by an order of magnitude, equal in every value and failure.
 */
export function readIrregularColumns(
  text: string,
  plan: TablePlan,
): Result<NumberColumns, IntakeFailure> {
  const table = new RowCollector(plan);
  Papa.parse<string[]>(text, {
    delimiter: plan.delimiter ?? ONE_COLUMN,
    step: ({ data }, parser) => {
      if (!table.take(data)) parser.abort();
    },
  });
  return table.fault ?? ok(table.result());
}

type Refused = { readonly ok: false; readonly failure: IntakeFailure };

class RowCollector {
  fault: Refused | null = null;
  private readonly values: number[][];
  private line: number;
  private blank = 0;
  private rows = 0;

  constructor(private readonly plan: TablePlan) {
    this.values = plan.columns.map(() => []);
    this.line = plan.firstRow - 1;
  }

  take(cells: readonly string[]): boolean {
    this.line++;
    const [first = ''] = cells;
    if (first.trimStart().startsWith('#')) return true;
    if (cells.length === 1 && first.trim() === '') {
      this.blank ||= this.line;
      return true;
    }
    this.fault = this.rowFault(cells);
    return this.fault === null;
  }

  result(): NumberColumns {
    const read = this.plan.columns.filter(({ role }) => role !== 'ignore');
    const columns = read.map(
      ({ index }) => [index, Float64Array.from(this.values[index] ?? [])] as const,
    );
    return { rows: this.rows, values: new Map(columns) };
  }

  private rowFault(cells: readonly string[]): Refused | null {
    const { fileName, columns } = this.plan;
    if (this.blank > 0) return emptyRow(fileName, this.blank);
    for (const column of columns.slice(0, cells.length)) {
      const fault = this.takeCell(column, cells[column.index] ?? '');
      if (fault !== null) return fault;
    }
    if (cells.length !== columns.length) {
      return raggedRow(fileName, this.line, cells.length, columns.length);
    }
    this.rows++;
    return this.rows > ROWS_MAX ? tooManyRows(fileName) : null;
  }

  private takeCell({ index, role, name }: LayoutColumn, cell: string): Refused | null {
    if (role === 'ignore') return null;
    const { fileName, mark } = this.plan;
    const value = SHAPES[mark].test(cell) ? Number(cell.replace(',', '.')) : NaN;
    if (!(Math.abs(value) < (role === 'time' ? Infinity : ABSURD_SIZE))) {
      return cellFault({ fileName, row: this.line, column: name || `${index + 1}`, mark }, cell);
    }
    this.values[index]?.push(value);
    return null;
  }
}
