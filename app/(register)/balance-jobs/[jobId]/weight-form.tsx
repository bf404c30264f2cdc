'use client';

import { Caution } from '@/components/ui/caution';
import { CheckField } from '@/components/ui/check-field';
import { Field } from '@/components/ui/field';
import { errorOf } from '@/components/ui/field-state';
import { RadioField } from '@/components/ui/radio-field';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatDegrees, formatForInput, formatMass } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { BalanceJobDto, PlaneDto } from '@/lib/schemas/balance-job';
import { fitWeightAction } from './actions';
import { FixingFields } from './fixing-fields';
import { PlaceFields } from './place-fields';
import { StepForm } from './step-form';

type WeightFormProps = {
  job: BalanceJobDto;
  plane: PlaneDto;
  purpose: 'trial' | 'correction';
  /** The mass to start from: what is proposed; the person types what was really fitted. */
  proposedG: number | null;
};

/** Fit card: what was really fitted in one plane, and where it really hangs. */
export function WeightForm({ job, plane, purpose, proposedG }: WeightFormProps) {
  const what = purpose === 'trial' ? 'trial weight' : 'weight';
  return (
    <StepForm
      jobId={job.id}
      action={fitWeightAction}
      button={`Record ${what} in plane ${plane.name}`}
      said={(weight) => `Recorded at ${formatDegrees(weight.angleDeg, 1)} against rotation`}
    >
      {(state) => (
        <>
          <input type="hidden" name="purpose" value={purpose} />
          <input type="hidden" name="planeId" value={plane.id} />
          <HandsCaution state={state} />
          <div className="grid gap-4 sm:grid-cols-2">
            <Field
              name="massG"
              label="Mass that hangs there now, fasteners included"
              unit="g"
              kind="decimal"
              state={state}
              hint={
                proposedG === null
                  ? undefined
                  : `proposed ${formatMass(proposedG, job.site.decimalMark)}`
              }
            />
            <Field
              name="radiusMm"
              label="Radius to its centre of mass"
              unit="mm"
              kind="decimal"
              state={state}
              defaultValue={formatForInput(plane.radiusMm, job.site.decimalMark)}
            />
          </div>
          <RadioField
            name="massSource"
            label="The mass was"
            state={state}
            choices={[
              { value: 'scale', label: 'weighed on a scale' },
              { value: 'nominal', label: 'read off the piece (nominal)' },
            ]}
          />
          <PlaceFields plane={plane} state={state} />
          {purpose === 'trial' && (job.needsConsent || errorOf(state, 'consent')) && (
            <Field
              name="consent"
              label="Engineer who agrees to this trial weight (name)"
              hint={job.needsConsent ? 'The base is in zone D.' : undefined}
              state={state}
            />
          )}
          <FixingFields state={state} />
        </>
      )}
    </StepForm>
  );
}

function HandsCaution({ state }: { state: ActionState }) {
  return (
    <>
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
      <Caution
        code="SAF-06"
        tick={
          <CheckField
            name="fixingHolds"
            state={state}
            label="Mass, force and fixing are checked."
          />
        }
      >
        {CAUTIONS['SAF-06'].text}
      </Caution>
    </>
  );
}
