import 'server-only';

/** An instant of a raw row as ISO text. */
export function iso(value: Date | string): string {
  return (value instanceof Date ? value : new Date(value)).toISOString();
}

/** The same where there may be none. */
export function isoOrNull(value: Date | string | null): string | null {
  return value === null ? null : iso(value);
}
