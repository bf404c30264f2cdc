'use client';

import { useState } from 'react';
import { RotationField } from '@/components/register/rotation-field';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { RadioField } from '@/components/ui/radio-field';
import type { DecimalMark } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { SolvedWithoutPhase } from '@/lib/schemas/workbench-weights';
import { withoutPhaseAction } from './actions';
import { ComputedForm } from './computed-form';
import { CountedField } from './counted-field';
import { ResultColumn } from './result-column';
import { RowCount } from './row-count';
import { SolvedWithoutPhasePanel } from './solved-without-phase';
import { useComputation } from './use-computation';

/** Sizes with one weight at three places or more; no tacho is needed. */
export function WithoutPhaseForm({ decimalMark }: { decimalMark: DecimalMark }) {
  const { form, answer, changed } = useComputation<SolvedWithoutPhase>(withoutPhaseAction);
  const { state } = form;
  return (
    <div className="grid items-start gap-5 xl:grid-cols-2">
      <ComputedForm {...form}>
        <Panel title="How you read and count">
          <div className="grid gap-4 sm:grid-cols-3">
            <RadioField
              name="unit"
              label="1x sizes are read in"
              state={state}
              choices={[
                { value: 'mm/s rms', label: 'mm/s rms' },
                { value: 'µm p-p', label: 'µm p-p' },
              ]}
            />
            <CountedField state={state} />
            <RotationField state={state} />
          </div>
        </Panel>
        <Panel title="Base and trial weight" note="one and the same weight at every place">
          <div className="grid gap-4 sm:grid-cols-3">
            <Field name="baseAmplitude" label="Base run, size" kind="decimal" state={state} />
            <Field name="trialMassG" label="Trial weight" unit="g" kind="decimal" state={state} />
            <Field name="radiusMm" label="Its radius" unit="mm" kind="decimal" state={state} />
          </div>
        </Panel>
        <Panel title="Runs" note="the weight moved round; three places or more">
          <Runs state={state} />
        </Panel>
      </ComputedForm>
      <ResultColumn {...{ answer, changed }}>
        {answer ? (
          <SolvedWithoutPhasePanel solved={answer} decimalMark={decimalMark} />
        ) : (
          <p className="text-ink-soft">The correction stands here once everything is typed.</p>
        )}
      </ResultColumn>
    </div>
  );
}

function Runs({ state }: { state: ActionState }) {
  const [count, setCount] = useState(3);
  return (
    <div className="flex flex-col gap-4">
      {Array.from({ length: count }, (_, index) => (
        <fieldset key={index} className="grid gap-4 sm:grid-cols-2">
          <legend className="text-sm font-semibold">Place {index + 1}</legend>
          <Field
            name={`runs.${index}.angleDeg`}
            label="Weight at"
            unit="°"
            kind="decimal"
            state={state}
          />
          <Field name={`runs.${index}.amplitude`} label="Size" kind="decimal" state={state} />
        </fieldset>
      ))}
      <RowCount count={count} least={3} what="place" onChange={setCount} />
    </div>
  );
}
