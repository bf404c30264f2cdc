'use client';

import { Fact, Facts } from '@/components/ui/fact';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { countedInSense } from '@/lib/domain/balancing/convert-angle';
import { formatDegrees, formatQuantity, type DecimalMark } from '@/lib/format';
import type { SolvedSixPlaces } from '@/lib/schemas/workbench-weights';
import { sixPlacesAction } from './actions';
import { ComputedForm } from './computed-form';
import { CountedField } from './counted-field';
import { ResultColumn } from './result-column';
import { useComputation } from './use-computation';

/** Residual unbalance from the sizes with a known weight at six places. */
export function SixPlacesForm({ decimalMark }: { decimalMark: DecimalMark }) {
  const { form, answer, changed } = useComputation<SolvedSixPlaces>(sixPlacesAction);
  const { state } = form;
  return (
    <div className="grid items-start gap-5 xl:grid-cols-2">
      <ComputedForm {...form}>
        <Panel title="The known weight" note="one to two times what is allowed">
          <div className="grid gap-4 sm:grid-cols-2">
            <Field name="massG" label="Mass" unit="g" kind="decimal" state={state} />
            <Field name="radiusMm" label="Radius" unit="mm" kind="decimal" state={state} />
            <Field name="firstDeg" label="First place at" unit="°" kind="decimal" state={state} />
            <CountedField state={state} />
          </div>
        </Panel>
        <Panel title="Sizes" note="60° further each time, the way degrees are counted">
          <div className="grid gap-4 sm:grid-cols-3">
            {Array.from({ length: 6 }, (_, index) => (
              <Field
                key={index}
                name={`amplitudes.${index}`}
                label={`Place ${index + 1}`}
                kind="decimal"
                state={state}
              />
            ))}
          </div>
        </Panel>
      </ComputedForm>
      <ResultColumn {...{ answer, changed }}>
        {answer ? (
          <Residual solved={answer} decimalMark={decimalMark} />
        ) : (
          <p className="text-ink-soft">The residual stands here once everything is typed.</p>
        )}
      </ResultColumn>
    </div>
  );
}

function Residual({ solved, decimalMark }: { solved: SolvedSixPlaces; decimalMark: DecimalMark }) {
  const { residualGmm, fittedGmm, angleDeg, angleSense, worstShare } = solved;
  const gmm = (value: number) => formatQuantity(value, 'g·mm', { decimals: 1, decimalMark });
  return (
    <Panel title="Residual unbalance" note="estimate from sizes alone">
      <Facts>
        <Fact label="from the largest and the smallest size">
          <span className="figures text-lg">{gmm(residualGmm)}</span>
        </Fact>
        <Fact label="from the sine through all">
          <span className="figures">{gmm(fittedGmm)}</span>
        </Fact>
        <Fact label="it lies at, against rotation">
          <span className="figures">{formatDegrees(angleDeg, 1, decimalMark)}</span>
        </Fact>
        {angleSense === 'with' && (
          <Fact label="with rotation, as you count">
            <span className="figures">
              {formatDegrees(countedInSense(angleDeg, 'with'), 1, decimalMark)}
            </span>
          </Fact>
        )}
        <Fact label="farthest from the sine">
          <span className="figures">
            {formatQuantity(100 * worstShare, '% of the mean', { decimals: 1, decimalMark })}
          </span>
        </Fact>
      </Facts>
      <p className="mt-3 text-sm text-ink-soft">
        residual = T·(largest − smallest)/(largest + smallest), T the unbalance of the known weight.
        A weight opposite to where it lies corrects it.
      </p>
    </Panel>
  );
}
