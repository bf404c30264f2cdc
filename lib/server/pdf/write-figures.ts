import 'server-only';
import { keepTogether, type Sheet } from './sheet';

/** Size of a drawing in its own units. */
export type FigureSize = { readonly width: number; readonly height: number };

type Drawing<Figure> = {
  size: (figure: Figure) => FigureSize;
  /** Draws at 0/0 in the drawing's own units. */
  write: (doc: PDFKit.PDFDocument, figure: Figure) => void;
};

const ABREAST = 2;
const GAP = 14;

/** Drawings two abreast; none is cut by the end of a page. */
export function writeFigures<Figure>(
  sheet: Sheet,
  figures: readonly Figure[],
  { size, write }: Drawing<Figure>,
): void {
  const { doc, left } = sheet;
  for (let first = 0; first < figures.length; first += ABREAST) {
    const row = figures.slice(first, first + ABREAST);
    const height = figureRowHeight(sheet, row, size);
    keepTogether(sheet, height);
    const top = doc.y;
    row.forEach((figure, column) => {
      const scale = figureWidth(sheet) / size(figure).width;
      doc.save();
      doc.translate(left + column * (figureWidth(sheet) + GAP), top).scale(scale);
      write(doc, figure);
      doc.restore();
    });
    doc.x = left;
    doc.y = top + height;
  }
}

/** Height of the first row of drawings. */
export function figureRowHeight<Figure>(
  sheet: Sheet,
  figures: readonly Figure[],
  size: (figure: Figure) => FigureSize,
): number {
  const heights = figures.slice(0, ABREAST).map((figure) => {
    const { width, height } = size(figure);
    return (height * figureWidth(sheet)) / width;
  });
  return Math.max(0, ...heights) + 8;
}

function figureWidth({ width }: Sheet): number {
  return (width - GAP) / ABREAST;
}
