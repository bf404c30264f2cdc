import 'server-only';
import type { ReportPhoto } from '@/lib/schemas/report';
import type { FigureSize } from './write-figures';

/** A photo with its bytes; null where the store has lost them. */
export type LoadedPhoto = { readonly photo: ReportPhoto; readonly bytes: Buffer | null };

const WIDTH = 320;
const HIGHEST = 300;
const CAPTION = 46;

/** How large a photo and its words are drawn. */
export function photoSize({ photo }: LoadedPhoto): FigureSize {
  return { width: WIDTH, height: pictureHeight(photo) + CAPTION };
}

function pictureHeight({ widthPx, heightPx }: ReportPhoto): number {
  return Math.min(HIGHEST, (WIDTH * heightPx) / widthPx);
}

/** The picture, what it shows, and the hash it was kept under. */
export function writePhoto(doc: PDFKit.PDFDocument, { photo, bytes }: LoadedPhoto): void {
  const height = pictureHeight(photo);
  if (bytes) doc.image(bytes, 0, 0, { fit: [WIDTH, height] });
  else doc.font('plain').fontSize(10).text('This photo is missing in the store.', 0, 0);
  doc.font('plain').fontSize(9.5).fillColor('black');
  doc.text(photo.caption, 0, height + 4, { width: WIDTH, height: 24, ellipsis: true });
  doc
    .fontSize(8)
    .text(`SHA-256 ${photo.sha256.slice(0, 16)}`, 0, height + 31, { lineBreak: false });
}
