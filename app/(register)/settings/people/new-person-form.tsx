'use client';

import { useActionState } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import { createPersonAction } from './actions';
import { RoleAndSites } from './role-and-sites';

/** Somebody new, with a first password to hand over. */
export function NewPersonForm({ sites }: { sites: readonly { id: number; name: string }[] }) {
  const [state, submit] = useActionState<ActionState<{ personId: number }>, FormData>(
    createPersonAction,
    IDLE,
  );
  return (
    <Panel title="Enter a person">
      <form action={submit} className="flex max-w-3xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        {state.status === 'ok' && (
          <Notice kind="success" title="Entered">
            Hand the password over in person.
          </Notice>
        )}
        <RoleAndSites state={state} sites={sites} />
        <Field name="email" kind="email" label="E-mail" state={state} autoComplete="off" />
        <Field
          name="password"
          kind="password"
          label="First password"
          hint="at least 12 characters, such as three words"
          state={state}
          autoComplete="new-password"
        />
        <div>
          <SubmitButton>Enter person</SubmitButton>
        </div>
      </form>
    </Panel>
  );
}
