import { getDocument, OPS } from 'pdfjs-dist/legacy/build/pdf.mjs';

export type ReadPage = { text: string; images: number; widthPt: number; heightPt: number };

/** The pages of a PDF as a reader that is not ours sees them: their words in order, and their size. */
export async function readPdf(bytes: Uint8Array): Promise<ReadPage[]> {
  const file = await getDocument({ data: new Uint8Array(bytes), verbosity: 0 }).promise;
  const pages: ReadPage[] = [];
  for (let number = 1; number <= file.numPages; number++) {
    const page = await file.getPage(number);
    const { items } = await page.getTextContent();
    const words = items.map((item) => ('str' in item ? item.str : ''));
    const { fnArray } = await page.getOperatorList();
    const images = fnArray.filter((drawn) => drawn === OPS.paintImageXObject).length;
    const [, , widthPt = 0, heightPt = 0] = page.view;
    pages.push({ text: plainText(words.join(' ')), images, widthPt, heightPt });
  }
  await file.destroy();
  return pages;
}

/** No-break spaces are spaces to a reader. */
export function plainText(text: string): string {
  return text.replace(/[\s\u00a0]+/g, ' ');
}
