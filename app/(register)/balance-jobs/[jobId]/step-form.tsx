'use client';

import { useActionState, type ReactNode } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';

type StepFormProps<Value> = {
  jobId: number;
  action: (previous: ActionState<Value>, form: FormData) => Promise<ActionState<Value>>;
  button: string;
  /** What the answer of the server says besides moving the sheet on. */
  said?: (value: Value) => ReactNode;
  children: (state: ActionState) => ReactNode;
};

/** A form of the run sheet: keeps what was typed after a failure, and says what was saved. */
export function StepForm<Value>({ jobId, action, button, said, children }: StepFormProps<Value>) {
  const [state, submit] = useActionState<ActionState<Value>, FormData>(action, IDLE);
  return (
    <form action={submit} className="flex flex-col gap-4" noValidate>
      <ErrorSummary state={state} />
      <input type="hidden" name="jobId" value={jobId} />
      {children(state)}
      <div className="flex flex-wrap items-center gap-3">
        <SubmitButton>{button}</SubmitButton>
        <span role="status">{state.status === 'ok' && (said?.(state.value) ?? 'Saved')}</span>
      </div>
    </form>
  );
}
