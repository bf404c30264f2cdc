import type { ActionState } from '@/lib/schemas/action-state';

/** The sentence that belongs to one field after a failed action, if there is one. */
export function errorOf(state: ActionState | undefined, name: string): string | undefined {
  if (state?.status !== 'failed') return undefined;
  const all = state.failures.length > 0 ? state.failures : [state.failure];
  return all.find((failure) => failure.field === name)?.message;
}

/** What the field starts with: what was typed before, otherwise what the page gives. */
export function startOf(
  state: ActionState | undefined,
  name: string,
  given: string | undefined,
): string {
  const typed = typedOf(state);
  return typed ? (typed[name] ?? '') : (given ?? '');
}

/** What was typed before the action, where it hands that back. */
export function typedOf(
  state: ActionState | undefined,
): Readonly<Record<string, string>> | undefined {
  return state === undefined || state.status === 'idle' ? undefined : state.values;
}
