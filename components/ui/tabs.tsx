import Link from 'next/link';

export type Tab = { href: string; label: string; count?: number; current: boolean };

/** Views of one thing. Each is a link, so that the address holds which one is open. */
export function Tabs({ label, tabs }: { label: string; tabs: readonly Tab[] }) {
  return (
    <nav aria-label={label} className="no-print relative overflow-x-auto border-b border-rule">
      <ul className="flex gap-1">
        {tabs.map((tab) => (
          <li key={tab.href}>
            <Link
              href={tab.href}
              scroll={false}
              aria-current={tab.current ? 'page' : undefined}
              className="target -mb-px flex items-center gap-1.5 border-b-2 border-transparent px-3 whitespace-nowrap text-ink-soft hover:text-ink aria-[current=page]:border-blue aria-[current=page]:font-semibold aria-[current=page]:text-ink"
            >
              {tab.label}
              {tab.count !== undefined && <span className="figures text-xs">{tab.count}</span>}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
