import type { Failure } from '@/lib/domain/result';

/**
 * What a form's action hands back. A failed one returns what was typed, so that nothing is lost; so does a
 * computation, whose form stays on the page beside its answer.
 */
export type ActionState<Value = unknown> =
  | { readonly status: 'idle' }
  | {
      readonly status: 'ok';
      readonly value: Value;
      readonly values?: Readonly<Record<string, string>>;
    }
  | {
      readonly status: 'failed';
      readonly failure: Failure;
      readonly failures: readonly Failure[];
      readonly values: Readonly<Record<string, string>>;
    };

export const IDLE: { readonly status: 'idle' } = { status: 'idle' };
