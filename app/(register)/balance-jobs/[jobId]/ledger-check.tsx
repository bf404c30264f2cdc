'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Caution } from '@/components/ui/caution';
import { CheckField } from '@/components/ui/check-field';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { RadioField } from '@/components/ui/radio-field';
import { SelectField } from '@/components/ui/select-field';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatForInput, formatMass } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { BalanceJobDto, LedgerWeightDto } from '@/lib/schemas/balance-job';
import { correctLedgerAction, recordFoundWeightAction } from './actions';
import { PlaceFields } from './place-fields';
import { StepForm } from './step-form';

/** A weight of an earlier job that is not there as the ledger lists it. */
export function NotAsListed({ job, weight }: { job: BalanceJobDto; weight: LedgerWeightDto }) {
  const begun = job.runs.length > 0;
  return (
    <Dialog
      title={`${formatMass(weight.massG, job.site.decimalMark)} in plane ${weight.planeName}: not as listed`}
      description={
        begun
          ? 'Runs were made: it counts as having come off since the first of them.'
          : 'The ledger is put right before the first run.'
      }
      trigger={<Button variant="quiet">Not as listed…</Button>}
    >
      <StepForm jobId={job.id} action={correctLedgerAction} button="Put the ledger right">
        {(state) => (
          <>
            <input type="hidden" name="weightId" value={weight.id} />
            <RadioField
              name="found"
              label="What did you find?"
              state={state}
              choices={[
                { value: 'missing', label: 'It is gone' },
                ...(begun ? [] : [{ value: 'worn', label: 'It is worn; this is left:' }]),
              ]}
            />
            {!begun && (
              <Field
                name="massG"
                label="Mass that is left, where it is worn"
                unit="g"
                kind="decimal"
                state={state}
              />
            )}
            <Field name="reason" label="What did you see?" state={state} />
            <StillCaution state={state} />
          </>
        )}
      </StepForm>
    </Dialog>
  );
}

/** A weight on the rotor that no ledger lists. */
export function FoundWeight({ job }: { job: BalanceJobDto }) {
  const [planeId, setPlaneId] = useState(job.planes[0]?.id ?? 0);
  const plane = job.planes.find(({ id }) => id === planeId);
  if (!plane) return null;
  return (
    <Dialog
      title="A weight that is not listed"
      description="It goes on the ledger as found. It was there in every run, so the arithmetic does not count it."
      trigger={<Button variant="quiet">Found one that is not listed…</Button>}
    >
      <StepForm jobId={job.id} action={recordFoundWeightAction} button="Put it on the ledger">
        {(state) => (
          <>
            <SelectField
              name="planeId"
              label="Plane"
              state={state}
              value={String(planeId)}
              onChange={(event) => setPlaneId(Number(event.target.value))}
              options={job.planes.map(({ id, name }) => ({ value: String(id), label: name }))}
            />
            <Field
              name="massG"
              label="Mass, weighed or estimated"
              unit="g"
              kind="decimal"
              state={state}
            />
            <Field
              name="radiusMm"
              label="Radius to its centre of mass"
              unit="mm"
              kind="decimal"
              state={state}
              defaultValue={formatForInput(plane.radiusMm, job.site.decimalMark)}
            />
            <PlaceFields plane={plane} state={state} />
            <Field name="fixing" label="Fixed by" state={state} hint="bolt, clamp, weld, rivet" />
            <StillCaution state={state} />
          </>
        )}
      </StepForm>
    </Dialog>
  );
}

function StillCaution({ state }: { state: ActionState }) {
  return (
    <Caution
      code="SAF-01, SAF-03"
      tick={
        <CheckField name="standingStill" state={state} label="It stands still and is locked out." />
      }
      name={<Field name="namedPerson" label="Locked out by (name)" state={state} />}
    >
      {CAUTIONS['SAF-01'].text} {CAUTIONS['SAF-03'].text}
    </Caution>
  );
}
