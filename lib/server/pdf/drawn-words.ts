import 'server-only';

export type DrawnWords = {
  x: number;
  /** The line the letters stand on. */
  y: number;
  size: number;
  anchor?: 'start' | 'middle' | 'end';
  bold?: boolean;
};

/** Words in a drawing on a white ground of their own, so that lines under them stay apart. */
export function drawWords(doc: PDFKit.PDFDocument, text: string, at: DrawnWords): void {
  const { x, y, size, anchor = 'start', bold = false } = at;
  doc.font(bold ? 'bold' : 'plain').fontSize(size);
  const width = doc.widthOfString(text);
  const shift = { start: 0, middle: width / 2, end: width }[anchor];
  const left = x - shift;
  doc.rect(left - 1, y - size * 0.82, width + 2, size * 1.06).fill('white');
  doc.fillColor('black').text(text, left, y - size * 0.93, { lineBreak: false });
}
