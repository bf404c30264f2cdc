'use client';

import { useActionState } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import type { MachineFormDto } from '@/lib/schemas/register';
import { restoreMachineAction, retireMachineAction } from '../actions';

/** Out of the lists, or back into them; the history stays either way. */
export function RetireForm({ machine }: { machine: MachineFormDto }) {
  const retired = machine.state === 'retired';
  const [state, submit] = useActionState<ActionState<{ machineId: number }>, FormData>(
    retired ? restoreMachineAction : retireMachineAction,
    IDLE,
  );
  return (
    <Panel title={retired ? 'Bring it back' : 'Retire it'}>
      <form action={submit} className="flex max-w-3xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        <input type="hidden" name="machineId" value={machine.id} />
        <Field name="reason" label="Why?" state={state} />
        <div>
          <SubmitButton variant={retired ? 'secondary' : 'danger'}>
            {retired ? 'Restore machine' : 'Retire machine'}
          </SubmitButton>
        </div>
      </form>
    </Panel>
  );
}
