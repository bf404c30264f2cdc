import { ok, type Result } from '../result';
import type { DecimalMark, Delimiter } from './column-layout';
import { intakeFailure, type IntakeFailure } from './intake-failure';

/** Numbers as exports spell them, with either mark. */
export const NUMBER_SHAPE = /^\s*[+-]?(\d[\d.,]*|[.,]\d+)(e[+-]?\d+)?\s*$/i;

const GROUPS_OF_THREE = /^\s*[+-]?[1-9]\d{0,2}([.,]\d{3})+\s*$/;

/**
 * The decimal mark of a whole file, from its cells. With comma-separated columns the mark is the
 * point, unless quoted cells hold commas. Null, meaning that a person must say, when every marked
 * cell reads both ways (`1,234` is 1.234 or 1234). Fails when one number holds both marks, or one
 * file both kinds of number.
 *
 * Example: cells `0,5` and `1,25` say comma; `1,234` alone says nothing.
 */
export function decimalMarkOf(
  cells: readonly string[],
  delimiter: Delimiter,
  fileName: string,
): Result<DecimalMark | null, IntakeFailure> {
  const numbers = cells.filter((cell) => NUMBER_SHAPE.test(cell));
  const commas = numbers.filter((cell) => cell.includes(','));
  const points = numbers.filter((cell) => cell.includes('.'));
  const grouped = numbers.find((cell) => (cell.match(/[.,]/g)?.length ?? 0) > 1);
  if (grouped !== undefined) return thousands(fileName, grouped.trim());
  if (commas.length > 0 && points.length > 0) return mixed(fileName, commas[0], points[0]);
  if (commas.length > 0) return ok(commas.every(readsBothWays) ? null : 'comma');
  const certain = delimiter === ',' || points.length === 0 || !points.every(readsBothWays);
  return ok(certain ? 'point' : null);
}

function readsBothWays(cell: string): boolean {
  return GROUPS_OF_THREE.test(cell);
}

function thousands(fileName: string, value: string): ReturnType<typeof intakeFailure> {
  return intakeFailure(
    'THOUSANDS_SEPARATORS',
    fileName,
    { value },
    `"${value}" holds more than one point or comma; export numbers without thousands separators.`,
  );
}

function mixed(
  fileName: string,
  comma: string | undefined,
  point: string | undefined,
): ReturnType<typeof intakeFailure> {
  return intakeFailure(
    'MIXED_DECIMAL_MARKS',
    fileName,
    {},
    `"${comma?.trim() ?? ''}" and "${point?.trim() ?? ''}" use different decimal marks; export the file with one of them.`,
  );
}
