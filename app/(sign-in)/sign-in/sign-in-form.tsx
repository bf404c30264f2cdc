'use client';

import { useActionState } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import { signInAction } from './actions';

/** E-mail and password; the address stays after a failure, the password does not. */
export function SignInForm({ next }: { next: string }) {
  const [state, submit] = useActionState<ActionState, FormData>(signInAction, IDLE);
  return (
    <form action={submit} className="flex flex-col gap-4" noValidate>
      <ErrorSummary state={state} />
      <input type="hidden" name="next" value={next} />
      <Field name="email" label="E-mail" kind="email" autoComplete="username" state={state} />
      <Field
        name="password"
        label="Password"
        kind="password"
        autoComplete="current-password"
        state={state}
      />
      <div>
        <SubmitButton>Sign in</SubmitButton>
      </div>
    </form>
  );
}
