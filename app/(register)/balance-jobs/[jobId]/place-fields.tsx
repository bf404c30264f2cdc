import { Field } from '@/components/ui/field';
import { RadioField } from '@/components/ui/radio-field';
import { SelectField } from '@/components/ui/select-field';
import { formatDegrees } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { PlaneDto } from '@/lib/schemas/balance-job';

/** Where a weight hangs: a position of the plane, or degrees with the way they were counted. */
export function PlaceFields({ plane, state }: { plane: PlaneDto; state: ActionState }) {
  if (plane.kind === 'fixed positions') {
    return (
      <SelectField
        name="positionId"
        label="Position"
        state={state}
        placeholder="Choose the position"
        options={plane.positions.map((position) => ({
          value: String(position.id),
          label: `${position.label}, ${formatDegrees(position.angleDeg, 1)} against rotation`,
        }))}
      />
    );
  }
  return (
    <>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field name="angleDeg" label="Angle from the mark" unit="°" kind="decimal" state={state} />
        <Field
          name="arcMm"
          label="and, if taped, the arc along the rim"
          unit="mm"
          kind="decimal"
          state={state}
        />
      </div>
      <RadioField
        name="angleSense"
        label="Between the mark and the weight, did you go with or against the turning?"
        hint="Watch the shaft turn and think of the other way: that is against. “With” is converted."
        state={state}
        choices={[
          { value: 'against', label: 'against rotation' },
          { value: 'with', label: 'with rotation' },
        ]}
      />
    </>
  );
}
