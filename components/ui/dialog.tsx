'use client';

import { Dialog as Radix } from 'radix-ui';
import type { ReactNode } from 'react';

type DialogProps = {
  title: string;
  /** The button that opens it; left out where `open` is driven from outside. */
  trigger?: ReactNode;
  description?: ReactNode;
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  children: ReactNode;
};

/** A question on top of the page. Keeps the focus inside, gives it back, Escape closes it. */
export function Dialog({ title, trigger, description, open, onOpenChange, children }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      {trigger !== undefined && <Radix.Trigger asChild>{trigger}</Radix.Trigger>}
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-black/50" />
        <Radix.Content
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
          onOpenAutoFocus={focusFirstField}
          className="fixed top-[10vh] left-1/2 z-50 max-h-[80vh] w-[min(34rem,calc(100vw-2rem))] -translate-x-1/2 overflow-y-auto rounded border border-rule bg-sheet p-5 shadow-xl"
        >
          <div className="mb-3 flex items-start justify-between gap-4">
            <Radix.Title className="text-lg font-semibold">{title}</Radix.Title>
            <Radix.Close
              className="target -mt-1.5 cursor-pointer px-2 text-ink-soft hover:text-ink"
              aria-label="Close"
            >
              ✕
            </Radix.Close>
          </div>
          {description !== undefined && (
            <Radix.Description className="mb-3 text-ink-soft">{description}</Radix.Description>
          )}
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

/** What is typed first has the focus, not the button that closes. */
function focusFirstField(event: Event) {
  const content = event.currentTarget;
  if (!(content instanceof HTMLElement)) return;
  const field = content.querySelector<HTMLElement>('input:not([type="hidden"]), select, textarea');
  if (!field) return;
  event.preventDefault();
  field.focus();
}
