import { useId, type InputHTMLAttributes, type ReactNode } from 'react';
import type { ActionState } from '@/lib/schemas/action-state';
import { boxLook, describedBy, FieldFrame } from './field-frame';
import { errorOf, startOf } from './field-state';

type InputKind =
  'text' | 'decimal' | 'whole' | 'email' | 'password' | 'search' | 'datetime-local' | 'date';

type FieldProps = Omit<
  InputHTMLAttributes<HTMLInputElement>,
  'name' | 'type' | 'inputMode' | 'defaultValue'
> & {
  name: string;
  label: ReactNode;
  kind?: InputKind;
  /** Stands behind the number, fixed: “mm/s rms”, “g”. */
  unit?: string;
  hint?: ReactNode;
  /** The form's action state: gives the typed value and the error of this name back. */
  state?: ActionState;
  defaultValue?: string;
};

/** One line to type into. Numbers are text with a number pad, so that scrolling never changes them. */
export function Field(props: FieldProps) {
  const { name, label, kind = 'text', unit, hint, state, defaultValue, ...rest } = props;
  const id = useId();
  const error = errorOf(state, name);
  const start =
    rest.value === undefined ? { defaultValue: startOf(state, name, defaultValue) } : {};
  const look = `${kind in NUMBER_PADS ? 'figures' : ''} ${unit ? 'rounded-r-none' : ''}`;
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error}>
      <span className="flex items-stretch">
        <input
          {...typeOf(kind)}
          {...rest}
          {...start}
          id={id}
          name={name}
          aria-invalid={error !== undefined || undefined}
          aria-describedby={describedBy(id, hint, error)}
          className={boxLook(error, look)}
        />
        {unit !== undefined && <UnitSuffix unit={unit} />}
      </span>
    </FieldFrame>
  );
}

const NUMBER_PADS = { decimal: 'decimal', whole: 'numeric' } as const;

function typeOf(kind: InputKind): InputHTMLAttributes<HTMLInputElement> {
  if (kind === 'decimal' || kind === 'whole')
    return { type: 'text', inputMode: NUMBER_PADS[kind], autoComplete: 'off' };
  if (kind === 'email' || kind === 'password') return { type: kind };
  return { type: kind, autoComplete: 'off' };
}

function UnitSuffix({ unit }: { unit: string }) {
  return (
    <span className="figures flex items-center rounded-r border border-l-0 border-edge bg-paper px-2.5 text-sm whitespace-nowrap text-ink-soft">
      {unit}
    </span>
  );
}
