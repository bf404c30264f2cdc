import Link from 'next/link';
import type { ReactNode, TdHTMLAttributes } from 'react';

type TableProps = {
  /** What the table holds, read out by screen readers; shown where `captionShown`. */
  caption: string;
  captionShown?: boolean;
  /** 48 px rows instead of 36 px. */
  roomy?: boolean;
  children: ReactNode;
};

/** A real table that scrolls sideways inside its own box on narrow screens. */
export function Table({ caption, captionShown = false, roomy = false, children }: TableProps) {
  return (
    <div
      role="region"
      aria-label={caption}
      tabIndex={0}
      className="relative -mx-1 overflow-x-auto px-1 print:overflow-visible"
    >
      <table
        className={`w-full border-collapse text-sm ${roomy ? '[&_td]:h-12 [&_tbody_th]:h-12' : '[&_td]:h-9 [&_tbody_th]:h-9'}`}
      >
        <caption className={captionShown ? 'mb-2 text-left text-sm font-semibold' : 'sr-only'}>
          {caption}
        </caption>
        {children}
      </table>
    </div>
  );
}

export type Sort = { href: string; direction: 'ascending' | 'descending' | null };

type ThProps = {
  numeric?: boolean;
  /** Makes the head a link that sorts; the arrow shows where the column is sorted. */
  sort?: Sort;
  children?: ReactNode;
};

/** Head of a column; a number column carries its unit here, once. */
export function Th({ numeric = false, sort, children }: ThProps) {
  return (
    <th
      scope="col"
      aria-sort={sort?.direction ?? (sort ? 'none' : undefined)}
      className={`border-b border-ink px-2 py-1.5 align-bottom text-xs font-semibold text-ink-soft ${numeric ? 'text-right' : 'text-left'}`}
    >
      {sort ? (
        <Link
          href={sort.href}
          scroll={false}
          className="inline-flex items-center gap-1 py-1 hover:text-ink hover:underline"
        >
          {children}
          <span aria-hidden="true">{arrowOf(sort.direction)}</span>
        </Link>
      ) : (
        children
      )}
    </th>
  );
}

type TdProps = TdHTMLAttributes<HTMLTableCellElement> & { numeric?: boolean };

/** A cell; numbers stand right, in figures. */
export function Td({ numeric = false, className = '', ...rest }: TdProps) {
  // On a phone a table scrolls sideways: words then take a line or two, not a column of single words.
  const look = numeric ? 'figures text-right whitespace-nowrap' : 'text-left max-sm:min-w-28';
  return <td {...rest} className={`border-b border-rule px-2 py-1 ${look} ${className}`} />;
}

/** The first cell of a row, its heading: usually the link to the thing. */
export function RowHead({ children }: { children: ReactNode }) {
  return (
    <th
      scope="row"
      className="border-b border-rule px-2 py-1 text-left font-semibold max-sm:min-w-20"
    >
      {children}
    </th>
  );
}

function arrowOf(direction: Sort['direction']): string {
  if (direction === null) return '↕';
  return direction === 'ascending' ? '↑' : '↓';
}
