'use client';

import { useActionState } from 'react';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { RadioField } from '@/components/ui/radio-field';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import { createLimitSetAction } from './actions';

const NUMBERS = [
  { name: 'bAb', label: 'Boundary A/B', unit: 'mm/s rms' },
  { name: 'bBc', label: 'Boundary B/C', unit: 'mm/s rms' },
  { name: 'bCd', label: 'Boundary C/D', unit: 'mm/s rms' },
  { name: 'bandLowHz', label: 'Band from', unit: 'Hz', usual: '10' },
  { name: 'bandHighHz', label: 'Band to', unit: 'Hz', usual: '1000' },
  { name: 'speedMinRpm', label: 'Speed from (optional)', unit: 'r/min' },
  { name: 'speedMaxRpm', label: 'Speed to (optional)', unit: 'r/min' },
  { name: 'powerMinKw', label: 'Power from (optional)', unit: 'kW' },
  { name: 'powerMaxKw', label: 'Power to (optional)', unit: 'kW' },
] as const;

/** A limit set of a site's own. */
export function NewLimitSetForm({ sites }: { sites: readonly { id: number; name: string }[] }) {
  const [state, submit] = useActionState<ActionState<{ limitSetId: number }>, FormData>(
    createLimitSetAction,
    IDLE,
  );
  return (
    <Panel title="Enter a limit set of the site’s own">
      <form action={submit} className="flex max-w-4xl flex-col gap-4" noValidate>
        <ErrorSummary state={state} />
        {state.status === 'ok' && (
          <Notice kind="success">Entered. Choose it on a machine’s edit page.</Notice>
        )}
        <div className="grid gap-4 sm:grid-cols-2">
          <SelectField
            name="siteId"
            label="Site"
            state={state}
            options={sites.map(({ id, name }) => ({ value: String(id), label: name }))}
          />
          <Field name="title" label="Title" state={state} />
          <Field name="edition" label="Edition or date" state={state} />
          <Field
            name="citation"
            label="Where the values come from"
            hint="standard, maker’s document, contract"
            state={state}
          />
        </div>
        <div className="grid gap-4 sm:grid-cols-3">
          {NUMBERS.map(({ name, label, unit, ...rest }) => (
            <Field
              key={name}
              name={name}
              label={label}
              unit={unit}
              kind="decimal"
              state={state}
              defaultValue={'usual' in rest ? rest.usual : undefined}
            />
          ))}
        </div>
        <RadioField
          name="support"
          label="Support class"
          state={state}
          choices={[
            { value: 'rigid', label: 'rigid' },
            { value: 'flexible', label: 'flexible' },
            { value: 'any', label: 'any' },
          ]}
        />
        <div>
          <SubmitButton>Enter limit set</SubmitButton>
        </div>
      </form>
    </Panel>
  );
}
