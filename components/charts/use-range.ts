'use client';

import { useState } from 'react';
import type { ChartRange } from './chart-types';

export type RangeControl = {
  shown: ChartRange;
  zoomed: boolean;
  zoomTo: (range: ChartRange) => void;
  /** Halves what is in sight, round a place. */
  zoomIn: (around: number) => void;
  reset: () => void;
};

/**
 * What part of the x axis is in sight. With `onRange` the page keeps it (in the address) and may fetch
 * finer data; without it the chart does.
 */
export function useRange(
  full: ChartRange,
  given?: ChartRange | null,
  onRange?: (range: ChartRange | null) => void,
): RangeControl {
  const [own, setOwn] = useState<ChartRange | null>(null);
  const range = onRange ? (given ?? null) : (own ?? given ?? null);
  const set = (next: ChartRange | null) => {
    setOwn(next);
    onRange?.(next);
  };
  const shown = range ?? full;
  return {
    shown,
    zoomed: range !== null,
    zoomTo: (next) => {
      if (next.to > next.from) set(next);
    },
    zoomIn: (around) => {
      const quarter = (shown.to - shown.from) / 4;
      const middle = Math.min(Math.max(around, shown.from + quarter), shown.to - quarter);
      if (quarter > 0) set({ from: middle - quarter, to: middle + quarter });
    },
    reset: () => set(null),
  };
}
