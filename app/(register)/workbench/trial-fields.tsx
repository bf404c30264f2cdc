'use client';

import { Field } from '@/components/ui/field';
import { RadioField } from '@/components/ui/radio-field';
import type { ActionState } from '@/lib/schemas/action-state';
import { ReadingFields } from './reading-fields';

type TrialFieldsProps = { index: number; planes: number; state: ActionState };

/** One trial weight, what the points read with it, and whether it stayed. */
export function TrialFields({ index, planes, state }: TrialFieldsProps) {
  const at = `trials.${index}`;
  return (
    <div className="flex flex-col gap-4">
      <div className="grid gap-3 sm:grid-cols-2">
        <Field name={`${at}.massG`} label="Trial weight" unit="g" kind="decimal" state={state} />
        <Field
          name={`${at}.radiusMm`}
          label="Radius of the trial weight"
          unit="mm"
          kind="decimal"
          state={state}
        />
        <Field
          name={`${at}.angleDeg`}
          label="Angle from the mark"
          unit="°"
          kind="decimal"
          state={state}
        />
        <Field
          name={`planes.${index}.radiusMm`}
          label="Radius of the correction"
          unit="mm"
          kind="decimal"
          state={state}
        />
      </div>
      <ReadingFields at={`${at}.readings`} points={planes} state={state} />
      <RadioField
        name={`${at}.stays`}
        label="After this run the trial weight"
        state={state}
        choices={[
          { value: 'taken off', label: 'is taken off' },
          { value: 'stays on', label: 'stays on the rotor' },
        ]}
      />
    </div>
  );
}
