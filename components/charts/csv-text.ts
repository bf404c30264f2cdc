import type { Cell } from './chart-types';

/** Rows as CSV: comma, decimal point, every digit kept, text quoted where it must be. */
export function csvText(head: readonly string[], rows: readonly (readonly Cell[])[]): string {
  return [head, ...rows].map((row) => row.map(field).join(',')).join('\r\n') + '\r\n';
}

function field(cell: Cell): string {
  if (cell === null) return '';
  const text = String(cell);
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
