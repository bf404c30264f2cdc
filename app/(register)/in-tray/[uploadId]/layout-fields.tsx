'use client';

import { Field } from '@/components/ui/field';
import { Panel } from '@/components/ui/panel';
import { SelectField } from '@/components/ui/select-field';
import type { ActionState } from '@/lib/schemas/action-state';
import type { ColumnDto, PreviewDto } from '@/lib/schemas/in-tray';
import { withColumn, type Choices } from './choices';

type LayoutFieldsProps = {
  state: ActionState;
  columns: readonly ColumnDto[];
  rows: PreviewDto['rows'];
  choices: Choices;
  onChange: (choices: Choices) => void;
};

const DELIMITERS = [
  { value: 'comma', label: 'comma' },
  { value: 'semicolon', label: 'semicolon' },
  { value: 'tab', label: 'tab' },
  { value: 'none', label: 'nothing: one column' },
];
const MARKS = [
  { value: 'point', label: 'point: 0.25' },
  { value: 'comma', label: 'comma: 0,25' },
];

/** Delimiter, decimal mark, rate and what each column is; the name under which that is saved. */
export function LayoutFields({ state, columns, rows, choices, onChange }: LayoutFieldsProps) {
  const set = (change: Partial<Choices>) => onChange({ ...choices, ...change });
  return (
    <Panel title="How it is read">
      <div className="flex flex-col gap-4">
        <div className="grid gap-4 sm:grid-cols-2">
          <SelectField
            name="layout.delimiter"
            label="Between columns stands"
            state={state}
            value={choices.delimiter}
            // Other columns come of it: their roles are proposed anew.
            onChange={(event) =>
              set({ delimiter: event.target.value as Choices['delimiter'], columns: [] })
            }
            options={DELIMITERS}
          />
          <SelectField
            name="layout.decimalMark"
            label="Decimal mark of the whole file"
            placeholder="Choose the decimal mark"
            state={state}
            value={choices.decimalMark}
            onChange={(event) => set({ decimalMark: event.target.value as Choices['decimalMark'] })}
            options={MARKS}
          />
        </div>
        {columns.map((column) => (
          <ColumnFields
            key={`${choices.delimiter} ${column.index}`}
            column={column}
            example={rows[0]?.cells[column.index] ?? ''}
            state={state}
            onChange={(changed) => onChange(withColumn(choices, columns, changed))}
          />
        ))}
        <div className="grid gap-4 sm:grid-cols-2">
          <Field
            name="layout.sampleRateHz"
            label="Sample rate"
            kind="decimal"
            unit="Hz"
            hint="A time column counts before it."
            state={state}
            value={choices.sampleRateHz}
            onChange={(event) => set({ sampleRateHz: event.target.value })}
          />
          <Field
            name="layoutName"
            label="Save this column layout as (optional)"
            hint="Files of the same shape are then read by it."
            state={state}
            maxLength={80}
          />
        </div>
      </div>
    </Panel>
  );
}

type ColumnFieldsProps = {
  column: ColumnDto;
  example: string;
  state: ActionState;
  onChange: (changed: Pick<ColumnDto, 'index' | 'role' | 'unit'>) => void;
};

const ROLES = [
  { value: 'signal', label: 'the vibration' },
  { value: 'time', label: 'time' },
  { value: 'tacho', label: 'tacho' },
  { value: 'ignore', label: 'left out' },
];
const SIGNAL_UNITS = [
  { value: 'g', label: 'g (acceleration)' },
  { value: 'm/s2', label: 'm/s² (acceleration)' },
  { value: 'mm/s', label: 'mm/s (velocity)' },
  { value: 'in/s', label: 'in/s (velocity)' },
  { value: 'um', label: 'µm (displacement)' },
  { value: 'mil', label: 'mil (displacement)' },
];
const TIME_UNITS = [
  { value: 's', label: 's' },
  { value: 'ms', label: 'ms' },
  { value: 'us', label: 'µs' },
];

function ColumnFields({ column, example, state, onChange }: ColumnFieldsProps) {
  const { index, name, role, unit } = column;
  const called = name === '' ? `Column ${index + 1}` : `Column ${index + 1}, ${name}`;
  const set = (change: Partial<Pick<ColumnDto, 'role' | 'unit'>>) =>
    onChange({ index, role, unit, ...change });
  const field = `layout.columns.${index}`;
  return (
    <div className="grid gap-4 border-t border-rule pt-3 sm:grid-cols-2">
      <SelectField
        name={`${field}.role`}
        label={`${called} is`}
        hint={example === '' ? undefined : `first value ${example}`}
        state={state}
        value={role}
        onChange={(event) => set({ role: event.target.value as ColumnDto['role'] })}
        options={ROLES}
      />
      {role === 'signal' || role === 'time' ? (
        <SelectField
          name={`${field}.unit`}
          label={`Unit of column ${index + 1}`}
          hint={example === '' ? undefined : '\u00a0'}
          placeholder="Choose the unit"
          state={state}
          value={unit ?? ''}
          onChange={(event) => set({ unit: (event.target.value || null) as ColumnDto['unit'] })}
          options={role === 'signal' ? SIGNAL_UNITS : TIME_UNITS}
        />
      ) : (
        <input type="hidden" name={`${field}.unit`} value="" />
      )}
    </div>
  );
}
