import type { ReactNode } from 'react';

/** A plain word of state: “held”, “provisional”, “retired”. Colour is for severity, so it has none. */
export function Badge({ children }: { children: ReactNode }) {
  return (
    <span className="inline-block rounded border border-edge px-1.5 text-xs whitespace-nowrap text-ink-soft">
      {children}
    </span>
  );
}
