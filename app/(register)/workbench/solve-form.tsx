'use client';

import { RotationField } from '@/components/register/rotation-field';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { RadioField } from '@/components/ui/radio-field';
import type { DecimalMark } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { SolvedRuns } from '@/lib/schemas/workbench';
import { solveRunsAction } from './actions';
import { ComputedForm } from './computed-form';
import { ReadingFields } from './reading-fields';
import { ResultColumn } from './result-column';
import { SolvedRunsPanels } from './solved-runs';
import { TrialFields } from './trial-fields';
import { useComputation } from './use-computation';

type SolveFormProps = { planes: 1 | 2; decimalMark: DecimalMark };

/** Base run and one trial a plane, typed; the answer beside them. */
export function SolveForm({ planes, decimalMark }: SolveFormProps) {
  const { form, answer, changed } = useComputation<SolvedRuns>(solveRunsAction);
  const { state } = form;
  const indices = Array.from({ length: planes }, (_, index) => index);
  return (
    <div className="grid items-start gap-5 xl:grid-cols-2">
      <ComputedForm {...form}>
        <Panel title="How it is read and counted" note="nothing is assumed">
          <Senses state={state} />
        </Panel>
        <Panel title="Base run" note="as found">
          <ReadingFields at="base" points={planes} state={state} />
        </Panel>
        {indices.map((index) => (
          <Panel
            key={index}
            title={planes === 1 ? 'Trial run' : `Trial run, plane ${String(index + 1)}`}
          >
            <TrialFields index={index} planes={planes} state={state} />
          </Panel>
        ))}
      </ComputedForm>
      <ResultColumn {...{ answer, changed }}>
        {answer ? (
          <SolvedRunsPanels solved={answer} decimalMark={decimalMark} />
        ) : (
          <p className="text-ink-soft">The answer stands here once everything is typed.</p>
        )}
      </ResultColumn>
    </div>
  );
}

function Senses({ state }: { state: ActionState }) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <RadioField
        name="unit"
        label="1x sizes are in"
        state={state}
        choices={[
          { value: 'mm/s rms', label: 'mm/s rms' },
          { value: 'µm p-p', label: 'µm p-p' },
        ]}
      />
      <RadioField
        name="phaseSense"
        label="The instrument shows phase as"
        state={state}
        choices={[
          { value: 'lag', label: 'lag', hint: 'grows as the peak comes later' },
          { value: 'lead', label: 'lead', hint: 'grows as the peak comes earlier' },
        ]}
      />
      <RadioField
        name="angleSense"
        label="Degrees on the rotor are counted"
        state={state}
        choices={[
          { value: 'against', label: 'against rotation' },
          { value: 'with', label: 'with rotation' },
        ]}
      />
      <RotationField state={state} />
      <Field name="speedRpm" label="Speed of the runs" unit="r/min" kind="decimal" state={state} />
      <Field
        name="rotorMassKg"
        label="Rotor mass (optional)"
        unit="kg"
        kind="decimal"
        state={state}
      />
      <Field
        name="scatter"
        label="Scatter of repeats (optional)"
        hint="How far repeats of one run lie apart, in the unit of the sizes: gives the answer its uncertainty."
        kind="decimal"
        state={state}
      />
    </div>
  );
}
