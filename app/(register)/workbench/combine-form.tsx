'use client';

import { useState } from 'react';
import { Fact, Facts } from '@/components/ui/fact';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { countedInSense } from '@/lib/domain/balancing/convert-angle';
import {
  formatDegrees,
  formatMass,
  formatNumber,
  formatQuantity,
  type DecimalMark,
} from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { SolvedCombined } from '@/lib/schemas/workbench-weights';
import { combineAction } from './actions';
import { ComputedForm } from './computed-form';
import { CountedField } from './counted-field';
import { ResultColumn } from './result-column';
import { RowCount } from './row-count';
import { useComputation } from './use-computation';

/** Several weights of one plane as one, at any radius; with one row, a weight moved to another radius. */
export function CombineForm({ decimalMark }: { decimalMark: DecimalMark }) {
  const { form, answer, changed } = useComputation<SolvedCombined>(combineAction);
  const { state } = form;
  return (
    <div className="grid items-start gap-5 xl:grid-cols-2">
      <ComputedForm {...form}>
        <Panel title="Weights of one plane">
          <Weights state={state} />
        </Panel>
        <Panel title="As one weight">
          <div className="grid gap-4 sm:grid-cols-2">
            <Field name="toRadiusMm" label="On radius" unit="mm" kind="decimal" state={state} />
            <CountedField state={state} />
          </div>
        </Panel>
      </ComputedForm>
      <ResultColumn {...{ answer, changed }}>
        {answer ? (
          <One solved={answer} decimalMark={decimalMark} />
        ) : (
          <p className="text-ink-soft">The one weight stands here once everything is typed.</p>
        )}
      </ResultColumn>
    </div>
  );
}

function Weights({ state }: { state: ActionState }) {
  const [count, setCount] = useState(2);
  return (
    <div className="flex flex-col gap-4">
      {Array.from({ length: count }, (_, index) => (
        <fieldset key={index} className="grid gap-4 sm:grid-cols-3">
          <legend className="text-sm font-semibold">Weight {index + 1}</legend>
          <Field
            name={`weights.${index}.massG`}
            label="Mass"
            unit="g"
            kind="decimal"
            state={state}
          />
          <Field
            name={`weights.${index}.radiusMm`}
            label="Radius"
            unit="mm"
            kind="decimal"
            state={state}
          />
          <Field
            name={`weights.${index}.angleDeg`}
            label="Angle"
            unit="°"
            kind="decimal"
            state={state}
          />
        </fieldset>
      ))}
      <RowCount count={count} least={1} what="weight" onChange={setCount} />
    </div>
  );
}

function One({ solved, decimalMark }: { solved: SolvedCombined; decimalMark: DecimalMark }) {
  const { massG, angleDeg, angleSense, unbalanceGmm, radiusMm, sumOverOne } = solved;
  return (
    <Panel title="One weight">
      <Facts>
        <Fact label={`on ${formatQuantity(radiusMm, 'mm', { decimalMark })}`}>
          <span className="figures text-lg">{formatMass(massG, decimalMark)}</span>
        </Fact>
        <Fact label="at, against rotation">
          <span className="figures text-lg">{formatDegrees(angleDeg, 1, decimalMark)}</span>
        </Fact>
        {angleSense === 'with' && (
          <Fact label="at, with rotation, as you count">
            <span className="figures">
              {formatDegrees(countedInSense(angleDeg, 'with'), 1, decimalMark)}
            </span>
          </Fact>
        )}
        <Fact label="unbalance">
          <span className="figures">
            {formatQuantity(unbalanceGmm, 'g·mm', { decimals: 0, decimalMark })}
          </span>
        </Fact>
        {sumOverOne !== null && (
          <Fact label="hung in all, over this one">
            <span className="figures">
              {formatNumber(sumOverOne, { decimals: 2, decimalMark })} times
            </span>
          </Fact>
        )}
      </Facts>
    </Panel>
  );
}
