import { z } from 'zod';

type NumberRule = {
  /** What the number is, for the message: "the trial mass". */
  readonly what: string;
  readonly unit?: string;
  readonly min?: number;
  readonly above?: number;
  readonly max?: number;
};

/**
 * A number as a person types it: decimal point or comma, never thousands separators. Text that is
 * not a number, or is out of range, fails with a sentence naming what was typed and what is expected.
 */
export function typedNumber(rule: NumberRule) {
  return z
    .union([z.number(), z.string()], { error: notANumber(rule, '') })
    .transform((typed, context) => numberOrIssue(rule, typed, context));
}

/** The same, where leaving it empty means "not known". */
export function optionalNumber(rule: NumberRule) {
  // Not a union with `typedNumber`: a union answers with its own words where each member has failed.
  return z
    .union([z.number(), z.string(), z.null()], { error: notANumber(rule, '') })
    .default(null)
    .transform((typed, context): number | null => {
      if (typed === null || typed === '') return null;
      return numberOrIssue(rule, typed, context);
    });
}

function numberOrIssue(rule: NumberRule, typed: number | string, context: z.RefinementCtx) {
  const value = typeof typed === 'number' ? typed : readNumber(typed);
  const problem = value === null ? notANumber(rule, String(typed)) : outOfRange(rule, value);
  if (problem === null && value !== null) return value;
  context.addIssue({ code: 'custom', message: problem ?? notANumber(rule, String(typed)) });
  return z.NEVER;
}

/** An id that came through a form or an address. */
export const id = z.coerce.number().int().positive();

/** A line of text that must say something. */
export function text(what: string, longest: number) {
  return z
    .string({ error: `Write ${what}.` })
    .trim()
    .min(1, `Write ${what}.`)
    .max(longest, `Keep ${what} within ${longest} characters.`);
}

/** A tick: a form sends "on" where it is ticked and nothing where it is not. */
export const tick = z
  .union([z.boolean(), z.literal('on'), z.literal('true'), z.literal('false')])
  .default(false)
  .transform((value) => value === true || value === 'on' || value === 'true');

function readNumber(typed: string): number | null {
  const plain = typed.trim().replace(/\u2212/g, '-');
  if (!/^[+-]?(\d+([.,]\d*)?|[.,]\d+)$/.test(plain)) return null;
  return Number(plain.replace(',', '.'));
}

function notANumber(rule: NumberRule, typed: string): string {
  if (typed.trim() === '') return `Write ${rule.what}${unitHint(rule)}.`;
  return `“${typed}” is not a number. Write ${rule.what}${unitHint(rule)} as digits, for example 12.5.`;
}

function outOfRange(rule: NumberRule, value: number): string | null {
  const { what, min, above, max } = rule;
  const unit = rule.unit ? `\u00a0${rule.unit}` : '';
  if (above !== undefined && value <= above)
    return `${sentence(what)} is ${value}${unit}: it must be more than ${above}${unit}.`;
  if (min !== undefined && value < min)
    return `${sentence(what)} is ${value}${unit}: it must be at least ${min}${unit}.`;
  if (max !== undefined && value > max)
    return `${sentence(what)} is ${value}${unit}: it must be at most ${max}${unit}.`;
  return null;
}

function unitHint(rule: NumberRule): string {
  return rule.unit ? ` in ${rule.unit}` : '';
}

function sentence(what: string): string {
  return what.charAt(0).toUpperCase() + what.slice(1);
}
