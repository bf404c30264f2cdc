'use client';

import { useActionState } from 'react';
import { Caution } from '@/components/ui/caution';
import { CheckField } from '@/components/ui/check-field';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { RadioField } from '@/components/ui/radio-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextAreaField } from '@/components/ui/text-area-field';
import type { JobKind } from '@/lib/domain/balance-job/job-kinds';
import { CAUTIONS, STANDING_SENTENCE } from '@/lib/domain/cautions';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import type { NewJobDto } from '@/lib/schemas/balance-job';
import { openBalanceJobAction } from './actions';
import { PlaceChoices } from './place-choices';
import { SetupFacts } from './setup-facts';

/** Everything that must be settled before the first run. */
export function OpenJobForm({ dto }: { dto: NewJobDto }) {
  const [state, submit] = useActionState<ActionState<{ jobId: number }>, FormData>(
    openBalanceJobAction,
    IDLE,
  );
  return (
    <form action={submit} className="flex max-w-3xl flex-col gap-5" noValidate>
      <ErrorSummary state={state} />
      <input type="hidden" name="machineId" value={dto.machine.id} />
      <Panel title="The rotor as it stands">
        <SetupFacts dto={dto} />
        <div className="mt-3">
          <CheckField
            name="setupConfirmed"
            state={state}
            label={`I looked: mark, tacho and sensors are as set-up ${dto.setup.number} says, and the weights on the rotor are those listed, or are put right in the job before its first run.`}
          />
        </div>
      </Panel>
      <Panel title="What is balanced">
        <div className="flex flex-col gap-4">
          <RadioField name="kind" label="What is to be done" state={state} choices={KINDS} />
          <PlaceChoices dto={dto} state={state} />
          <TextAreaField name="reason" label="Why is it balanced?" state={state} rows={2} />
        </div>
      </Panel>
      <Panel title="Before the first run">
        <PreRun state={state} />
      </Panel>
      <Panel title="How you read and count">
        <Conventions state={state} />
      </Panel>
      <Panel title="When it is good enough">
        <Targets state={state} />
      </Panel>
      {dto.machine.confinedSpace && <Caution code="SAF-05">{CAUTIONS['SAF-05'].text}</Caution>}
      <Caution
        tick={<CheckField name="standingSentence" state={state} label="I have read this." />}
      >
        {STANDING_SENTENCE}
      </Caution>
      <div>
        <SubmitButton>Open balance job</SubmitButton>
      </div>
    </form>
  );
}

/** What is seen to before anything is measured. */
function PreRun({ state }: { state: ActionState }) {
  return (
    <div className="flex flex-col gap-3">
      <RadioField
        name="cleaned"
        label="Was the rotor cleaned and looked at?"
        hint="Deposits, worn blades and lost weights are unbalance too."
        state={state}
        choices={[
          { value: 'yes', label: 'yes' },
          { value: 'no', label: 'no' },
          { value: 'cannot be', label: 'it cannot be' },
        ]}
      />
      <CheckField
        name="nothingLoose"
        state={state}
        label="Bolts, feet and fixings were checked: nothing is loose."
      />
      <CheckField
        name="readingSteady"
        state={state}
        label="Mark, tacho and sensors are fixed, and the tacho counts steadily."
      />
      <CheckField
        name="stateAgreed"
        state={state}
        label="Speed, load and damper are agreed with the area owner, the same for every run."
      />
    </div>
  );
}

const KINDS = [
  { value: 'one-plane', label: 'One plane', hint: 'a narrow wheel, or a static part only' },
  { value: 'two-plane', label: 'Two planes', hint: 'the usual rotor between bearings' },
  {
    value: 'static only',
    label: 'Two planes, the static part only',
    hint: 'one weight, the same in both',
  },
  {
    value: 'couple only',
    label: 'Two planes, the couple only',
    hint: 'one weight, opposite in both',
  },
  { value: 'three or more planes', label: 'Three or more planes' },
  {
    value: 'check only',
    label: 'Check only',
    hint: 'readings are taken and signed, nothing is hung',
  },
] satisfies { value: JobKind; label: string; hint?: string }[];

function Conventions({ state }: { state: ActionState }) {
  return (
    <div className="grid gap-4 sm:grid-cols-3">
      <RadioField
        name="unit"
        label="1x readings are kept in"
        state={state}
        choices={[
          { value: 'mm/s rms', label: 'mm/s rms' },
          { value: 'µm p-p', label: 'µm p-p' },
        ]}
      />
      <RadioField
        name="phaseSense"
        label="Your instrument shows phase as"
        state={state}
        choices={[
          { value: 'lag', label: 'lag', hint: 'the turn from the mark to the peak' },
          { value: 'lead', label: 'lead', hint: 'the other way; it is converted once' },
        ]}
      />
      <RadioField
        name="angleSense"
        label="You count degrees on the rotor"
        state={state}
        choices={[
          { value: 'against', label: 'against rotation' },
          { value: 'with', label: 'with rotation', hint: 'it is converted once' },
        ]}
      />
    </div>
  );
}

function Targets({ state }: { state: ActionState }) {
  return (
    <div className="grid gap-4 sm:grid-cols-3">
      <Field name="targetOneX" label="1x below, in the job’s unit" kind="decimal" state={state} />
      <RadioField
        name="targetZone"
        label="Overall velocity in zone"
        state={state}
        defaultValue="B"
        choices={[
          { value: 'A', label: 'A, as new' },
          { value: 'B', label: 'B or better' },
          { value: '', label: 'no zone target' },
        ]}
      />
      <div className="flex flex-col gap-4">
        <CheckField
          name="gradeTarget"
          state={state}
          label="Estimate in place within the balance quality grade (ISO 21940-11)"
        />
        <Field name="startsAllowed" label="Starts allowed" kind="whole" state={state} />
      </div>
    </div>
  );
}
