import { Field } from '@/components/ui/field';
import { RadioField } from '@/components/ui/radio-field';
import { SelectField } from '@/components/ui/select-field';
import { formatForInput } from '@/lib/format';
import type { ActionState } from '@/lib/schemas/action-state';
import type { MachineFormDto } from '@/lib/schemas/register';
import { MACHINE_KINDS } from '@/lib/schemas/register-input';

type MachineFieldsProps = { state: ActionState; machine: MachineFormDto | null };

/** What a machine is: the same fields whether it is entered or edited. */
export function MachineFields({ state, machine }: MachineFieldsProps) {
  const given: Partial<MachineFormDto> = machine ?? {};
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Field name="tag" label="Tag" state={state} defaultValue={given.tag} />
      <Field name="name" label="Name" state={state} defaultValue={given.name} />
      <SelectField
        name="kind"
        label="Kind"
        placeholder="Choose the kind"
        state={state}
        defaultValue={given.kind}
        options={options(kindsWith(given.kind))}
      />
      <Field
        name="area"
        label="Area"
        state={state}
        list="areas"
        hint="one of the site’s, or a new one"
        defaultValue={given.areaName}
      />
      {NUMBERS.map(({ name, label, unit, usual }) => (
        <Field
          key={name}
          name={name}
          label={label}
          unit={unit}
          kind="decimal"
          state={state}
          defaultValue={formatForInput(given[name] ?? usual)}
        />
      ))}
      <SelectField
        name="drive"
        label="Drive"
        state={state}
        defaultValue={given.drive}
        options={options(['direct', 'belt', 'gear', 'variable speed'])}
      />
      <Judgements state={state} given={given} />
    </div>
  );
}

const NUMBERS = [
  { name: 'powerKw', label: 'Power', unit: 'kW', usual: null },
  { name: 'lineHz', label: 'Line frequency', unit: 'Hz', usual: 50 },
  { name: 'speedMinRpm', label: 'Lowest speed', unit: 'r/min', usual: null },
  { name: 'speedMaxRpm', label: 'Highest speed', unit: 'r/min', usual: null },
  { name: 'nominalSpeedRpm', label: 'Usual speed', unit: 'r/min', usual: null },
] as const;

type JudgementsProps = { state: ActionState; given: Partial<MachineFormDto> };

function Judgements({ state, given }: JudgementsProps) {
  return (
    <>
      <RadioField
        name="criticality"
        label="Criticality"
        state={state}
        defaultValue={given.criticality}
        choices={[
          { value: 'A', label: 'A, stops the plant' },
          { value: 'B', label: 'B, stops a line' },
          { value: 'C', label: 'C, has a spare' },
          { value: 'D', label: 'D, can wait' },
        ]}
      />
      <RadioField
        name="support"
        label="Support class"
        hint="rigid where the lowest natural frequency on its support is 1.25 times the running speed or more"
        state={state}
        defaultValue={given.support}
        choices={[
          { value: 'rigid', label: 'rigid' },
          { value: 'flexible', label: 'flexible' },
          { value: 'unknown', label: 'not known' },
        ]}
      />
    </>
  );
}

function options(values: readonly string[]) {
  return values.map((value) => ({ value, label: value }));
}

function kindsWith(current: string | undefined): string[] {
  const kinds: string[] = [...MACHINE_KINDS];
  return current === undefined || kinds.includes(current) ? kinds : [current, ...kinds];
}
