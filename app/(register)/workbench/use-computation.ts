'use client';

import { startTransition, useActionState, useState, type SyntheticEvent } from 'react';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';

type ComputeAction<Value> = (
  previous: ActionState<Value>,
  form: FormData,
) => Promise<ActionState<Value>>;

/** Sends a form to a computation. The form keeps what was typed, whatever comes back. */
export function useComputation<Value>(action: ComputeAction<Value>) {
  const [state, submit, pending] = useActionState<ActionState<Value>, FormData>(action, IDLE);
  const [changed, setChanged] = useState(false);
  // Not `action={submit}`: React would empty the form once the answer is there.
  const onSubmit = (event: SyntheticEvent<HTMLFormElement>) => {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    if (pending) return;
    setChanged(false);
    startTransition(() => submit(form));
  };
  const answer = state.status === 'ok' ? state.value : null;
  return {
    form: { state, pending, onSubmit, onInput: () => setChanged(true) },
    answer,
    /** Whether something was typed since the answer was computed. */
    changed: changed && answer !== null,
  };
}
