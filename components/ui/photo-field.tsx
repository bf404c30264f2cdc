import { useId, type ReactNode } from 'react';
import type { ActionState } from '@/lib/schemas/action-state';
import { boxLook, describedBy, FieldFrame } from './field-frame';
import { errorOf } from './field-state';

type PhotoFieldProps = { name: string; label: ReactNode; hint?: ReactNode; state?: ActionState };

/** A photo: a phone opens its camera, a desk its file chooser. */
export function PhotoField({ name, label, hint, state }: PhotoFieldProps) {
  const id = useId();
  const error = errorOf(state, name);
  return (
    <FieldFrame id={id} label={label} hint={hint} error={error}>
      <input
        id={id}
        type="file"
        name={name}
        accept="image/*"
        capture="environment"
        aria-invalid={error !== undefined || undefined}
        aria-describedby={describedBy(id, hint, error)}
        className={boxLook(error, 'cursor-pointer')}
      />
    </FieldFrame>
  );
}
