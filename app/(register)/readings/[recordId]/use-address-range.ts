'use client';

import { useSearchParams } from 'next/navigation';
import { useMemo } from 'react';
import type { ChartRange } from '@/components/charts/chart-types';

/** A zoom kept in the address under a name (`?hz=10-80`), so that a link shows the same stretch. */
export function useAddressRange(name: string) {
  const text = useSearchParams().get(name);
  // The same address must give the same object: it is part of what is fetched.
  const range = useMemo(() => rangeOf(text), [text]);
  const setRange = (next: ChartRange | null) => {
    const address = new URL(window.location.href);
    if (next === null) address.searchParams.delete(name);
    else address.searchParams.set(name, `${short(next.from)}-${short(next.to)}`);
    window.history.replaceState(null, '', address);
  };
  return [range, setRange] as const;
}

function rangeOf(text: string | null): ChartRange | null {
  const match = /^([\d.]+)-([\d.]+)$/.exec(text ?? '');
  const [from, to] = [Number(match?.[1]), Number(match?.[2])];
  return to > from ? { from, to } : null;
}

function short(value: number): string {
  return Math.max(0, value)
    .toFixed(6)
    .replace(/\.?0+$/, '');
}
