import 'server-only';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import PDFDocument from 'pdfkit';
import type { Paper } from './paper';

/** A document being written from top to bottom; the cursor is `doc.y`. */
export type Sheet = {
  readonly doc: PDFKit.PDFDocument;
  readonly left: number;
  readonly width: number;
};

/** Room for what stands on every page, points. */
export const MARGINS = { top: 62, bottom: 74, left: 43, right: 43 } as const;

/** Sizes of letters, points. */
export const SIZES = { title: 15, heading: 11.5, text: 9, small: 7.5, table: 7.5 } as const;

const FONT_FOLDER = join(process.cwd(), 'node_modules', 'dejavu-fonts-ttf', 'ttf');
const FONT_FILES = { plain: 'DejaVuSans.ttf', bold: 'DejaVuSans-Bold.ttf' } as const;
const loaded = new Map<string, Buffer>();

/** A new document with its fonts: DejaVu Sans has every sign used here (√ ∠ µ · – ≤). */
export function newSheet(paper: Paper, info: { title: string; subject: string }): Sheet {
  const doc = new PDFDocument({
    size: paper,
    margins: MARGINS,
    bufferPages: true,
    lang: 'en',
    displayTitle: true,
    // The usual first font needs files of the package that a bundled server does not carry.
    font: '',
    info: { Title: info.title, Subject: info.subject, Author: 'Evenrun', Creator: 'Evenrun' },
  });
  doc.registerFont('plain', fontFile('plain'));
  doc.registerFont('bold', fontFile('bold'));
  doc.font('plain').fontSize(SIZES.text);
  return { doc, left: MARGINS.left, width: doc.page.width - MARGINS.left - MARGINS.right };
}

function fontFile(face: keyof typeof FONT_FILES): Buffer {
  const known = loaded.get(face);
  if (known) return known;
  const bytes = readFileSync(join(FONT_FOLDER, FONT_FILES[face]));
  loaded.set(face, bytes);
  return bytes;
}

/** Lowest line that may be written on. */
function bottomOf({ doc }: Sheet): number {
  return doc.page.height - MARGINS.bottom;
}

/** Height of what a page holds between its marks. */
export function bodyHeight(sheet: Sheet): number {
  return bottomOf(sheet) - MARGINS.top;
}

/** Begins a new page where less than `height` is left; says whether it did. */
export function keepTogether(sheet: Sheet, height: number): boolean {
  const { doc } = sheet;
  if (doc.y + height <= bottomOf(sheet) || doc.y <= MARGINS.top + 1) return false;
  doc.addPage();
  doc.x = sheet.left;
  doc.y = MARGINS.top;
  return true;
}

/** The bytes of a finished document. */
export function finish({ doc }: Sheet): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = [];
    doc.on('data', (chunk: Buffer) => chunks.push(chunk));
    doc.on('end', () => resolve(Buffer.concat(chunks)));
    doc.on('error', reject);
    doc.end();
  });
}
