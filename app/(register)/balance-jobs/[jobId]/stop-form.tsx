'use client';

import { Button } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { Dialog } from '@/components/ui/dialog';
import { RadioField } from '@/components/ui/radio-field';
import { TextAreaField } from '@/components/ui/text-area-field';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { stopJobAction } from './actions';
import { StepForm } from './step-form';

/** The side exits: stopped safe, or not a balance job after all. */
export function StopForm({ job }: { job: BalanceJobDto }) {
  return (
    <Dialog
      title={`Stop job ${job.number}`}
      description="What hangs on the rotor stays in the ledger as it is recorded now."
      trigger={<Button variant="quiet">Stop this job…</Button>}
    >
      <StepForm jobId={job.id} action={stopJobAction} button="Stop the job">
        {(state) => (
          <>
            <RadioField
              name="outcome"
              label="How does it end?"
              state={state}
              choices={[
                { value: 'stopped safe', label: 'Stopped safe' },
                { value: 'not a balance job', label: 'Not a balance job: the cause is another' },
              ]}
            />
            <TextAreaField name="reason" label="Why?" state={state} />
            <TextAreaField name="rotorState" label="What is on the rotor now?" state={state} />
            <CheckField
              name="safe"
              state={state}
              label="The machine is left safe: weights secure, guards on, area owner told."
            />
          </>
        )}
      </StepForm>
    </Dialog>
  );
}
