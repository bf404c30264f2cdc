'use client';

import { RotationField } from '@/components/register/rotation-field';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { RadioField } from '@/components/ui/radio-field';
import type { DecimalMark } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { SolvedSplit } from '@/lib/schemas/workbench';
import { splitAction } from './actions';
import { ComputedForm } from './computed-form';
import { ResultColumn } from './result-column';
import { SolvedSplitPanel } from './solved-split';
import { useComputation } from './use-computation';

/** A weight carried by the numbered positions either side of it. */
export function SplitForm({ decimalMark }: { decimalMark: DecimalMark }) {
  const { form, answer, changed } = useComputation<SolvedSplit>(splitAction);
  const { state } = form;
  return (
    <div className="grid items-start gap-5 xl:grid-cols-2">
      <ComputedForm {...form}>
        <Panel title="The weight">
          <div className="grid gap-4 sm:grid-cols-2">
            <Field name="massG" label="Mass" unit="g" kind="decimal" state={state} />
            <Field name="radiusMm" label="Radius" unit="mm" kind="decimal" state={state} />
            <Field
              name="angleDeg"
              label="Angle from the mark"
              unit="°"
              kind="decimal"
              state={state}
            />
          </div>
        </Panel>
        <Panel title="The positions" note="equally spaced, all on the radius of the weight">
          <Positions state={state} />
        </Panel>
      </ComputedForm>
      <ResultColumn {...{ answer, changed }}>
        {answer ? (
          <SolvedSplitPanel solved={answer} decimalMark={decimalMark} />
        ) : (
          <p className="text-ink-soft">The shares stand here once everything is typed.</p>
        )}
      </ResultColumn>
    </div>
  );
}

function Positions({ state }: { state: ActionState }) {
  const senses = [
    { value: 'against', label: 'against rotation' },
    { value: 'with', label: 'with rotation' },
  ];
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Field name="positions" label="Number of positions" kind="whole" state={state} />
      <Field name="firstDeg" label="Position 1 at" unit="°" kind="decimal" state={state} />
      <RotationField state={state} />
      <RadioField name="angleSense" label="Degrees are counted" state={state} choices={senses} />
      <RadioField name="numbered" label="Positions are numbered" state={state} choices={senses} />
      <Field
        name="maxG"
        label="Most on one position (optional)"
        unit="g"
        kind="decimal"
        state={state}
      />
      <Field
        name="speedRpm"
        label="Speed (optional)"
        hint="For the force on each fixing."
        unit="r/min"
        kind="decimal"
        state={state}
      />
    </div>
  );
}
