import type { ReactNode } from 'react';
import { Breadcrumb, type Crumb } from './breadcrumb';

type PageHeadProps = {
  title: ReactNode;
  crumbs?: readonly Crumb[];
  /** One quiet line under the title. */
  note?: ReactNode;
  actions?: ReactNode;
};

/** The top of every page: where it hangs, what it is, what can be done. */
export function PageHead({ title, crumbs, note, actions }: PageHeadProps) {
  return (
    <header className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        {crumbs !== undefined && <Breadcrumb crumbs={crumbs} />}
        <h1 className="text-xl font-semibold">{title}</h1>
        {note !== undefined && <p className="text-ink-soft">{note}</p>}
      </div>
      {actions !== undefined && (
        <div className="no-print flex flex-wrap items-center gap-2">{actions}</div>
      )}
    </header>
  );
}
