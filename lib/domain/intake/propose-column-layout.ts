import { ok, type Result } from '../result';
import { columnMeaning, type ColumnMeaning } from './column-name';
import type { ColumnLayout, DecimalMark, Delimiter, LayoutColumn } from './column-layout';
import { decimalMarkOf } from './decimal-mark';
import { detectEncoding } from './decode-text';
import { fileFacts } from './file-facts';
import { headLines, headTable, isNumberLike, usualWidth, type HeadTable } from './head-table';
import { intakeFailure, type IntakeFailure } from './intake-failure';
import { layoutQuestions, type LayoutQuestion } from './layout-questions';
import { sniffDelimiter, type Sniffed } from './sniff-delimiter';

/** A layout read off a file, for a person to confirm or correct. */
export type ColumnLayoutProposal = {
  readonly layout: ColumnLayout;
  readonly questions: readonly LayoutQuestion[];
  readonly confidence: 'sure' | 'ask';
  readonly previewRows: readonly { readonly row: number; readonly cells: readonly string[] }[];
  readonly shapeKey: string;
};

/** How many rows a person is shown. */
export const PREVIEW_ROWS = 20;

/**
 * Proposes how a file's columns are read, from its first 64 KB: encoding, delimiter, decimal mark of
 * the whole file, header, role, quantity and unit of each column, and the sample rate and speed it
 * states. What cannot be read off is left null and asked in `questions`; it is never guessed.
 * `shapeKey` is equal for files of the same shape, so that a layout kept for one is found for the
 * next. `delimiter` is a person's answer to what separates the columns; left out, it is found out.
 * Fails on an empty or binary file, one without numbers, and one whose numbers no single decimal mark
 * explains.
 */
export function proposeColumnLayout(
  bytes: Uint8Array,
  fileName: string,
  delimiter?: Delimiter,
): Result<ColumnLayoutProposal, IntakeFailure> {
  const encoding = detectEncoding(bytes, fileName);
  if (!encoding.ok) return encoding;
  const lines = headLines(bytes, encoding.value);
  const sniffed: Sniffed =
    delimiter === undefined ? sniffDelimiter(lines) : { delimiter, comma: 'settled' };
  const table = headTable(lines, sniffed.delimiter);
  const refused = refusal(table, sniffed, fileName);
  if (refused !== null) return refused;
  const mark = markOf(table, sniffed, fileName);
  if (!mark.ok) return mark;
  const columns = columnsOf(table, mark.value);
  const layout: ColumnLayout = {
    delimiter: sniffed.delimiter,
    decimalMark: mark.value,
    encoding: encoding.value,
    headerRow: table.header !== null,
    columns,
    ...fileFacts(table.statements, mark.value),
  };
  const questions = layoutQuestions(layout, sniffed);
  return ok({
    layout,
    questions,
    confidence: questions.length === 0 ? 'sure' : 'ask',
    previewRows: table.rows.slice(0, PREVIEW_ROWS),
    shapeKey: shapeKey(layout),
  });
}

function refusal(
  { header, rows }: HeadTable,
  sniffed: Sniffed,
  fileName: string,
): ReturnType<typeof intakeFailure> | null {
  if (sniffed.comma === 'both delimiter and decimal mark') {
    return intakeFailure(
      'COMMA_TWICE',
      fileName,
      {},
      'the comma separates both columns and decimals; export with semicolons between columns.',
    );
  }
  if (rows.some(({ cells }) => cells.some(isNumberLike))) return null;
  const first = rows[0];
  if (header === null || first === undefined) {
    return intakeFailure('NO_NUMBERS', fileName, {}, 'there are no numbers; export the samples.');
  }
  const value = first.cells[0] ?? '';
  const place = { row: first.row, column: header.cells[0] ?? '', value };
  const sentence = `"${value}" is not a number; only samples may stand below the header.`;
  return intakeFailure('NOT_A_NUMBER', fileName, place, sentence);
}

function markOf(
  { rows }: HeadTable,
  { delimiter, comma }: Sniffed,
  fileName: string,
): Result<DecimalMark | null, IntakeFailure> {
  if (comma === 'undecided') return ok(null);
  const cells = rows.flatMap((row) => row.cells);
  return decimalMarkOf(cells, delimiter, fileName);
}

function columnsOf(table: HeadTable, mark: DecimalMark | null): LayoutColumn[] {
  // A delimiter behind the last name or the last value adds a cell, not a column that is missing.
  const names = (table.header?.cells ?? []).findLastIndex((cell) => cell.trim() !== '') + 1;
  const width = Math.max(usualWidth(table.rows), names);
  const meanings = Array.from({ length: width }, (_, i): ColumnMeaning | null => {
    const name = table.header?.cells[i] ?? '';
    const named = columnMeaning(name);
    return named ?? (width > 1 ? meaningOfValues(valuesOf(table, i, mark), i) : null);
  });
  const signal = chosenSignal(meanings);
  return meanings.map((meaning, index): LayoutColumn => {
    const name = table.header?.cells[index]?.trim() ?? '';
    const role = index === signal ? 'signal' : roleBeside(meanings, index);
    return { index, role, name, quantity: meaning?.quantity ?? null, unit: meaning?.unit ?? null };
  });
}

// One time and one tacho column are read, the first of each; further signals are left to the person.
function roleBeside(
  meanings: readonly (ColumnMeaning | null)[],
  index: number,
): LayoutColumn['role'] {
  const role = meanings[index]?.role ?? 'ignore';
  const first = meanings.findIndex((meaning) => meaning?.role === role);
  return role !== 'signal' && first === index ? role : 'ignore';
}

function chosenSignal(meanings: readonly (ColumnMeaning | null)[]): number {
  const named = meanings.findIndex((meaning) => meaning?.role === 'signal');
  return named === -1 ? meanings.indexOf(null) : named;
}

function valuesOf(table: HeadTable, column: number, mark: DecimalMark | null): number[] {
  return table.rows.map(({ cells }) => {
    const cell = cells[column] ?? '';
    if (cell.trim() === '') return NaN;
    return Number(mark === 'comma' ? cell.replace(',', '.') : cell);
  });
}

// Without a name, only evenly rising values in the first column can be time, only 0 and 1 a tacho.
function meaningOfValues(values: readonly number[], index: number): ColumnMeaning | null {
  if (values.length < 8 || !values.every(Number.isFinite)) return null;
  const nameless = { quantity: null, unit: null };
  const last = values[values.length - 1] ?? 0;
  const step = (last - (values[0] ?? 0)) / (values.length - 1);
  const even = values.every(
    (v, i) => i === 0 || Math.abs(v - (values[i - 1] ?? 0) - step) < step / 2,
  );
  if (index === 0 && step > 0 && even) return { ...nameless, role: 'time', unit: 's' };
  const twoLevel = values.every((v) => v === 0 || v === 1);
  return index > 0 && twoLevel ? { ...nameless, role: 'tacho' } : null;
}

function shapeKey(layout: ColumnLayout): string {
  const names = layout.columns.map(({ name }) => name.toLowerCase().replace(/\s+/g, ' '));
  const separator = { ',': 'comma', ';': 'semicolon', '\t': 'tab', one: 'one column' };
  const header = layout.headerRow ? names.join('|') : `${layout.columns.length} unnamed`;
  return `${separator[layout.delimiter ?? 'one']}: ${header}`;
}
