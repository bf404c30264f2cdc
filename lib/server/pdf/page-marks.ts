import 'server-only';
import { shortCode } from '@/lib/domain/balance-job/record-code';
import type { Report } from '@/lib/schemas/report';
import { MARGINS, SIZES, type Sheet } from './sheet';

/** Head and foot of every page: what it is, revision, page of pages, convention, hash, time and person. */
export function writePageMarks(sheet: Sheet, report: Report): void {
  const { start, count } = sheet.doc.bufferedPageRange();
  for (let index = 0; index < count; index++) {
    sheet.doc.switchToPage(start + index);
    // Text outside the margins must not begin a page.
    sheet.doc.page.margins = { top: 0, bottom: 0, left: 0, right: 0 };
    writeHead(sheet, report, `page ${index + 1} of ${count}`);
    writeFoot(sheet, report);
  }
}

function writeHead({ doc, left, width }: Sheet, report: Report, page: string): void {
  const y = 30;
  const line = { width, lineBreak: false, height: 12, ellipsis: true };
  doc.fontSize(SIZES.small).fillColor('black');
  doc.font('plain').text(report.about, left, y, { ...line, width: width * 0.6 });
  doc.font(report.isDraft ? 'bold' : 'plain');
  doc.text(`${report.revision} · ${page}`, left, y, { ...line, align: 'right' });
  doc
    .moveTo(left, y + 14)
    .lineTo(left + width, y + 14)
    .lineWidth(0.5)
    .strokeColor('black')
    .stroke();
}

function writeFoot({ doc, left, width }: Sheet, report: Report): void {
  const y = doc.page.height - MARGINS.bottom + 14;
  doc
    .moveTo(left, y)
    .lineTo(left + width, y)
    .lineWidth(0.5)
    .strokeColor('black')
    .stroke();
  doc.font('plain').fontSize(6.8).fillColor('black');
  const lines = [report.convention, ...hashLines(report), report.made];
  lines.forEach((text, index) => {
    doc.text(text, left, y + 5 + index * 10, { width, lineBreak: false });
  });
}

function hashLines({ contentHash, isDraft, revision }: Report): string[] {
  if (contentHash !== null)
    return [`content ${contentHash} · check it with ${shortCode(contentHash)}`];
  return isDraft ? [revision] : [];
}
