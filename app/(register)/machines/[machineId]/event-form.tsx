'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { Dialog } from '@/components/ui/dialog';
import { ErrorSummary } from '@/components/ui/error-summary';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextAreaField } from '@/components/ui/text-area-field';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import { recordEventAction } from './actions';

const KINDS = ['cleaning', 'repair', 'alignment', 'trip', 'process', 'other'];

/** Notes what happened to the machine; it stands on its trends from then on. */
export function EventForm({ machineId }: { machineId: number }) {
  const [state, submit] = useActionState<ActionState<{ eventId: number }>, FormData>(
    recordEventAction,
    IDLE,
  );
  return (
    <Dialog title="Record an event" trigger={<Button>Record an event</Button>}>
      <form action={submit} className="flex flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        <input type="hidden" name="machineId" value={machineId} />
        <SelectField
          name="kind"
          label="Kind"
          placeholder="Choose what it was"
          state={state}
          options={KINDS.map((kind) => ({ value: kind, label: kind }))}
        />
        <TextAreaField name="text" label="What happened?" state={state} rows={3} />
        <CheckField
          name="breaksTrend"
          state={state}
          label="Readings before and after are not compared"
        />
        <SubmitButton>Record event</SubmitButton>
        <span role="status">{state.status === 'ok' && 'Event recorded'}</span>
      </form>
    </Dialog>
  );
}
