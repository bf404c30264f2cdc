import { Field } from '@/components/ui/field';
import { RadioField } from '@/components/ui/radio-field';
import type { ActionState } from '@/lib/schemas/action-state';
import { RotationField } from './rotation-field';

/** Mark, tacho and sense of rotation. */
export function SetupFields({ state }: { state: ActionState }) {
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Field
        name="mark"
        label="The mark: angle zero"
        hint="a permanent feature: punch, keyway, painted blade"
        state={state}
      />
      <Field
        name="tachoDeg"
        label="Tacho, from top in the direction of rotation"
        unit="°"
        kind="decimal"
        state={state}
      />
      <RadioField
        name="tachoEdge"
        label="The edge that counts"
        state={state}
        choices={[
          { value: 'rising', label: 'rising' },
          { value: 'falling', label: 'falling' },
        ]}
      />
      <RotationField state={state} />
    </div>
  );
}
