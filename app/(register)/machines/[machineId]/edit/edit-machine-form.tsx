'use client';

import { useActionState } from 'react';
import { MachineFields } from '@/components/register/machine-fields';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import type { MachineFormDto } from '@/lib/schemas/register';
import { editMachineAction } from '../actions';

type EditMachineFormProps = { machine: MachineFormDto; areas: readonly string[] };

/** Who the machine is; a changed tag stays searchable. */
export function EditMachineForm({ machine, areas }: EditMachineFormProps) {
  const [state, submit] = useActionState<ActionState<{ machineId: number }>, FormData>(
    editMachineAction,
    IDLE,
  );
  return (
    <Panel title="Identity">
      <form action={submit} className="flex max-w-3xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        <input type="hidden" name="machineId" value={machine.id} />
        <datalist id="areas">
          {areas.map((area) => (
            <option key={area} value={area} />
          ))}
        </datalist>
        <MachineFields state={state} machine={machine} />
        <Field name="reason" label="Why is it changed?" state={state} />
        <div>
          <SubmitButton>Save changes</SubmitButton>
        </div>
      </form>
    </Panel>
  );
}
