'use client';

import { useActionState } from 'react';
import { MachineFields } from '@/components/register/machine-fields';
import { SetupFields } from '@/components/register/setup-fields';
import { CheckField } from '@/components/ui/check-field';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { IDLE, type ActionState } from '@/lib/schemas/action-state';
import type { NewMachineDto } from '@/lib/schemas/register';
import { createMachineAction } from './actions';
import { BearingRows } from './bearing-rows';
import { PlaneRows } from './plane-rows';

/** A machine with its rotor, bearings, points, planes, set-up and limits, on one sheet. */
export function NewMachineForm({ offered }: { offered: NewMachineDto }) {
  const [state, submit] = useActionState<ActionState<{ machineId: number }>, FormData>(
    createMachineAction,
    IDLE,
  );
  return (
    <form action={submit} className="flex max-w-4xl flex-col gap-5" noValidate>
      <ErrorSummary state={state} />
      <datalist id="areas">
        {offered.areas.map(({ siteId, name }) => (
          <option key={`${siteId} ${name}`} value={name} />
        ))}
      </datalist>
      <Panel title="What it is">
        <div className="mb-4 max-w-sm">
          <SelectField
            name="siteId"
            label="Site"
            state={state}
            options={offered.sites.map(({ id, name }) => ({ value: String(id), label: name }))}
          />
        </div>
        <MachineFields state={state} machine={null} />
      </Panel>
      <Panel title="Rotor">
        <Rotor state={state} />
      </Panel>
      <Panel title="Bearings and points" note="lettered from the driver’s outboard end">
        <BearingRows state={state} />
      </Panel>
      <Panel title="Correction planes">
        <PlaneRows state={state} />
      </Panel>
      <Panel title="First set-up">
        <SetupFields state={state} />
      </Panel>
      <Panel title="Limits">
        <SelectField
          name="limitSetId"
          label="Limit set"
          placeholder="none yet: readings get no zone"
          state={state}
          options={offered.limitSets.map(({ id, label }) => ({ value: String(id), label }))}
        />
      </Panel>
      <div>
        <SubmitButton>Enter machine</SubmitButton>
      </div>
    </form>
  );
}

function Rotor({ state }: { state: ActionState }) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Field name="rotorSerial" label="Serial number" state={state} />
      <Field name="rotorMassKg" label="Mass" unit="kg" kind="decimal" state={state} />
      <Field
        name="balanceGrade"
        label="Balance quality grade G"
        unit="mm/s"
        kind="decimal"
        hint="ISO 21940-11, for example 6.3"
        state={state}
      />
      <Field
        name="bearingSpanM"
        label="Distance between bearings"
        unit="m"
        kind="decimal"
        state={state}
      />
      <Field
        name="centreOfMassFromAM"
        label="Centre of mass, from bearing A"
        unit="m"
        kind="decimal"
        state={state}
      />
      <CheckField name="overhung" label="The wheel hangs outside the bearings" state={state} />
    </div>
  );
}
