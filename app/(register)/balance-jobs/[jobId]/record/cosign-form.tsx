'use client';

import { RadioField } from '@/components/ui/radio-field';
import { TextAreaField } from '@/components/ui/text-area-field';
import { StepForm } from '../step-form';
import { cosignRecordAction } from './actions';

/** A further signature: as engineer, or as the owner of the area. */
export function CosignForm({ jobId, asEngineer }: { jobId: number; asEngineer: boolean }) {
  const owner = { value: 'area owner', label: 'Area owner: I took the machine back' };
  const engineer = { value: 'reliability engineer', label: 'Reliability engineer: I have read it' };
  return (
    <StepForm jobId={jobId} action={cosignRecordAction} button="Sign this record too">
      {(state) => (
        <>
          <RadioField
            name="capacity"
            label="I sign as"
            choices={asEngineer ? [engineer, owner] : [owner]}
            state={state}
          />
          <TextAreaField name="statement" label="Statement" state={state} rows={2} />
        </>
      )}
    </StepForm>
  );
}
