import type { ReactNode } from 'react';

/** A key of the keyboard. */
export function KeyCap({ children }: { children: ReactNode }) {
  return (
    <kbd className="figures inline-flex h-5 min-w-5 items-center justify-center rounded border border-edge bg-sheet px-1 text-xs text-ink-soft">
      {children}
    </kbd>
  );
}
