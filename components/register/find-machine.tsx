'use client';

import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useRef, useState, type KeyboardEvent } from 'react';
import { Dialog } from '@/components/ui/dialog';
import { KeyCap } from '@/components/ui/key-cap';
import { routes } from '@/lib/routes';
import { foundMachines } from '@/lib/schemas/found-machines';
import { FoundList } from './found-list';
import { useShortcut } from './use-shortcut';

/** Goes to a machine from anywhere: `/` or Ctrl/⌘ K, a few letters, Enter. */
export function FindMachine() {
  const [open, setOpen] = useState(false);
  useShortcut('/', () => setOpen(true));
  useShortcut('k', () => setOpen(true), true);
  return (
    <Dialog
      title="Find a machine"
      open={open}
      onOpenChange={setOpen}
      trigger={
        <button
          type="button"
          className="target flex cursor-pointer items-center gap-2 px-2 text-ink-soft hover:text-ink"
        >
          <span>
            find <span className="max-sm:sr-only">a machine</span>
          </span>
          <span className="max-sm:hidden">
            <KeyCap>/</KeyCap>
          </span>
        </button>
      }
    >
      <FindBox onDone={() => setOpen(false)} />
    </Dialog>
  );
}

function FindBox({ onDone }: { onDone: () => void }) {
  const router = useRouter();
  const [marked, setMarked] = useState(0);
  const { setText, asked } = usePausedText();
  const { data, isFetching, isError } = useQuery({
    queryKey: ['find', asked],
    queryFn: ({ signal }) => find(asked, signal),
    enabled: asked !== '',
  });
  const machines = asked === '' ? [] : (data?.machines ?? []);
  const at = Math.min(marked, machines.length - 1);
  const go = (machineId: number) => {
    onDone();
    router.push(routes.machine(machineId));
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step !== undefined && machines.length > 0) {
      event.preventDefault();
      setMarked((at + step + machines.length) % machines.length);
    }
    const machine = machines[at];
    if (event.key === 'Enter' && machine) go(machine.id);
  };
  return (
    <>
      <input
        role="combobox"
        aria-label="Tag, name or alias of the machine"
        aria-expanded={machines.length > 0}
        aria-controls="found-machines"
        aria-activedescendant={machines[at] ? `found-${machines[at].id}` : undefined}
        aria-autocomplete="list"
        autoComplete="off"
        placeholder="Tag, name or alias"
        onChange={(event) => {
          setText(event.target.value.trim());
          setMarked(0);
        }}
        onKeyDown={onKeyDown}
        className="target w-full rounded border border-edge bg-sheet px-3 text-base"
      />
      <FoundList machines={machines} marked={at} onChoose={go} />
      <p role="status" className="mt-2 text-ink-soft">
        {statusText({ asked, isFetching, isError, count: machines.length })}
      </p>
    </>
  );
}

/** The text as typed, handed on once the typing pauses, so that each letter is not a question. */
function usePausedText() {
  const [asked, setAsked] = useState('');
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const setText = (next: string) => {
    clearTimeout(timer.current);
    timer.current = setTimeout(() => setAsked(next), 120);
  };
  return { asked, setText };
}

async function find(text: string, signal: AbortSignal) {
  const response = await fetch(routes.api.find(text), { signal });
  if (!response.ok) throw new Error(`Find answered ${response.status}.`);
  return foundMachines.parse(await response.json());
}

type Status = { asked: string; isFetching: boolean; isError: boolean; count: number };

function statusText({ asked, isFetching, isError, count }: Status): string {
  if (asked === '') return 'Type part of a tag or name. Arrow keys choose, Enter opens.';
  if (isError) return 'We couldn’t search: the server did not answer. Try again in a moment.';
  if (isFetching && count === 0) return 'Looking…';
  if (count === 0) return `No machine you may see has “${asked}” in its tag, name or alias.`;
  return count === 1 ? '1 machine' : `${count} machines`;
}
