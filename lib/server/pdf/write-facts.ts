import 'server-only';
import type { ReportFact } from '@/lib/schemas/report';
import { keepTogether, SIZES, type Sheet } from './sheet';

const COLUMNS = 3;
const GAP = 12;

/** Facts three abreast: the small name above, the value under it. */
export function writeFacts(sheet: Sheet, facts: readonly ReportFact[]): void {
  const { doc, left } = sheet;
  for (const row of rowsOf(facts)) {
    const height = factRowHeight(sheet, row);
    keepTogether(sheet, height);
    const top = doc.y;
    for (const [column, { label, value }] of row.entries()) {
      const x = left + column * (cellWidth(sheet) + GAP);
      doc.font('plain').fontSize(SIZES.small).fillColor('#333333');
      doc.text(label, x, top, { width: cellWidth(sheet) });
      doc
        .fontSize(SIZES.text)
        .fillColor('black')
        .text(value, { width: cellWidth(sheet) });
    }
    doc.x = left;
    doc.y = top + height;
  }
  doc.y += 4;
}

/** Height of the first row of facts. */
export function factsStartHeight(sheet: Sheet, facts: readonly ReportFact[]): number {
  return factRowHeight(sheet, rowsOf(facts)[0] ?? []);
}

function rowsOf(facts: readonly ReportFact[]): ReportFact[][] {
  const rows: ReportFact[][] = [];
  for (let i = 0; i < facts.length; i += COLUMNS) rows.push(facts.slice(i, i + COLUMNS));
  return rows;
}

function cellWidth({ width }: Sheet): number {
  return (width - (COLUMNS - 1) * GAP) / COLUMNS;
}

function factRowHeight(sheet: Sheet, row: readonly ReportFact[]): number {
  const { doc } = sheet;
  const width = cellWidth(sheet);
  const heights = row.map(({ label, value }) => {
    const name = doc.font('plain').fontSize(SIZES.small).heightOfString(label, { width });
    return name + doc.fontSize(SIZES.text).heightOfString(value, { width });
  });
  return Math.max(0, ...heights) + 6;
}
