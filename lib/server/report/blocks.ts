import 'server-only';
import type { ReportBlock, ReportCell, ReportColumn, ReportRow } from '@/lib/schemas/report';

/** Convention of every report; stands on each of its pages. */
export const CONVENTION =
  'Angles: degrees against rotation from the mark. Phase is lag: the turn from the mark at the tacho to the next positive peak.';

/** A column of figures. */
export const figures = (label: string): ReportColumn => ({ label, numeric: true });

/** A column of words. */
export const words = (label: string): ReportColumn => ({ label });

/** A table; where there is no row, the sentence that says so. */
export function table(
  caption: string,
  columns: ReportColumn[],
  rows: (ReportRow | ReportCell[])[],
  empty = 'None.',
): ReportBlock {
  if (rows.length === 0) return quiet(empty);
  return {
    kind: 'table',
    caption,
    columns,
    rows: rows.map((row) => (Array.isArray(row) ? { cells: row } : row)),
  };
}

export function facts(...pairs: (readonly [string, string | null])[]): ReportBlock {
  return {
    kind: 'facts',
    facts: pairs.flatMap(([label, value]) => (value === null ? [] : [{ label, value }])),
  };
}

export function plain(text: string): ReportBlock {
  return { kind: 'text', text, look: 'plain' };
}

export function quiet(text: string): ReportBlock {
  return { kind: 'text', text, look: 'quiet' };
}

export function strong(text: string): ReportBlock {
  return { kind: 'text', text, look: 'strong' };
}
