'use client';

import { Caution } from '@/components/ui/caution';
import { CheckField } from '@/components/ui/check-field';
import { Field } from '@/components/ui/field';
import { RadioField } from '@/components/ui/radio-field';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatMass, formatRotorAngle } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { settleTrialAction } from './actions';
import { StepForm } from './step-form';

/** After a trial run: is the trial weight still on the rotor? Nothing is chosen beforehand. */
export function SettleForm({ job, weightId }: { job: BalanceJobDto; weightId: number }) {
  const weight = job.weights.find(({ id }) => id === weightId);
  if (!weight) return null;
  return (
    <StepForm jobId={job.id} action={settleTrialAction} button="Record it">
      {(state) => (
        <>
          <input type="hidden" name="weightId" value={weightId} />
          <RadioField
            name="stays"
            label={`Trial weight of ${formatMass(weight.massG)} in plane ${weight.planeName} at ${formatRotorAngle(weight.angleDeg)}: is it still on the rotor?`}
            state={state}
            choices={[
              { value: 'taken off', label: 'No, it is taken off' },
              { value: 'stays on', label: 'Yes, it stays on' },
            ]}
          />
          <Caution
            code="SAF-01, SAF-03"
            tick={
              <CheckField
                name="standingStill"
                state={state}
                label="It stands still and is locked out."
              />
            }
            name={<Field name="namedPerson" label="Locked out by (name)" state={state} />}
          >
            {CAUTIONS['SAF-01'].text} {CAUTIONS['SAF-03'].text}
          </Caution>
        </>
      )}
    </StepForm>
  );
}
