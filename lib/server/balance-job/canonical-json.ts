import 'server-only';
import { createHash } from 'node:crypto';

/**
 * The one JSON text of a value: keys of every object in ascending order of their UTF-16 code units, no
 * white space, numbers as ECMAScript writes them (RFC 8785). Members that are undefined are left out.
 */
export function canonicalJson(value: unknown): string {
  if (Array.isArray(value))
    return `[${value.map((item: unknown) => canonicalJson(item ?? null)).join(',')}]`;
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  const members = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([key, member]) => `${JSON.stringify(key)}:${canonicalJson(member)}`);
  return `{${members.join(',')}}`;
}

/** SHA-256 over the canonical text, 64 hexadecimal digits: what a signature and an addendum carry. */
export function contentHash(value: unknown): string {
  return createHash('sha256').update(canonicalJson(value)).digest('hex');
}
