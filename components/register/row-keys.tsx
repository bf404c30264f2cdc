'use client';

import { useRef, type ReactNode } from 'react';
import { useShortcut } from './use-shortcut';

/** Around a table whose rows begin with a link: `j` and `k` walk the links, Enter opens as links do. */
export function RowKeys({ children }: { children: ReactNode }) {
  const box = useRef<HTMLDivElement>(null);
  useShortcut('j', () => step(box.current, 1));
  useShortcut('k', () => step(box.current, -1));
  return <div ref={box}>{children}</div>;
}

function step(box: Element | null, by: 1 | -1) {
  const links = [...(box?.querySelectorAll<HTMLElement>('tbody tr > :first-child a') ?? [])];
  const at = links.findIndex((link) => link === document.activeElement);
  const next = at === -1 && by === -1 ? links.length - 1 : at + by;
  links[Math.max(0, Math.min(links.length - 1, next))]?.focus();
}
