import { useId, type ReactNode, type TextareaHTMLAttributes } from 'react';
import type { ActionState } from '@/lib/schemas/action-state';
import { boxLook, describedBy, FieldFrame } from './field-frame';
import { errorOf, startOf } from './field-state';

type TextAreaFieldProps = Omit<
  TextareaHTMLAttributes<HTMLTextAreaElement>,
  'name' | 'defaultValue'
> & {
  name: string;
  label: ReactNode;
  hint?: ReactNode;
  state?: ActionState;
  defaultValue?: string;
};

/** Several lines of text. */
export function TextAreaField({
  name,
  label,
  hint,
  state,
  defaultValue,
  rows = 3,
  ...rest
}: TextAreaFieldProps) {
  const id = useId();
  const error = errorOf(state, name);
  const start =
    rest.value === undefined ? { defaultValue: startOf(state, name, defaultValue) } : {};
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error}>
      <textarea
        {...rest}
        {...start}
        id={id}
        name={name}
        rows={rows}
        aria-invalid={error !== undefined || undefined}
        aria-describedby={describedBy(id, hint, error)}
        className={boxLook(error)}
      />
    </FieldFrame>
  );
}
