import { RadioField } from '@/components/ui/radio-field';
import type { ActionState } from '@/lib/schemas/action-state';

/** Which way the rotor turns: asked in the same words everywhere, and never assumed. */
export function RotationField({ state }: { state: ActionState }) {
  return (
    <RadioField
      name="rotationFromDriveEnd"
      label="It turns, seen from the drive end"
      state={state}
      choices={[
        { value: 'clockwise', label: 'clockwise' },
        { value: 'counter-clockwise', label: 'counter-clockwise' },
      ]}
    />
  );
}
