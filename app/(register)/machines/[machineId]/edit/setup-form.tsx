'use client';

import { useActionState } from 'react';
import { SetupFields } from '@/components/register/setup-fields';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import { newSetupAction } from '../actions';

/** A new set-up: whenever mark, tacho, sensors or support have moved. */
export function SetupForm({ machineId }: { machineId: number }) {
  const [state, submit] = useActionState<
    ActionState<{ setupId: number; number: number }>,
    FormData
  >(newSetupAction, IDLE);
  return (
    <Panel title="New set-up" note="coefficients and lags are not compared across set-ups">
      <form action={submit} className="flex max-w-3xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        <input type="hidden" name="machineId" value={machineId} />
        <SetupFields state={state} />
        <Field name="reason" label="What has moved?" state={state} />
        <div className="flex items-center gap-3">
          <SubmitButton variant="secondary">Start a new set-up</SubmitButton>
          <span role="status">{state.status === 'ok' && `Set-up ${state.value.number} begun`}</span>
        </div>
      </form>
    </Panel>
  );
}
