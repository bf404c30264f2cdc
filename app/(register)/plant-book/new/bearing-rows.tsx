'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { CheckField } from '@/components/ui/check-field';
import { Field } from '@/components/ui/field';
import type { ActionState } from '@/lib/schemas/action-state';

/** Bearings, each with the directions that are measured on it. */
export function BearingRows({ state }: { state: ActionState }) {
  const [count, setCount] = useState(2);
  return (
    <div className="flex flex-col gap-4">
      {Array.from({ length: count }, (_, index) => (
        <BearingRow key={index} index={index} state={state} />
      ))}
      <div className="flex gap-2">
        <Button onClick={() => setCount(count + 1)}>Add a bearing</Button>
        {count > 1 && (
          <Button variant="quiet" onClick={() => setCount(count - 1)}>
            Remove the last
          </Button>
        )}
      </div>
    </div>
  );
}

function BearingRow({ index, state }: { index: number; state: ActionState }) {
  const at = (name: string) => `bearings.${index}.${name}`;
  const letter = String.fromCharCode(65 + index);
  return (
    <fieldset className="grid gap-3 border-t border-rule pt-3 sm:grid-cols-3">
      <legend className="pr-3 text-sm font-semibold">Bearing {letter}</legend>
      <Field name={at('label')} label="Letter" state={state} defaultValue={letter} />
      <Field name={at('fromAM')} label="From bearing A" unit="m" kind="decimal" state={state} />
      <Field name={at('type')} label="Type" state={state} />
      <CheckField name={at('horizontal')} label="horizontal point" state={state} defaultChecked />
      <CheckField name={at('vertical')} label="vertical point" state={state} defaultChecked />
      <CheckField name={at('axial')} label="axial point" state={state} />
    </fieldset>
  );
}
