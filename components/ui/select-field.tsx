import { useId, type ReactNode, type SelectHTMLAttributes } from 'react';
import type { ActionState } from '@/lib/schemas/action-state';
import { boxLook, describedBy, FieldFrame } from './field-frame';
import { errorOf, startOf } from './field-state';

export type Option = { value: string; label: string; disabled?: boolean };

type SelectFieldProps = Omit<
  SelectHTMLAttributes<HTMLSelectElement>,
  'name' | 'defaultValue' | 'children'
> & {
  name: string;
  label: ReactNode;
  options: readonly Option[];
  /** First line while nothing is chosen: “Choose a point”. Left out, the first option is chosen. */
  placeholder?: string;
  hint?: ReactNode;
  state?: ActionState;
  defaultValue?: string;
};

/** One of a list that is too long for radio buttons. */
export function SelectField({
  name,
  label,
  options,
  placeholder,
  hint,
  state,
  defaultValue,
  ...rest
}: SelectFieldProps) {
  const id = useId();
  const error = errorOf(state, name);
  const start = startOf(state, name, defaultValue);
  const uncontrolled = rest.value === undefined ? { defaultValue: start } : {};
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error}>
      {/* The key makes React show what was chosen before a failed action cleared the form. */}
      <select
        key={start}
        {...rest}
        {...uncontrolled}
        id={id}
        name={name}
        aria-invalid={error !== undefined || undefined}
        aria-describedby={describedBy(id, hint, error)}
        className={boxLook(error, 'cursor-pointer')}
      >
        {placeholder !== undefined && <option value="">{placeholder}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value} disabled={option.disabled}>
            {option.label}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}
