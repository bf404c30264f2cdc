import type { Delimiter } from './column-layout';
import { headTable, usualWidth } from './head-table';

/** What separates columns, and what a comma does where that was the question. */
export type Sniffed = {
  readonly delimiter: Delimiter;
  readonly comma: 'settled' | 'undecided' | 'both delimiter and decimal mark';
};

const NUMBERS_ONLY = /^[\d\s.,;+\-eE"]+$/;

/**
 * The delimiter of a file from its lines of numbers: semicolon or tab where most of them have one,
 * else comma, else none. A comma in a file without semicolons and tabs may be the decimal mark
 * instead: the header's width settles it; without a header and without points it stays undecided.
 *
 * Example: header `acceleration_g` over `0,53` is one column with decimal commas.
 */
export function sniffDelimiter(lines: readonly string[]): Sniffed {
  const numbers = lines.filter((line) => NUMBERS_ONLY.test(line) && /\d/.test(line));
  const judged = numbers.length > 0 ? numbers : lines.filter((line) => !line.startsWith('#'));
  const separates = (mark: string): boolean =>
    judged.filter((line) => line.includes(mark)).length > 0.8 * judged.length;
  if (separates(';')) return { delimiter: ';', comma: 'settled' };
  if (separates('\t')) return { delimiter: '\t', comma: 'settled' };
  return separates(',') ? commaMeaning(lines, numbers) : { delimiter: null, comma: 'settled' };
}

function commaMeaning(lines: readonly string[], numbers: readonly string[]): Sniffed {
  const { header, rows } = headTable(lines, ',');
  const width = usualWidth(rows);
  const separator: Sniffed = { delimiter: ',', comma: 'settled' };
  if (numbers.some((line) => line.includes('.') || line.includes('"'))) return separator;
  if (header === null) {
    return width % 2 === 0 ? { delimiter: ',', comma: 'undecided' } : separator;
  }
  const names = header.cells.length;
  if (width !== 2 * names) return separator;
  return names === 1
    ? { delimiter: null, comma: 'settled' }
    : { delimiter: ',', comma: 'both delimiter and decimal mark' };
}
