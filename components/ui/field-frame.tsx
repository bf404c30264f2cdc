import type { ReactNode } from 'react';

type FieldFrameProps = {
  id: string;
  label: ReactNode;
  hint?: ReactNode;
  error?: string;
  children: ReactNode;
};

/** Label above, hint under it, then the box, then what is wrong with it. */
export function FieldFrame({ id, label, hint, error, children }: FieldFrameProps) {
  return (
    <div className="flex flex-col gap-1">
      <label htmlFor={id} className="text-sm font-semibold">
        {label}
      </label>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="text-xs text-ink-soft">
          {hint}
        </p>
      )}
      {children}
      <FieldError id={`${id}-error`} error={error} />
    </div>
  );
}

/** The sentence under a field, with a sign that is not only a colour. */
export function FieldError({ id, error }: { id: string; error?: string }) {
  if (error === undefined) return null;
  return (
    <p id={id} className="flex gap-1.5 text-sm font-semibold text-fault">
      <span aria-hidden="true">▲</span>
      {error}
    </p>
  );
}

/** `aria-describedby` of a box with these parts. */
export function describedBy(id: string, hint: ReactNode, error?: string): string | undefined {
  const ids = [hint === undefined ? '' : `${id}-hint`, error === undefined ? '' : `${id}-error`];
  return ids.filter(Boolean).join(' ') || undefined;
}

const EDGE = 'border-edge';
const EDGE_FAULT = 'border-fault border-2';

/** The look of everything that is typed into. */
export function boxLook(error: string | undefined, className = ''): string {
  return `target w-full rounded border bg-sheet px-2.5 py-1.5 text-sm text-ink max-sm:text-base ${error === undefined ? EDGE : EDGE_FAULT} ${className}`;
}
