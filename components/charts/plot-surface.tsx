'use client';

import { useState, type KeyboardEvent, type PointerEvent } from 'react';
import type { PlotBox } from './chart-types';

type PlotSurfaceProps = {
  box: PlotBox;
  /** Names the cursor: “Cursor on the trend”. */
  label: string;
  cursor: { index: number; count: number; text: string };
  onCursor: (index: number) => void;
  /** The pointer moved over this share of the width, 0…1. */
  onPoint: (share: number) => void;
  /** A stretch was dragged, as shares of the width. */
  onDrag: (from: number, to: number) => void;
  onEscape: () => void;
};

const SHORTEST_DRAG = 0.015;

/** Lies over the plot: moves the cursor by pointer or keys, zooms by drag. */
export function PlotSurface(props: PlotSurfaceProps) {
  const { box, label, cursor, onPoint, onDrag } = props;
  const [drag, setDrag] = useState<{ from: number; to: number } | null>(null);
  const onDown = (event: PointerEvent<HTMLDivElement>) => {
    const at = shareOf(event);
    onPoint(at);
    if (event.pointerType !== 'mouse') return;
    event.currentTarget.setPointerCapture(event.pointerId);
    setDrag({ from: at, to: at });
  };
  const onMove = (event: PointerEvent<HTMLDivElement>) => {
    const at = shareOf(event);
    onPoint(at);
    if (drag) setDrag({ ...drag, to: at });
  };
  const onUp = () => {
    if (drag && Math.abs(drag.to - drag.from) > SHORTEST_DRAG)
      onDrag(Math.min(drag.from, drag.to), Math.max(drag.from, drag.to));
    setDrag(null);
  };
  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={Math.max(0, cursor.count - 1)}
      aria-valuenow={Math.max(0, cursor.index)}
      aria-valuetext={cursor.text}
      onKeyDown={(event) => moveByKey(event, props)}
      onPointerDown={onDown}
      onPointerMove={onMove}
      onPointerUp={onUp}
      onPointerCancel={() => setDrag(null)}
      className="no-print absolute cursor-crosshair touch-pan-y"
      style={{ left: box.left, top: box.top, width: box.width, height: box.height }}
    >
      {drag && (
        <div
          className="pointer-events-none absolute inset-y-0 border-x border-blue bg-blue/15"
          style={{
            left: `${Math.min(drag.from, drag.to) * 100}%`,
            width: `${Math.abs(drag.to - drag.from) * 100}%`,
          }}
        />
      )}
    </div>
  );
}

const STEPS: Readonly<Record<string, number>> = {
  ArrowRight: 1,
  ArrowUp: 1,
  ArrowLeft: -1,
  ArrowDown: -1,
  PageUp: 10,
  PageDown: -10,
};

function moveByKey(event: KeyboardEvent, { cursor, onCursor, onEscape }: PlotSurfaceProps) {
  const last = cursor.count - 1;
  const step = (STEPS[event.key] ?? 0) * (event.shiftKey ? 10 : 1);
  const ends: Readonly<Record<string, number>> = { Home: 0, End: last };
  if (event.key === 'Escape') return onEscape();
  const next = ends[event.key] ?? (step === 0 ? null : cursor.index + step);
  if (next === null) return;
  event.preventDefault();
  onCursor(Math.max(0, Math.min(last, next)));
}

function shareOf(event: PointerEvent<HTMLDivElement>): number {
  const { left, width } = event.currentTarget.getBoundingClientRect();
  return width > 0 ? Math.max(0, Math.min(1, (event.clientX - left) / width)) : 0;
}
