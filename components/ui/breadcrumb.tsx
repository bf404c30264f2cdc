import Link from 'next/link';
import { Fragment } from 'react';

export type Crumb = { label: string; href?: string };

/** Where this page hangs: “Northbank Works › Kiln line”. */
export function Breadcrumb({ crumbs }: { crumbs: readonly Crumb[] }) {
  return (
    <nav aria-label="Where this is" className="text-sm text-ink-soft">
      {crumbs.map((crumb, index) => (
        <Fragment key={`${crumb.label} ${crumb.href ?? ''}`}>
          {index > 0 && <span aria-hidden="true"> › </span>}
          {crumb.href === undefined ? (
            crumb.label
          ) : (
            <Link href={crumb.href} className="inline-block py-0.5 hover:text-ink hover:underline">
              {crumb.label}
            </Link>
          )}
        </Fragment>
      ))}
    </nav>
  );
}
