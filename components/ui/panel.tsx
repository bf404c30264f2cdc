import type { ReactNode } from 'react';

type PanelProps = {
  title?: ReactNode;
  /** Words behind the title, quieter: “5 of 140 machines, worst first”. */
  note?: ReactNode;
  actions?: ReactNode;
  id?: string;
  children: ReactNode;
};

/** A sheet on the paper ground, with a heading and what can be done with it. */
export function Panel({ title, note, actions, id, children }: PanelProps) {
  const headed = title !== undefined || actions !== undefined;
  return (
    <section id={id} className="panel min-w-0 rounded border border-rule bg-sheet p-4 sm:p-5">
      {headed && (
        <header className="mb-3 flex flex-wrap items-baseline justify-between gap-x-4 gap-y-2">
          {title !== undefined && (
            <h2 className="text-base font-semibold">
              {title}
              {note !== undefined && (
                <span className="ml-2 text-sm font-normal text-ink-soft">{note}</span>
              )}
            </h2>
          )}
          {actions !== undefined && <div className="no-print flex flex-wrap gap-2">{actions}</div>}
        </header>
      )}
      {children}
    </section>
  );
}
