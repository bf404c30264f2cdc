import 'server-only';

/**
 * Text in lines no wider than `width`, broken at blanks only, so that “mm/s” and a number with its unit
 * stay whole; a word longer than a line is broken where it must be.
 */
export function wrapWords(
  text: string,
  width: number,
  measure: (text: string) => number,
): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ').flatMap((one) => fitting(one, width, measure))) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (line !== '' && measure(longer) > width) {
      lines.push(line);
      line = word;
    } else line = longer;
  }
  return [...lines, line];
}

function fitting(word: string, width: number, measure: (text: string) => number): string[] {
  if (measure(word) <= width) return [word];
  const parts: string[] = [];
  let part = '';
  for (const sign of word) {
    if (part !== '' && measure(part + sign) > width) {
      parts.push(part);
      part = sign;
    } else part += sign;
  }
  return [...parts, part];
}
