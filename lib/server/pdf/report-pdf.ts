import 'server-only';
import type { Report, ReportBlock, ReportPhoto, ReportSection } from '@/lib/schemas/report';
import { faceSize, writeFace } from './draw-face';
import { walkSize, writeWalk } from './draw-walk';
import { photoSize, writePhoto, type LoadedPhoto } from './draw-photo';
import { writePageMarks } from './page-marks';
import type { Paper } from './paper';
import { finish, keepTogether, newSheet, SIZES, type Sheet } from './sheet';
import { figureRowHeight, writeFigures } from './write-figures';
import { factsStartHeight, writeFacts } from './write-facts';
import { tableStartHeight, writeTable } from './write-table';

/** Bytes of the photos by their id. */
export type Pictures = ReadonlyMap<number, Buffer>;

type Writing = { sheet: Sheet; pictures: Pictures };

/** A report as a PDF on the given paper: the same model as the screen, in black and white. */
export async function reportPdf(
  report: Report,
  paper: Paper,
  pictures: Pictures = new Map(),
): Promise<Buffer> {
  const sheet = newSheet(paper, { title: report.title, subject: report.about });
  const { doc, left, width } = sheet;
  doc.font('bold').fontSize(SIZES.title).text(report.title, left, doc.y, { width });
  doc.font('plain').fontSize(SIZES.text).text(report.revision, { width });
  doc.y += 6;
  for (const section of report.sections) writeSection({ sheet, pictures }, section);
  writePageMarks(sheet, report);
  return finish(sheet);
}

const HEADING = 30;

function writeSection(writing: Writing, section: ReportSection): void {
  const { sheet } = writing;
  const [first] = section.blocks;
  keepTogether(sheet, HEADING + (first ? startHeight(sheet, first) : 0));
  writeHeading(sheet, section);
  for (const block of section.blocks) writeBlock(writing, block);
}

/** The title, and what is noted to it on the same line where it fits, otherwise under it. */
function writeHeading({ doc, left, width }: Sheet, { title, note }: ReportSection): void {
  const top = doc.y + 8;
  doc.font('bold').fontSize(SIZES.heading).fillColor('black').text(title, left, top, { width });
  const reach = doc.widthOfString(title) + 8;
  if (note !== undefined) {
    doc.font('plain').fontSize(SIZES.small);
    if (reach + doc.widthOfString(note) <= width) {
      const below = doc.y;
      doc.text(note, left + reach, top + 3.7, { lineBreak: false });
      doc.y = below;
    } else doc.text(note, left, doc.y, { width });
  }
  doc.x = left;
  doc.y += 4;
}

function writeBlock({ sheet, pictures }: Writing, block: ReportBlock): void {
  switch (block.kind) {
    case 'table':
      return writeTable(sheet, block);
    case 'facts':
      return writeFacts(sheet, block.facts);
    case 'text':
      return writeText(sheet, block);
    case 'faces':
      return writeFigures(sheet, block.faces, { size: faceSize, write: writeFace });
    case 'photos':
      return writeFigures(sheet, loaded(block.photos, pictures), {
        size: photoSize,
        write: writePhoto,
      });
    case 'walks':
      return writeFigures(sheet, block.walks, { size: walkSize, write: writeWalk });
  }
}

function loaded(photos: readonly ReportPhoto[], pictures: Pictures): LoadedPhoto[] {
  return photos.map((photo) => ({ photo, bytes: pictures.get(photo.id) ?? null }));
}

type TextBlock = Extract<ReportBlock, { kind: 'text' }>;

function writeText(sheet: Sheet, block: TextBlock): void {
  const { doc, left, width } = sheet;
  keepTogether(sheet, Math.min(60, textHeight(sheet, block)));
  setText(doc, block);
  doc.fillColor('black').text(block.text, left, doc.y, { width });
  doc.y += 4;
}

function textHeight({ doc, width }: Sheet, block: TextBlock): number {
  setText(doc, block);
  return doc.heightOfString(block.text, { width });
}

function setText(doc: PDFKit.PDFDocument, { look }: TextBlock): void {
  doc
    .font(look === 'strong' ? 'bold' : 'plain')
    .fontSize(look === 'quiet' ? SIZES.small : SIZES.text);
}

/** What of a block must stand under its heading on the same page. */
function startHeight(sheet: Sheet, block: ReportBlock): number {
  switch (block.kind) {
    case 'table':
      return tableStartHeight(sheet, block);
    case 'facts':
      return factsStartHeight(sheet, block.facts);
    case 'text':
      return Math.min(60, textHeight(sheet, block));
    case 'faces':
      return figureRowHeight(sheet, block.faces, faceSize);
    case 'photos':
      return figureRowHeight(sheet, loaded(block.photos, new Map()), photoSize);
    case 'walks':
      return figureRowHeight(sheet, block.walks, walkSize);
  }
}
