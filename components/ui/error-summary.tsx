'use client';

import { useEffect, useRef } from 'react';
import type { Failure } from '@/lib/domain/result';
import type { ActionState } from '@/lib/schemas/action-state';

type ErrorSummaryProps = { state: ActionState; title?: string };

/**
 * What stopped the form, on top of it and focused; each line leads to its field. Stands inside the
 * form it speaks of.
 */
export function ErrorSummary({ state, title = 'Nothing was saved yet' }: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (state.status === 'failed') box.current?.focus();
  }, [state]);
  if (state.status !== 'failed') return null;
  const failures = state.failures.length > 0 ? state.failures : [state.failure];
  return (
    <div
      ref={box}
      role="alert"
      tabIndex={-1}
      className="rounded border-2 border-fault bg-sheet p-4 focus:outline-none"
    >
      <h2 className="text-base font-semibold">{title}</h2>
      <ul className="mt-1 flex flex-col gap-1">
        {failures.map((failure) => (
          <li key={`${failure.code} ${failure.field ?? ''} ${failure.message}`}>
            <FailureLine failure={failure} onGo={(name) => goToField(box.current, name)} />
          </li>
        ))}
      </ul>
    </div>
  );
}

function FailureLine({ failure, onGo }: { failure: Failure; onGo: (name: string) => void }) {
  const { field, message } = failure;
  if (field === undefined || field === '') return <span className="text-fault">{message}</span>;
  return (
    <button
      type="button"
      className="cursor-pointer py-0.5 text-left font-semibold text-fault underline underline-offset-2"
      onClick={() => onGo(field)}
    >
      {message}
    </button>
  );
}

function goToField(from: Element | null, name: string) {
  const within = from?.closest('form') ?? document;
  const escaped = CSS.escape(name);
  // A group of ticks has no field of the name itself: its first tick stands for it.
  const field =
    within.querySelector<HTMLElement>(`[name="${escaped}"]`) ??
    within.querySelector<HTMLElement>(`[name^="${escaped}."]`);
  field?.focus();
  field?.scrollIntoView({ block: 'center' });
}
