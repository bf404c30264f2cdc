'use client';

import { useParentSize } from '@visx/responsive';
import type { ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { titleText, type ChartTitle, type Numbers } from './chart-types';
import { NumbersBehind } from './numbers-behind';
import type { RangeControl } from './use-range';

type ChartFrameProps = {
  title: ChartTitle;
  /** What the cursor reads; announced as it moves. */
  readout: ReactNode;
  range: RangeControl;
  /** Where the zoom button zooms to. */
  around: number;
  controls?: ReactNode;
  numbers: Numbers;
  /** Draws for a width in pixels. */
  children: (width: number) => ReactNode;
};

/** What every chart has: a title that says it all, a readout, zoom without a mouse, its numbers. */
export function ChartFrame(props: ChartFrameProps) {
  const { title, readout, range, around, controls, numbers, children } = props;
  const { parentRef, width } = useParentSize({
    debounceTime: 50,
    initialSize: { width: 640 },
  });
  return (
    <figure className="min-w-0">
      <figcaption className="text-sm font-semibold">{titleText(title)}</figcaption>
      <div className="mt-1 flex flex-wrap items-center justify-between gap-x-4 gap-y-1">
        <p className="min-h-5 text-sm" aria-live="polite">
          {readout}
        </p>
        <div className="no-print flex flex-wrap items-center gap-2">
          {controls}
          <Button variant="quiet" onClick={() => range.zoomIn(around)}>
            Zoom in
          </Button>
          {range.zoomed && (
            <Button variant="quiet" onClick={range.reset}>
              Show all
            </Button>
          )}
        </div>
      </div>
      <div ref={parentRef} className="relative mt-1">
        {width > 0 && children(width)}
      </div>
      <NumbersBehind title={titleText(title)} numbers={numbers} />
    </figure>
  );
}
