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

/** Takes a set out of the choice; what it judges stays judged by it. */
export function RetireLimitSetForm({ sets }: { sets: readonly LimitSetRow[] }) {
  const [state, submit] = useActionState<State, FormData>(retireLimitSetAction, IDLE);
  return (
    <Panel title="Retire a limit set">
      <form action={submit} className="flex max-w-3xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        {state.status === 'ok' && (
          <Notice kind="success">
            Retired. {formatPlural(state.value.machinesUsing, 'machine')} still judged by it.
          </Notice>
        )}
        <SelectField
          name="limitSetId"
          label="Limit set"
          state={state}
          options={sets.map(({ id, title, edition }) => ({
            value: String(id),
            label: `${title}, ${edition}`,
          }))}
        />
        <Field name="reason" label="Why?" state={state} />
        <div>
          <SubmitButton variant="danger">Retire limit set</SubmitButton>
        </div>
      </form>
    </Panel>
  );
}
