'use client';

import { RotationField } from '@/components/register/rotation-field';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { RadioField } from '@/components/ui/radio-field';
import type { DecimalMark } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { SolvedPieces } from '@/lib/schemas/workbench-weights';
import { piecesAction } from './actions';
import { ComputedForm } from './computed-form';
import { CountedField } from './counted-field';
import { ResultColumn } from './result-column';
import { SolvedPiecesPanel } from './solved-pieces';
import { useComputation } from './use-computation';

/** A weight put together from pieces at numbered positions. */
export function PiecesForm({ decimalMark }: { decimalMark: DecimalMark }) {
  const { form, answer, changed } = useComputation<SolvedPieces>(piecesAction);
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
            <Field
              name="mayRemainGmm"
              label="May remain"
              hint="A quarter of the grade’s allowance is usual."
              unit="g·mm"
              kind="decimal"
              state={state}
            />
          </div>
        </Panel>
        <Panel title="Positions and pieces" note="equally spaced, all on the radius of the weight">
          <Positions state={state} />
        </Panel>
      </ComputedForm>
      <ResultColumn {...{ answer, changed }}>
        {answer ? (
          <SolvedPiecesPanel solved={answer} decimalMark={decimalMark} />
        ) : (
          <p className="text-ink-soft">The choices stand here once everything is typed.</p>
        )}
      </ResultColumn>
    </div>
  );
}

function Positions({ state }: { state: ActionState }) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Field name="positions" label="Number of positions" kind="whole" state={state} />
      <Field name="firstDeg" label="Position 1 at" unit="°" kind="decimal" state={state} />
      <RotationField state={state} />
      <CountedField state={state} />
      <RadioField
        name="numbered"
        label="Positions are numbered"
        state={state}
        choices={[
          { value: 'against', label: 'against rotation' },
          { value: 'with', label: 'with rotation' },
        ]}
      />
      <Field name="pieceG" label="Piece" unit="g" kind="decimal" state={state} />
      <Field
        name="maxG"
        label="Most on one position (optional)"
        unit="g"
        kind="decimal"
        state={state}
      />
    </div>
  );
}
