import type { ReactNode } from 'react';

type EmptyStateProps = {
  /** What belongs here. */
  title: string;
  /** Why it is empty, or what to do. */
  children?: ReactNode;
  /** The first step: one link or button. */
  action?: ReactNode;
};

/** An empty place says what belongs there and offers the first step. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-2 rounded border border-dashed border-edge p-5">
      <p className="text-base font-semibold">{title}</p>
      {children !== undefined && <div className="max-w-prose text-ink-soft">{children}</div>}
      {action}
    </div>
  );
}
