import { fail, ok, type Result } from '../result';

/** Digits of a content hash that a person types from paper. */
export const SHORT_CODE_DIGITS = 16;

/** A record's short code: the first 16 digits of its hash in fours, “4f0a 91c2 77de 0b13”. */
export function shortCode(contentHash: string): string {
  return (contentHash.slice(0, SHORT_CODE_DIGITS).match(/.{4}/g) ?? []).join(' ');
}

/**
 * A code as typed from paper, short or whole, as the hexadecimal digits it begins with; spaces, dashes
 * and case do not matter. Fails where it is no such code, or too short to tell records apart.
 *
 * Example: `readRecordCode('4F0A-91C2 77de 0b13')` is `4f0a91c277de0b13`.
 */
export function readRecordCode(typed: string): Result<string> {
  const digits = typed.toLowerCase().replace(/[\s\-–·:]/g, '');
  const strange = /[^0-9a-f]/.exec(digits);
  if (strange)
    return fail(
      'not-a-code',
      `“${strange[0]}” is not part of a code: it has the digits 0 to 9 and the letters a to f only. Look again at “${typed.trim()}”.`,
      'code',
    );
  if (digits.length < SHORT_CODE_DIGITS || digits.length > 64)
    return fail(
      'code-length',
      `This code has ${digits.length} digits. A short code has ${SHORT_CODE_DIGITS}, a whole one 64: type it as it stands at the foot of the paper.`,
      'code',
    );
  return ok(digits);
}
