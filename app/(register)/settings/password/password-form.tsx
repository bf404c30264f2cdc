'use client';

import { useActionState } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import { changePasswordAction } from './actions';

/** The password of now and the next one. */
export function PasswordForm() {
  const [state, submit] = useActionState<ActionState<{ personId: number }>, FormData>(
    changePasswordAction,
    IDLE,
  );
  return (
    <Panel title="Change it">
      <form action={submit} className="flex max-w-xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        <Field
          name="currentPassword"
          kind="password"
          label="Password of now"
          state={state}
          autoComplete="current-password"
        />
        <Field
          name="password"
          kind="password"
          label="New password"
          hint="at least 12 characters, such as three words; then sign in again with it"
          state={state}
          autoComplete="new-password"
        />
        <div>
          <SubmitButton>Change password</SubmitButton>
        </div>
      </form>
    </Panel>
  );
}
