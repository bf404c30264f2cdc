'use client';

import { useState } from 'react';
import { nearestIndex } from '@/lib/domain/drawing/curve-pieces';
import { formatDuration, formatQuantity } from '@/lib/format';
import { ChartFrame } from './chart-frame';
import { shareToX } from './chart-scales';
import type { ChartRange, ChartTitle } from './chart-types';
import { PlotSurface } from './plot-surface';
import { useRange } from './use-range';
import { WaveformPlot, type Waveform } from './waveform-plot';

type WaveformChartProps = {
  title: ChartTitle;
  curve: Waveform;
  /** The whole record, seconds. */
  full: ChartRange;
  /** Keeps the zoom outside and fetches a finer curve for it. */
  zoom?: { range: ChartRange | null; onRange: (range: ChartRange | null) => void };
  /** While a finer curve is on its way, the old one stays, dimmed. */
  refining?: boolean;
  /** Instants of the tacho's pulses, seconds. */
  turns?: readonly number[];
};

/** The record over time; zooming asks for finer values. */
export function WaveformChart(props: WaveformChartProps) {
  const { title, curve, full, zoom, refining = false, turns = [] } = props;
  const range = useRange(full, zoom?.range, zoom?.onRange);
  const [wanted, setWanted] = useState<number | null>(null);
  const index = nearestIndex(curve.seconds, wanted ?? range.shown.from);
  const at = curve.seconds[index] ?? 0;
  const text = `${formatDuration(at)} · ${formatQuantity(curve.values[index] ?? 0, title.unit, title)}`;
  const reduced = curve.sampleCount > curve.seconds.length;
  const fromShare = (share: number) => shareToX(share, range.shown);
  return (
    <ChartFrame
      title={title}
      range={range}
      around={at}
      readout={
        <>
          {text}
          {reduced && (
            <span className="block text-xs text-ink-soft">
              {`${curve.sampleCount} samples, shown by their lowest and highest; zoom in for each of them.`}
            </span>
          )}
        </>
      }
      numbers={{
        fileName: `${title.point} ${title.quantity}`,
        head: ['time, s', `${title.quantity}, ${title.unit}`],
        rows: () => curve.seconds.map((second, i) => [second, curve.values[i] ?? null]),
      }}
    >
      {(width) => {
        const box = { left: 52, top: 22, width: Math.max(60, width - 64), height: 170 };
        return (
          <>
            <WaveformPlot
              {...{ width, box, curve, turns, refining }}
              shown={range.shown}
              index={index}
              title={title}
            />
            <PlotSurface
              box={box}
              label={`Cursor on ${title.quantity}`}
              cursor={{ index, count: curve.seconds.length, text }}
              onCursor={(next) => setWanted(curve.seconds[next] ?? null)}
              onPoint={(share) => setWanted(fromShare(share))}
              onDrag={(from, to) => range.zoomTo({ from: fromShare(from), to: fromShare(to) })}
              onEscape={range.reset}
            />
          </>
        );
      }}
    </ChartFrame>
  );
}
