import 'server-only';

/** The id in an address; 0, which no record has, where it is none. */
export function idOf(text: string): number {
  return /^\d{1,9}$/.test(text) ? Number(text) : 0;
}

/** A number in a query of an address; null where it is missing or no number. */
export function numberOf(search: URLSearchParams, name: string): number | null {
  const text = search.get(name);
  if (text === null || text.trim() === '') return null;
  const value = Number(text);
  return Number.isFinite(value) ? value : null;
}

/** How many columns a curve is reduced to: what was asked for, within reason. */
export function columnsOf(search: URLSearchParams): number {
  return Math.round(Math.min(4000, Math.max(50, numberOf(search, 'columns') ?? 800)));
}
