'use client';

import { useEffect, useRef, type ReactNode } from 'react';
import { Notice } from '@/components/ui/notice';

type ResultColumnProps = { answer: unknown; changed: boolean; children: ReactNode };

/** What a computation came to. A new answer is brought into sight: the button may be far below it. */
export function ResultColumn({ answer, changed, children }: ResultColumnProps) {
  const box = useRef<HTMLElement>(null);
  useEffect(() => {
    if (answer === null) return;
    box.current?.focus({ preventScroll: true });
    box.current?.scrollIntoView({ block: 'start' });
  }, [answer]);
  return (
    <section
      ref={box}
      tabIndex={-1}
      aria-label="Result"
      className="flex min-w-0 scroll-mt-4 flex-col gap-5 focus:outline-none"
    >
      {changed && (
        <Notice kind="caution" title="This is not what is typed now">
          Something was changed since it was computed. Compute again before you use it.
        </Notice>
      )}
      {children}
    </section>
  );
}
