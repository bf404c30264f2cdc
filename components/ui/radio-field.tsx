import { useId, type ChangeEventHandler, type ReactNode } from 'react';
import type { ActionState } from '@/lib/schemas/action-state';
import { FieldError } from './field-frame';
import { errorOf, startOf } from './field-state';

export type Choice = { value: string; label: ReactNode; hint?: ReactNode };

type RadioFieldProps = {
  name: string;
  label: ReactNode;
  choices: readonly Choice[];
  hint?: ReactNode;
  state?: ActionState;
  /** Left out, nothing is chosen and the person must choose. */
  defaultValue?: string;
  onChange?: ChangeEventHandler<HTMLInputElement>;
};

/** A question with few answers, all of them in sight. */
export function RadioField({
  name,
  label,
  choices,
  hint,
  state,
  defaultValue,
  onChange,
}: RadioFieldProps) {
  const id = useId();
  const error = errorOf(state, name);
  const start = startOf(state, name, defaultValue);
  return (
    <fieldset
      aria-describedby={error === undefined ? undefined : `${id}-error`}
      className={error === undefined ? '' : 'border-l-4 border-fault pl-3'}
    >
      <legend className="text-sm font-semibold">{label}</legend>
      {hint !== undefined && <p className="text-xs text-ink-soft">{hint}</p>}
      {choices.map((choice) => (
        <label
          key={choice.value}
          className="target flex cursor-pointer items-start gap-2.5 py-1.5 text-sm"
        >
          <input
            key={String(start === choice.value)}
            type="radio"
            name={name}
            value={choice.value}
            defaultChecked={start === choice.value}
            onChange={onChange}
            className="mt-0.5 size-5 shrink-0 cursor-pointer accent-blue"
          />
          <span>
            {choice.label}
            {choice.hint !== undefined && (
              <span className="block text-xs text-ink-soft">{choice.hint}</span>
            )}
          </span>
        </label>
      ))}
      <FieldError id={`${id}-error`} error={error} />
    </fieldset>
  );
}
