'use client';

import { Field } from '@/components/ui/field';
import type { ActionState } from '@/lib/schemas/action-state';

type ReadingFieldsProps = {
  /** The dotted path of the readings: “base”, “trials.0.readings”. */
  at: string;
  points: number;
  state: ActionState;
};

/** 1x size and phase of every point in one run. */
export function ReadingFields({ at, points, state }: ReadingFieldsProps) {
  return Array.from({ length: points }, (_, index) => (
    <fieldset key={index} className="grid gap-3 sm:grid-cols-2 [&:not(:first-of-type)]:mt-3">
      <legend className={points === 1 ? 'sr-only' : 'pb-1 text-sm font-semibold'}>
        Point {index + 1}
      </legend>
      <Field name={`${at}.${index}.amplitude`} label="1x size" kind="decimal" state={state} />
      <Field name={`${at}.${index}.phaseDeg`} label="Phase" unit="°" kind="decimal" state={state} />
    </fieldset>
  ));
}
