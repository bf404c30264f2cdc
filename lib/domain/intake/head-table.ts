import Papa from 'papaparse';
import { columnMeaning, isUnitRow } from './column-name';
import type { Delimiter, TextEncoding } from './column-layout';
import { decodeText, HEAD_BYTES } from './decode-text';
import { NUMBER_SHAPE } from './decimal-mark';
import { isFactLine } from './file-facts';

/** A row of a file with its line number, counted from 1. */
export type HeadRow = { readonly row: number; readonly cells: readonly string[] };

/** The first 64 KB of a file, taken apart into what it says, its names and its rows. */
export type HeadTable = {
  readonly statements: readonly string[];
  readonly header: HeadRow | null;
  readonly rows: readonly HeadRow[];
};

type Line = { readonly row: number; readonly text: string };

/** The whole lines at the head of a file. */
export function headLines(bytes: Uint8Array, encoding: TextEncoding): string[] {
  const text = decodeText(bytes.subarray(0, HEAD_BYTES), encoding);
  const lines = (text.includes('\n') ? text : text.replaceAll('\r', '\n')).split(/\r*\n/);
  return bytes.length > HEAD_BYTES ? lines.slice(0, -1) : lines;
}

/**
 * Takes lines apart with a given delimiter. Statements are comment lines (`#`) and lines that state
 * a rate or a speed; the header is the last row of recognised names above the numbers, else the last
 * row of text there; a row of units below it is joined to the names; everything after is data, even
 * if it is not numbers, so that it can be complained about by row.
 */
export function headTable(lines: readonly string[], delimiter: Delimiter): HeadTable {
  const numbered = lines.map((text, i): Line => ({ row: i + 1, text }));
  const isStatement = ({ text }: Line): boolean => text.startsWith('#') || isFactLine(text);
  const statements = numbered.filter(isStatement).map(({ text }) => text);
  const content = numbered.filter((line) => line.text.trim() !== '' && !isStatement(line));
  const rows = split(content, delimiter);
  const firstNumbers = rows.findIndex(({ cells }) => cells.some(isNumberLike));
  const above = firstNumbers === -1 ? rows : rows.slice(0, firstNumbers);
  const at = headerIndex(above);
  const header = rows[at];
  if (at === -1 || header === undefined) return { statements, header: null, rows };
  const units = rows[at + 1];
  if (units === undefined || !above.includes(units) || !isUnitRow(units.cells)) {
    return { statements, header, rows: rows.slice(at + 1) };
  }
  const cells = header.cells.map((name, i) => `${name.trim()} [${units.cells[i]?.trim() ?? ''}]`);
  return { statements, header: { row: units.row, cells }, rows: rows.slice(at + 2) };
}

/** The number of cells most rows have. */
export function usualWidth(rows: readonly HeadRow[]): number {
  const counts = new Map<number, number>();
  for (const { cells } of rows) counts.set(cells.length, (counts.get(cells.length) ?? 0) + 1);
  const entries = [...counts.entries()].sort(([, a], [, b]) => b - a);
  return entries[0]?.[0] ?? 0;
}

/** Whether a cell stands where a number belongs, be it a number, NaN or infinity. */
export function isNumberLike(cell: string): boolean {
  return NUMBER_SHAPE.test(cell) || /^\s*[+-]?(nan|inf|infinity)\s*$/i.test(cell);
}

function headerIndex(above: readonly HeadRow[]): number {
  const recognised = above.findLastIndex(({ cells }) =>
    cells.some((cell) => columnMeaning(cell) !== null && !isUnitRow([cell])),
  );
  return recognised === -1 ? above.length - 1 : recognised;
}

// A character no export uses stands for "one column", so that quoting still works there.
const ONE_COLUMN = '\u001f';

function split(lines: readonly Line[], delimiter: Delimiter): HeadRow[] {
  const text = lines.map((line) => line.text).join('\n');
  const { data } = Papa.parse<string[]>(text, {
    delimiter: delimiter ?? ONE_COLUMN,
    newline: '\n',
  });
  return data.slice(0, lines.length).map((cells, i) => ({ row: lines[i]?.row ?? 0, cells }));
}
