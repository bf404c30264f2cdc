'use client';

import type { ReactNode, SyntheticEvent } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import type { ActionState } from '@/lib/schemas/action-state';

type ComputedFormProps = {
  state: ActionState;
  pending: boolean;
  onSubmit: (event: SyntheticEvent<HTMLFormElement>) => void;
  onInput: () => void;
  children: ReactNode;
};

/** What is typed for a computation, with its button. */
export function ComputedForm({ state, pending, onSubmit, onInput, children }: ComputedFormProps) {
  return (
    <form {...{ onSubmit, onInput }} className="flex min-w-0 flex-col gap-5" noValidate>
      <ErrorSummary state={state} title="Nothing was computed" />
      {children}
      <div>
        <Button type="submit" variant="primary" pending={pending}>
          Compute
        </Button>
      </div>
    </form>
  );
}
