import { useId, type InputHTMLAttributes, type ReactNode } from 'react';
import type { ActionState } from '@/lib/schemas/action-state';
import { FieldError } from './field-frame';
import { errorOf, typedOf } from './field-state';

type CheckFieldProps = Omit<
  InputHTMLAttributes<HTMLInputElement>,
  'name' | 'type' | 'defaultChecked'
> & {
  name: string;
  label: ReactNode;
  hint?: ReactNode;
  state?: ActionState;
  defaultChecked?: boolean;
};

/** A tick with its sentence; after a failed action it stands as the person left it. */
export function CheckField({
  name,
  label,
  hint,
  state,
  defaultChecked = false,
  ...rest
}: CheckFieldProps) {
  const id = useId();
  const error = errorOf(state, name);
  const typed = typedOf(state);
  const ticked = typed
    ? (typed[name] ?? '').split('\n').includes(String(rest.value ?? 'on'))
    : defaultChecked;
  const start = rest.checked === undefined ? { defaultChecked: ticked } : {};
  return (
    <div>
      <label className="target flex cursor-pointer items-start gap-2.5 py-1.5">
        <input
          key={String(ticked)}
          {...rest}
          {...start}
          type="checkbox"
          name={name}
          aria-invalid={error !== undefined || undefined}
          aria-describedby={error === undefined ? undefined : `${id}-error`}
          className="mt-0.5 size-5 shrink-0 cursor-pointer accent-blue"
        />
        <span>
          {label}
          {hint !== undefined && <span className="block text-xs text-ink-soft">{hint}</span>}
        </span>
      </label>
      <FieldError id={`${id}-error`} error={error} />
    </div>
  );
}
