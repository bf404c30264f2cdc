'use client';

import { useActionState } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import type { NewMachineDto } from '@/lib/schemas/register';
import { chooseLimitSetAction } from '../actions';

type LimitFormProps = { machineId: number; limitSets: NewMachineDto['limitSets'] };

/** Which limit set judges the machine from now on. */
export function LimitForm({ machineId, limitSets }: LimitFormProps) {
  const [state, submit] = useActionState<ActionState<{ machineId: number }>, FormData>(
    chooseLimitSetAction,
    IDLE,
  );
  return (
    <Panel title="Limit set" note="earlier readings keep the limits they were judged by">
      <form action={submit} className="flex max-w-3xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        <input type="hidden" name="machineId" value={machineId} />
        <SelectField
          name="limitSetId"
          label="Limit set"
          placeholder="Choose a limit set"
          state={state}
          options={limitSets.map(({ id, label }) => ({ value: String(id), label }))}
        />
        <Field name="reason" label="Why does it fit?" state={state} />
        <div className="flex items-center gap-3">
          <SubmitButton variant="secondary">Use this limit set</SubmitButton>
          <span role="status">{state.status === 'ok' && 'In use from now on'}</span>
        </div>
      </form>
    </Panel>
  );
}
