'use client';

import { useState } from 'react';
import { nearestIndex } from '@/lib/domain/drawing/curve-pieces';
import { highestPeaks } from '@/lib/domain/drawing/spectrum-lines';
import { formatNumber, formatQuantity } from '@/lib/format';
import { ChartFrame } from './chart-frame';
import { shareToX } from './chart-scales';
import type { ChartRange, ChartTitle } from './chart-types';
import { PeaksTable } from './peaks-table';
import { PlotSurface } from './plot-surface';
import { SpectrumControls } from './spectrum-controls';
import { SpectrumPlot } from './spectrum-plot';
import type { SpectrumCurve, SpectrumMark, SpectrumView } from './spectrum-types';
import { useRange } from './use-range';

type SpectrumChartProps = {
  title: ChartTitle;
  curve: SpectrumCurve;
  /** Null or left out where the speed is not known: no orders then. */
  speedRpm?: number | null;
  /** Frequencies that can carry harmonic cursors, such as those of a bearing. */
  marks?: readonly SpectrumMark[];
  /** Keeps the zoom outside and fetches finer lines for it, Hz. */
  zoom?: { range: ChartRange | null; onRange: (range: ChartRange | null) => void };
};

const FIRST_VIEW: SpectrumView = { y: 'linear', x: 'Hz', harmonicsOf: 'off' };

/** A spectrum with a cursor, harmonic cursors and the orders of the speed. */
export function SpectrumChart({ title, curve, speedRpm, marks = [], zoom }: SpectrumChartProps) {
  const [view, setView] = useState(FIRST_VIEW);
  const [wanted, setWanted] = useState<number | null>(null);
  const range = useRange({ from: 0, to: curve.hz.at(-1) ?? 1 }, zoom?.range, zoom?.onRange);
  const turnHz = speedRpm ? speedRpm / 60 : null;
  const index = wanted === null ? highestLine(curve) : nearestIndex(curve.hz, wanted);
  const cursorHz = curve.hz[index] ?? 0;
  const text = readout(curve, index, title, turnHz);
  const fromShare = (share: number) => shareToX(share, range.shown);
  return (
    <>
      <ChartFrame
        title={title}
        range={range}
        around={cursorHz}
        readout={text}
        controls={
          <SpectrumControls {...{ view, marks }} onView={setView} withOrders={turnHz !== null} />
        }
        numbers={{
          fileName: `${title.point} ${title.quantity} spectrum`,
          head: ['frequency, Hz', `${title.quantity}, ${title.unit}`],
          rows: () => curve.hz.map((hz, i) => [hz, curve.values[i] ?? null]),
        }}
      >
        {(width) => {
          const box = { left: 52, top: 24, width: Math.max(60, width - 64), height: 210 };
          return (
            <>
              <SpectrumPlot
                {...{ title, width, box, curve, view, turnHz }}
                cursor={{ hz: cursorHz, value: curve.values[index] ?? 0 }}
                shown={range.shown}
                harmonicsHz={harmonicsFrom(view, marks, cursorHz)}
              />
              <PlotSurface
                box={box}
                label={`Cursor on the spectrum of ${title.quantity}`}
                cursor={{ index, count: curve.hz.length, text }}
                onCursor={(next) => setWanted(curve.hz[next] ?? null)}
                onPoint={(share) => setWanted(fromShare(share))}
                onDrag={(from, to) => range.zoomTo({ from: fromShare(from), to: fromShare(to) })}
                onEscape={range.reset}
              />
            </>
          );
        }}
      </ChartFrame>
      <PeaksTable {...{ curve, turnHz, title }} />
    </>
  );
}

function highestLine(curve: SpectrumCurve): number {
  return highestPeaks(curve.values, 1)[0]?.index ?? 0;
}

function harmonicsFrom(view: SpectrumView, marks: readonly SpectrumMark[], cursorHz: number) {
  const { harmonicsOf } = view;
  if (harmonicsOf === 'off') return null;
  const hz =
    harmonicsOf === 'cursor'
      ? cursorHz
      : (marks.find(({ label }) => label === harmonicsOf.mark)?.frequencyHz ?? 0);
  return hz > 0 ? hz : null;
}

function readout(
  curve: SpectrumCurve,
  index: number,
  { unit, decimalMark }: ChartTitle,
  turnHz: number | null,
): string {
  const hz = curve.hz[index] ?? 0;
  const order =
    turnHz === null ? '' : ` · order ${formatNumber(hz / turnHz, { decimals: 2, decimalMark })}`;
  const frequency = formatQuantity(hz, 'Hz', { significant: 4, decimalMark });
  return `${frequency}${order} · ${formatQuantity(curve.values[index] ?? 0, unit, { decimalMark })}`;
}
