'use client';

import { useState } from 'react';
import { SelectField } from '@/components/ui/select-field';
import type { ActionState } from '@/lib/schemas/action-state';
import type { PointChoice } from '@/lib/schemas/in-tray';

type PointPickerProps = {
  points: readonly PointChoice[];
  /** Chosen at first. */
  pointId: number | null;
  /** Where a point must be chosen, its first line says so. */
  placeholder: string;
  hint?: string;
  state?: ActionState;
  onChoose?: (pointId: number | null) => void;
};

/** A point out of many: a word narrows the list; what is chosen stays in it whatever the word. */
export function PointPicker(props: PointPickerProps) {
  const { points, pointId, placeholder, hint, state, onChoose } = props;
  const [word, setWord] = useState('');
  const [chosen, setChosen] = useState(pointId);
  const wanted = plain(word);
  const shown = points.filter(
    ({ id, label, machine }) => id === chosen || plain(`${label} ${machine}`).includes(wanted),
  );
  const choose = (value: string) => {
    const next = value === '' ? null : Number(value);
    setChosen(next);
    onChoose?.(next);
  };
  return (
    <div className="grid gap-2 sm:grid-cols-[12rem_1fr] sm:items-end">
      <label className="flex flex-col gap-1 text-sm font-semibold">
        Find a point
        <input
          type="search"
          value={word}
          placeholder="Tag, point or machine"
          onChange={(event) => setWord(event.target.value)}
          className="target w-full rounded border border-edge bg-sheet px-2.5 py-1.5 text-sm font-normal max-sm:text-base"
        />
      </label>
      <SelectField
        name="pointId"
        label={`Point (${shown.length} of ${points.length})`}
        placeholder={placeholder}
        hint={hint}
        state={state}
        value={chosen === null ? '' : String(chosen)}
        onChange={(event) => choose(event.target.value)}
        options={shown.map(({ id, label, machine }) => ({
          value: String(id),
          label: `${label} · ${machine}`,
        }))}
      />
    </div>
  );
}

function plain(text: string): string {
  return text.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');
}
