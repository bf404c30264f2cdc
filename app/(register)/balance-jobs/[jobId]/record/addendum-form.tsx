'use client';

import { Field } from '@/components/ui/field';
import { TextAreaField } from '@/components/ui/text-area-field';
import { StepForm } from '../step-form';
import { addAddendumAction } from './actions';

/** A later remark to a signed record. */
export function AddendumForm({ jobId }: { jobId: number }) {
  return (
    <StepForm
      jobId={jobId}
      action={addAddendumAction}
      button="Add the addendum"
      said={({ number }) => `Addendum ${number} added`}
    >
      {(state) => (
        <>
          <TextAreaField
            name="text"
            label="Remark"
            hint="At most 2000 characters. What was signed stays as it is."
            state={state}
            rows={4}
          />
          <Field name="reason" label="Why is it added?" state={state} />
        </>
      )}
    </StepForm>
  );
}
