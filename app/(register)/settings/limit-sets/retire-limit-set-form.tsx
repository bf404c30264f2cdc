'use client';

import { useActionState } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { formatPlural } from '@/lib/format';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import type { LimitSetRow } from '@/lib/schemas/settings';
import { retireLimitSetAction } from './actions';

type State = ActionState<{ limitSetId: number; machinesUsing: number }>;

/** Takes one of the sites' own sets out of the choice; what it judges stays judged by it. */
export function RetireLimitSetForm({ own }: { own: readonly LimitSetRow[] }) {
  const [state, submit] = useActionState<State, FormData>(retireLimitSetAction, IDLE);
  const inUse = own.filter((set) => set.state === 'in use');
  return (
    <Panel title="Retire a limit set">
      <form action={submit} className="flex max-w-3xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        {state.status === 'ok' && (
          <Notice kind="success">
            Retired: it can no longer be chosen. {judgedBy(state.value.machinesUsing)}
          </Notice>
        )}
        {inUse.length === 0 ? (
          <p className="text-ink-soft">No set of a site’s own is in use.</p>
        ) : (
          <RetireFields sets={inUse} state={state} />
        )}
      </form>
    </Panel>
  );
}

function RetireFields({ sets, state }: { sets: readonly LimitSetRow[]; state: State }) {
  return (
    <>
      <SelectField
        name="limitSetId"
        label="Limit set"
        placeholder="Choose a limit set"
        hint="Machines that it judges keep it until another is chosen for them."
        state={state}
        options={sets.map(({ id, title, edition, machines }) => ({
          value: String(id),
          label: `${title}, ${edition} (${formatPlural(machines, 'machine')})`,
        }))}
      />
      <Field name="reason" label="Why?" state={state} />
      <div>
        <SubmitButton variant="danger">Retire limit set</SubmitButton>
      </div>
    </>
  );
}

function judgedBy(machines: number): string {
  if (machines === 0) return 'No machine is judged by it.';
  if (machines === 1) return '1 machine is still judged by it.';
  return `${formatPlural(machines, 'machine')} are still judged by it.`;
}
