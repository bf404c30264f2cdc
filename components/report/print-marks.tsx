import { shortCode } from '@/lib/domain/balance-job/record-code';
import type { Report } from '@/lib/schemas/report';

/**
 * What stands on every printed page: what it is, its revision, the page, the convention of angles and
 * the hash. The paper is left to the print dialog, so that A4 and Letter both fit.
 */
export function PrintMarks({ report }: { report: Report }) {
  const { about, revision, convention, contentHash, isDraft, made } = report;
  const hash = contentHash
    ? [`content ${contentHash} · check it with ${shortCode(contentHash)}`]
    : [];
  const foot = [convention, ...(isDraft ? [revision] : hash), made];
  return (
    <style>{`@page {
  size: auto;
  margin: 18mm 15mm 22mm;
  @top-left { content: ${cssText(about)}; ${SMALL} }
  @top-right { content: ${cssText(`${revision} · page `)} counter(page) ${cssText(' of ')} counter(pages); ${SMALL} }
  @bottom-left { content: ${foot.map(cssText).join(' "\\a" ')}; white-space: pre; text-align: left; ${SMALL} }
}`}</style>
  );
}

const SMALL = 'font: 7pt/1.3 sans-serif; color: black;';

/** A string of CSS in which nothing but letters, digits and blanks stands for itself. */
function cssText(text: string): string {
  const escaped = Array.from(text, (sign) =>
    /[A-Za-z0-9 ]/.test(sign) ? sign : `\\${(sign.codePointAt(0) ?? 0).toString(16)} `,
  );
  return `"${escaped.join('')}"`;
}
