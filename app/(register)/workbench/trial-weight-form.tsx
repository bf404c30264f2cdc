'use client';

import { Caution } from '@/components/ui/caution';
import { Fact, Facts } from '@/components/ui/fact';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { RadioField } from '@/components/ui/radio-field';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatMass, formatNumber, formatQuantity, type DecimalMark } from '@/lib/format';
import type { SolvedTrialWeight } from '@/lib/schemas/workbench-weights';
import { trialWeightAction } from './actions';
import { ComputedForm } from './computed-form';
import { ResultColumn } from './result-column';
import { useComputation } from './use-computation';

const FIELDS = [
  { name: 'radiusMm', label: 'Radius of the trial weight', unit: 'mm' },
  { name: 'speedRpm', label: 'Speed', unit: 'r/min' },
  { name: 'rotorMassKg', label: 'Rotor mass', unit: 'kg' },
  { name: 'planeLimitG', label: 'Most in the plane (optional)', unit: 'g' },
  { name: 'amplitudeNow', label: '1x reading now (optional)', unit: undefined },
  { name: 'perKgMm', label: 'Known coefficient, per kg·mm (optional)', unit: undefined },
] as const;

/** A trial weight that is heard and does no harm. */
export function TrialWeightForm({ decimalMark }: { decimalMark: DecimalMark }) {
  const { form, answer, changed } = useComputation<SolvedTrialWeight>(trialWeightAction);
  const { state } = form;
  return (
    <div className="grid items-start gap-5 xl:grid-cols-2">
      <ComputedForm {...form}>
        <Panel title="The rotor">
          <div className="grid gap-4 sm:grid-cols-2">
            <RadioField
              name="planes"
              label="Planes balanced"
              state={state}
              choices={[
                { value: 'one', label: 'one' },
                { value: 'two', label: 'two', hint: 'half the weight on the nearest bearing' },
              ]}
            />
            {FIELDS.map((field) => (
              <Field key={field.name} {...field} kind="decimal" state={state} />
            ))}
          </div>
        </Panel>
      </ComputedForm>
      <ResultColumn {...{ answer, changed }}>
        {answer ? (
          <Proposal solved={answer} decimalMark={decimalMark} />
        ) : (
          <p className="text-ink-soft">The trial weight stands here once everything is typed.</p>
        )}
      </ResultColumn>
    </div>
  );
}

type ProposalProps = { solved: SolvedTrialWeight; decimalMark: DecimalMark };

function Proposal({ solved, decimalMark }: ProposalProps) {
  return (
    <Panel title="Trial weight" note={solved.basis}>
      <div className="flex flex-col gap-4">
        <Facts>
          <Fact label="at most">
            <span className="figures text-lg">{formatMass(solved.massG, decimalMark)}</span>
          </Fact>
          <Fact label="force at speed">
            <span className="figures">{formatQuantity(solved.forceN, 'N', { decimalMark })}</span>
          </Fact>
          <Fact label="of the load it rests on">
            <span className="figures">
              {formatQuantity(solved.forcePctOfLoad, '%', { decimalMark })}
            </span>
          </Fact>
          <Fact label="force cap (10 % of the load)">
            <span className="figures">{formatMass(solved.forceCapG, decimalMark)}</span>
          </Fact>
          {solved.expectedChange !== null && (
            <Fact label="expected change of the reading">
              <span className="figures">
                {formatNumber(solved.expectedChange, { decimals: 2, decimalMark })}
              </span>
            </Fact>
          )}
        </Facts>
        <p className="text-sm text-ink-soft">
          Fit it at the mark, 0°: there the answer comes out right whichever way degrees are
          counted. The cap of 10 % is a rule of thumb of handbooks; the maker’s limits come first.
        </p>
        <Caution code="SAF-06">{CAUTIONS['SAF-06'].text}</Caution>
      </div>
    </Panel>
  );
}
