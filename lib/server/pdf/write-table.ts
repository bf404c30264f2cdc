import 'server-only';
import type { ReportCell, ReportTable } from '@/lib/schemas/report';
import { bodyHeight, keepTogether, SIZES, type Sheet } from './sheet';
import { columnWidths } from './table-columns';
import { wrapWords } from './wrap-words';

const PADDING = 4;
const LINE = SIZES.table * 1.22;
/** A table of so few rows is not parted between pages. */
const FEW_ROWS = 3;

type LaidRow = { lines: string[][]; height: number; struck: boolean };

type LaidTable = {
  caption: string;
  widths: number[];
  numeric: boolean[];
  head: LaidRow;
  rows: LaidRow[];
};

/** A table whose head is repeated on every page it reaches; no row is cut in two. */
export function writeTable(sheet: Sheet, table: ReportTable): void {
  const laid = layOut(sheet, table);
  keepTogether(sheet, startHeight(sheet, laid));
  writeHead(sheet, laid, laid.caption);
  for (const row of laid.rows) {
    if (keepTogether(sheet, row.height)) writeHead(sheet, laid, `${laid.caption}, continued`);
    writeCells(sheet, laid, row);
    rule(sheet, 0.3);
  }
  sheet.doc.y += 9;
}

/** The least that must stand together under a heading. */
export function tableStartHeight(sheet: Sheet, table: ReportTable): number {
  return startHeight(sheet, layOut(sheet, table));
}

function startHeight(sheet: Sheet, { head, rows }: LaidTable): number {
  const heightOf = (some: readonly LaidRow[]) => some.reduce((sum, row) => sum + row.height, 0);
  const top = CAPTION + head.height;
  const whole = top + heightOf(rows);
  if (rows.length <= FEW_ROWS && whole < bodyHeight(sheet) / 2) return whole;
  return top + heightOf(rows.slice(0, 2));
}

function layOut(sheet: Sheet, table: ReportTable): LaidTable {
  const texts = table.rows.map(({ cells }) => cells.map(textOf));
  const measureHead = measureIn(sheet, 'bold');
  const measure = measureIn(sheet, 'plain');
  const wishes = table.columns.map(({ label }, column) => {
    const headWord = longestWord(label, measureHead);
    const cells = texts.map((row) => row[column] ?? '');
    return {
      natural: Math.max(headWord, ...cells.map(measure)) + 2 * PADDING + 0.5,
      least:
        Math.max(headWord, ...cells.map((cell) => longestWord(cell, measure))) + 2 * PADDING + 0.5,
    };
  });
  const widths = columnWidths(wishes, sheet.width);
  const head = table.columns.map(({ label }) => label);
  return {
    caption: table.caption,
    widths,
    numeric: table.columns.map(({ numeric }) => numeric ?? false),
    head: laidRow(head, widths, measureHead),
    rows: texts.map((row, i) => ({
      ...laidRow(row, widths, measure),
      struck: table.rows[i]?.struck ?? false,
    })),
  };
}

type Measure = (text: string) => number;

/** Widths of words in one face, each measured once. */
function measureIn({ doc }: Sheet, face: 'plain' | 'bold'): Measure {
  const known = new Map<string, number>();
  return (text) => {
    const before = known.get(text);
    if (before !== undefined) return before;
    const width = doc.font(face).fontSize(SIZES.table).widthOfString(text);
    known.set(text, width);
    return width;
  };
}

function longestWord(text: string, measure: Measure): number {
  return Math.max(0, ...text.split(' ').map(measure));
}

function laidRow(texts: readonly string[], widths: readonly number[], measure: Measure): LaidRow {
  const lines = texts.map((text, column) =>
    wrapWords(text, (widths[column] ?? 0) - 2 * PADDING, measure),
  );
  const most = Math.max(1, ...lines.map(({ length }) => length));
  return { lines, height: most * LINE + 2 * PADDING, struck: false };
}

/** Text of a cell in one flow: line breaks that somebody typed do not make a row longer. */
function textOf(cell: ReportCell): string {
  const text = typeof cell === 'string' ? cell : cell.text;
  return text.replace(/\s*\n\s*/g, ' ');
}

const CAPTION = SIZES.small * 1.4 + 2;

function writeHead(sheet: Sheet, laid: LaidTable, caption: string): void {
  const { doc, left } = sheet;
  doc.font('bold').fontSize(SIZES.small).fillColor('black');
  doc.text(caption, left, doc.y, { lineBreak: false });
  doc.y += CAPTION;
  writeCells(sheet, laid, laid.head, 'bold');
  rule(sheet, 0.9);
}

function writeCells(
  sheet: Sheet,
  { widths, numeric }: LaidTable,
  row: LaidRow,
  face: 'plain' | 'bold' = 'plain',
): void {
  const { doc, left } = sheet;
  const top = doc.y;
  doc.font(face).fontSize(SIZES.table).fillColor('black');
  let x = left;
  for (const [column, lines] of row.lines.entries()) {
    const width = widths[column] ?? 0;
    lines.forEach((line, i) => {
      const shift = numeric[column] ? width - PADDING - doc.widthOfString(line) : PADDING;
      doc.text(line, x + shift, top + PADDING + i * LINE, {
        lineBreak: false,
        strike: row.struck && line !== '',
      });
    });
    x += width;
  }
  doc.x = left;
  doc.y = top + row.height;
}

function rule({ doc, left, width }: Sheet, lineWidth: number): void {
  doc
    .moveTo(left, doc.y)
    .lineTo(left + width, doc.y)
    .lineWidth(lineWidth)
    .strokeColor('black')
    .stroke();
}
