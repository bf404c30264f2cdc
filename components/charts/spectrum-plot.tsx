import { columnMaxima } from '@/lib/domain/drawing/spectrum-lines';
import { nearestIndex } from '@/lib/domain/drawing/curve-pieces';
import { formatNumber, formatTick } from '@/lib/format';
import { XAxis, YAxis } from './chart-axes';
import { linearX, linearY, type LinearScale } from './chart-scales';
import type { ChartRange, ChartTitle, PlotBox } from './chart-types';
import { Clip, clipId } from './plot-clip';
import type { SpectrumCurve, SpectrumView } from './spectrum-types';

/** Decades shown under the largest line of a log plot. */
const DECADES = 4;
const MOST_ORDERS = 12;
const MOST_HARMONICS = 20;

type SpectrumPlotProps = {
  width: number;
  box: PlotBox;
  curve: SpectrumCurve;
  shown: ChartRange;
  view: SpectrumView;
  title: ChartTitle;
  /** Frequency of one turn; null where the speed is not known. */
  turnHz: number | null;
  cursor: { hz: number; value: number };
  /** First of the harmonic cursors; null where they are off. */
  harmonicsHz: number | null;
};

/** Lines of a spectrum, reduced to the width by their largest, so that no peak is lost. */
export function SpectrumPlot(props: SpectrumPlotProps) {
  const { width, box, curve, shown, view, title, turnHz, cursor, harmonicsHz } = props;
  const range = { from: nearestIndex(curve.hz, shown.from), to: nearestIndex(curve.hz, shown.to) };
  const lines = columnMaxima(curve.values, range, Math.max(1, Math.floor(box.width)));
  const top = lines.reduce((most, { value }) => Math.max(most, value), 0) || 1;
  const x = linearX(shown, box);
  const { y, ticks } = yScale(view, top, box);
  const bottom = box.top + box.height;
  const path = lines.map(({ index, value }, i) => {
    const command = i === 0 ? 'M' : 'L';
    return `${command}${x(curve.hz[index] ?? 0).toFixed(1)} ${y.of(value).toFixed(1)}`;
  });
  return (
    <svg width={width} height={bottom + 40} className="block" aria-hidden="true">
      <YAxis
        {...{ box, ticks }}
        scale={y.scale}
        unit={title.unit}
        decimalMark={title.decimalMark}
      />
      <FrequencyAxis {...{ box, x, shown, view, turnHz }} />
      <Clip box={box} />
      {turnHz !== null && (
        <Multiples {...{ x, box, shown }} of={turnHz} most={MOST_ORDERS} kind="order" />
      )}
      <g clipPath={`url(#${clipId(box)})`}>
        <path d={path.join('')} className="fill-none stroke-ink" strokeLinejoin="round" />
      </g>
      {harmonicsHz !== null && (
        <Multiples {...{ x, box, shown }} of={harmonicsHz} most={MOST_HARMONICS} kind="harmonic" />
      )}
      {cursor.hz >= shown.from && cursor.hz <= shown.to && (
        <g className="no-print stroke-blue">
          <line
            x1={x(cursor.hz)}
            x2={x(cursor.hz)}
            y1={box.top}
            y2={bottom}
            strokeDasharray="2 2"
          />
          <circle
            cx={x(cursor.hz)}
            cy={y.of(cursor.value)}
            r={3.5}
            className="fill-sheet"
            strokeWidth={2}
          />
        </g>
      )}
    </svg>
  );
}

type AxisProps = Pick<SpectrumPlotProps, 'box' | 'shown' | 'view' | 'turnHz'> & { x: LinearScale };

function FrequencyAxis({ box, x, shown, view, turnHz }: AxisProps) {
  const unitHz = view.x === 'orders' && turnHz !== null ? turnHz : 1;
  const scale = linearX({ from: shown.from / unitHz, to: shown.to / unitHz }, box);
  const values = scale.ticks(Math.max(2, Math.floor(box.width / 70)));
  const step = (values[1] ?? 1) - (values[0] ?? 0);
  return (
    <XAxis
      box={box}
      scale={x}
      ticks={values.map((value) => value * unitHz)}
      tickText={(hz) => formatTick(hz / unitHz, step)}
      label={unitHz === 1 ? 'Hz' : 'orders of the speed'}
    />
  );
}

type MultiplesProps = {
  x: LinearScale;
  box: PlotBox;
  shown: ChartRange;
  of: number;
  most: number;
  kind: 'order' | 'harmonic';
};

/** Marks at whole multiples of a frequency, numbered where there is room. */
function Multiples({ x, box, shown, of, most, kind }: MultiplesProps) {
  const all = Array.from({ length: most }, (_, i) => i + 1);
  const inSight = all.filter((n) => n * of >= shown.from && n * of <= shown.to);
  const apart = Math.abs(x(of) - x(0));
  const isOrder = kind === 'order';
  return inSight.map((n) => (
    <g key={n}>
      <line
        x1={x(n * of)}
        x2={x(n * of)}
        y1={isOrder ? box.top + 6 : box.top + 18}
        y2={box.top + box.height}
        className={isOrder ? 'stroke-edge' : 'stroke-blue'}
        strokeDasharray={isOrder ? '1 3' : '4 3'}
      />
      {(apart > 22 || n === 1) && (
        <text
          x={x(n * of)}
          y={isOrder ? box.top + 3 : box.top + 15}
          textAnchor="middle"
          className={`figures text-xs ${isOrder ? 'fill-ink-soft' : 'fill-blue'}`}
        >
          {isOrder ? `${n}x` : n}
        </text>
      )}
    </g>
  ));
}

function yScale(view: SpectrumView, top: number, box: PlotBox) {
  if (view.y === 'linear') {
    const scale = linearY({ from: 0, to: top * 1.05 }, box);
    return { y: { scale, of: (value: number) => scale(value) }, ticks: undefined };
  }
  const highest = Math.ceil(Math.log10(top * 1.05));
  const lowest = highest - DECADES;
  const scale = linearY({ from: lowest, to: highest }, box);
  const values = Array.from({ length: DECADES + 1 }, (_, i) => lowest + i);
  return {
    y: { scale, of: (value: number) => scale(Math.log10(Math.max(value, 10 ** lowest))) },
    ticks: { values, text: (power: number) => formatNumber(10 ** power, { significant: 1 }) },
  };
}
