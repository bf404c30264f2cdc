/** What a computation or command hands back: a value, or an expected failure as a value. */
export type Result<Value, F extends Failure = Failure> =
  { readonly ok: true; readonly value: Value } | { readonly ok: false; readonly failure: F };

/**
 * An expected failure. `code` is a literal that programs act on, `message` the sentence a person
 * reads (cause and remedy), `field` the input it belongs to, dotted for nested inputs; `more` what is
 * wrong besides, where several inputs are.
 */
export type Failure<Code extends string = string> = {
  readonly code: Code;
  readonly message: string;
  readonly field?: string;
  readonly more?: readonly Failure[];
};

/** Wraps a value as a success. */
export function ok<Value>(value: Value): { readonly ok: true; readonly value: Value } {
  return { ok: true, value };
}

/** Wraps a failure with its code, its sentence and, where one input is to blame, that input's name. */
export function fail<const Code extends string>(
  code: Code,
  message: string,
  field?: string,
): { readonly ok: false; readonly failure: Failure<Code> } {
  return { ok: false, failure: field === undefined ? { code, message } : { code, message, field } };
}
