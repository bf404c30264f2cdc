'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import { useState } from 'react';
import { isWithin, PLACES } from './places';

/** The places; on narrow screens behind a menu button. */
export function Navigation({ inTrayCount }: { inTrayCount: number }) {
  const pathname = usePathname();
  const [openAt, setOpenAt] = useState<string | null>(null);
  const open = openAt === pathname;
  return (
    <>
      <button
        type="button"
        aria-expanded={open}
        aria-controls="places"
        onClick={() => setOpenAt(open ? null : pathname)}
        className="target ml-auto cursor-pointer rounded border border-edge px-3 font-semibold xl:hidden"
      >
        Menu
      </button>
      <nav
        id="places"
        aria-label="Places"
        className={`w-full xl:order-none xl:block xl:w-auto ${open ? 'block' : 'hidden'}`}
      >
        <ul className="flex flex-col xl:flex-row xl:gap-5">
          {PLACES.map((place) => (
            <li key={place.label}>
              <Link
                href={place.href}
                aria-current={isWithin(place, pathname) ? 'page' : undefined}
                className="target flex items-center gap-1.5 border-l-2 border-transparent px-3 text-ink-soft hover:text-ink aria-[current=page]:border-blue aria-[current=page]:text-ink xl:border-b-2 xl:border-l-0 xl:px-0"
              >
                {place.label}
                {place.label === 'In-tray' && inTrayCount > 0 && (
                  <span className="figures">
                    {inTrayCount}
                    <span className="sr-only"> waiting</span>
                  </span>
                )}
              </Link>
            </li>
          ))}
        </ul>
      </nav>
    </>
  );
}
