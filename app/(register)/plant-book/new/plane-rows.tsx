'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import type { ActionState } from '@/lib/schemas/action-state';

/** Correction planes: free rims, or numbered positions. */
export function PlaneRows({ state }: { state: ActionState }) {
  const [count, setCount] = useState(1);
  return (
    <div className="flex flex-col gap-4">
      {Array.from({ length: count }, (_, index) => (
        <PlaneRow key={index} index={index} state={state} />
      ))}
      <div className="flex gap-2">
        <Button onClick={() => setCount(count + 1)}>Add a plane</Button>
        {count > 0 && (
          <Button variant="quiet" onClick={() => setCount(count - 1)}>
            Remove the last
          </Button>
        )}
      </div>
    </div>
  );
}

function PlaneRow({ index, state }: { index: number; state: ActionState }) {
  const at = (name: string) => `planes.${index}.${name}`;
  return (
    <fieldset className="grid gap-3 border-t border-rule pt-3 sm:grid-cols-3">
      <legend className="pr-3 text-sm font-semibold">Plane {index + 1}</legend>
      <Field name={at('name')} label="Name" state={state} />
      <Field
        name={at('radiusMm')}
        label="Radius of the weights"
        unit="mm"
        kind="decimal"
        state={state}
      />
      <Field name={at('fromAM')} label="From bearing A" unit="m" kind="decimal" state={state} />
      <Field
        name={at('maxGTotal')}
        label="Most in the plane"
        unit="g"
        kind="decimal"
        state={state}
      />
      <Field name={at('pieceG')} label="Piece" unit="g" kind="decimal" state={state} />
      <Field
        name={at('positions')}
        label="Number of fixed positions"
        kind="whole"
        hint="empty: a free rim"
        state={state}
      />
      <SelectField
        name={at('numbering')}
        label="Numbered"
        placeholder="where positions are fixed"
        state={state}
        options={[
          { value: 'against', label: 'against rotation' },
          { value: 'with', label: 'with rotation' },
        ]}
      />
      <Field
        name={at('firstDeg')}
        label="Position 1, against rotation from the mark"
        unit="°"
        kind="decimal"
        state={state}
      />
      <Field
        name={at('positionMaxG')}
        label="Most on a position"
        unit="g"
        kind="decimal"
        state={state}
      />
    </fieldset>
  );
}
