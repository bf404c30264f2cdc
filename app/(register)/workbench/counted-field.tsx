import { RadioField } from '@/components/ui/radio-field';
import type { ActionState } from '@/lib/schemas/action-state';

/** Which way degrees are counted: asked, never assumed. */
export function CountedField({ state }: { state: ActionState }) {
  return (
    <RadioField
      name="angleSense"
      label="Degrees are counted"
      state={state}
      choices={[
        { value: 'against', label: 'against rotation' },
        { value: 'with', label: 'with rotation' },
      ]}
    />
  );
}
