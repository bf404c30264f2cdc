import type { ReactNode } from 'react';

/** A row of facts: small name above, value under it. Holds `Fact`s. */
export function Facts({ children }: { children: ReactNode }) {
  return <dl className="flex flex-wrap gap-x-8 gap-y-4">{children}</dl>;
}

export function Fact({ label, children }: { label: ReactNode; children: ReactNode }) {
  return (
    <div className="flex flex-col gap-1">
      <dt className="text-xs text-ink-soft">{label}</dt>
      <dd className="flex min-h-7 items-center gap-2">{children}</dd>
    </div>
  );
}
