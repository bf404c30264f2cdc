import type { ActionState } from '@/lib/schemas/action-state';

/** The sentence that belongs to one field after a failed action, if there is one. */
export function errorOf(state: ActionState | undefined, name: string): string | undefined {
  if (state?.status !== 'failed') return undefined;
  const all = state.failures.length > 0 ? state.failures : [state.failure];
  return all.find((failure) => failure.field === name)?.message;
}

/** What the field starts with: what was typed before a failure, otherwise what the page gives. */
export function startOf(
  state: ActionState | undefined,
  name: string,
  given: string | undefined,
): string {
  if (state?.status === 'failed') return state.values[name] ?? '';
  return given ?? '';
}
