'use client';

import { Caution } from '@/components/ui/caution';
import { CheckField } from '@/components/ui/check-field';
import { errorOf } from '@/components/ui/field-state';
import { Field } from '@/components/ui/field';
import { TextAreaField } from '@/components/ui/text-area-field';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatMass, formatRotorAngle } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { signJobAction } from './actions';
import { StepForm } from './step-form';

/** Sign-off strip: what stays on the rotor, hand-back, statement. Signing freezes the job record. */
export function SignForm({ job }: { job: BalanceJobDto }) {
  const temporary = job.weights.filter(({ endedAt, permanent }) => endedAt === null && !permanent);
  return (
    <StepForm jobId={job.id} action={signJobAction} button="Sign the job record">
      {(state) => (
        <>
          {temporary.length > 0 && (
            <fieldset>
              <legend className="text-sm font-semibold">
                Weights that stay: tick each one that is made permanent
              </legend>
              {errorOf(state, 'permanentWeightIds') && (
                <p className="text-sm text-fault">{errorOf(state, 'permanentWeightIds')}</p>
              )}
              {temporary.map((weight) => (
                <CheckField
                  key={weight.id}
                  name="permanentWeightIds"
                  value={weight.id}
                  label={`Plane ${weight.planeName}: ${formatMass(weight.massG)} at ${formatRotorAngle(weight.angleDeg)} is permanent`}
                />
              ))}
            </fieldset>
          )}
          <TextAreaField
            name="statement"
            label="Statement"
            state={state}
            rows={2}
            defaultValue="Runs, weights and readings are recorded as they were."
          />
          <TextAreaField
            name="reason"
            label="Why it is signed although a target or a prediction was missed"
            hint="only where that is so"
            state={state}
            rows={2}
          />
          <Caution
            code="SAF-14"
            tick={<CheckField name="handBack" state={state} label="It is so." />}
            name={
              <Field
                name="areaOwner"
                label="Area owner who takes the machine back (name)"
                state={state}
              />
            }
          >
            {CAUTIONS['SAF-14'].text}
          </Caution>
        </>
      )}
    </StepForm>
  );
}
