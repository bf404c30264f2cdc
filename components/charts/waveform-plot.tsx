import { LinePath } from '@visx/shape';
import { formatTick } from '@/lib/format';
import { XAxis, YAxis } from './chart-axes';
import { linearX, linearY } from './chart-scales';
import type { ChartRange, ChartTitle, PlotBox } from './chart-types';
import { Clip, clipId } from './plot-clip';

/** A record as sent for the screen: reduced to its lowest and highest values, extremes kept. */
export type Waveform = {
  seconds: readonly number[];
  values: readonly number[];
  /** Samples the record has in the stretch sent; more than were sent means reduced. */
  sampleCount: number;
};

type WaveformPlotProps = {
  width: number;
  box: PlotBox;
  curve: Waveform;
  turns: readonly number[];
  refining: boolean;
  shown: ChartRange;
  index: number;
  title: ChartTitle;
};

/** The curve of a record with the tacho's pulses under it. */
export function WaveformPlot(props: WaveformPlotProps) {
  const { width, box, curve, turns, refining, shown, index, title } = props;
  const x = linearX(shown, box);
  const y = linearY(valueRange(curve.values), box);
  const ticks = x.ticks(Math.max(2, Math.floor(box.width / 80)));
  const step = (ticks[1] ?? 1) - (ticks[0] ?? 0);
  const bottom = box.top + box.height;
  const samples = curve.seconds.map((second, i) => ({ second, value: curve.values[i] ?? 0 }));
  const inSight = turns.filter((at) => at >= shown.from && at <= shown.to);
  return (
    <svg width={width} height={bottom + 40} className="block" aria-hidden="true">
      <YAxis box={box} scale={y} unit={title.unit} decimalMark={title.decimalMark} />
      <XAxis
        {...{ box, ticks }}
        scale={x}
        tickText={(value) => formatTick(value, step, title.decimalMark)}
        label="s"
      />
      <Clip box={box} />
      <g clipPath={`url(#${clipId(box)})`} className={refining ? 'opacity-40' : ''}>
        {inSight.length <= box.width / 8 &&
          inSight.map((at) => (
            <line
              key={at}
              x1={x(at)}
              x2={x(at)}
              y1={bottom - 8}
              y2={bottom}
              className="stroke-ink"
            />
          ))}
        <LinePath
          data={samples}
          x={(sample) => x(sample.second)}
          y={(sample) => y(sample.value)}
          className="fill-none stroke-ink"
          strokeLinejoin="round"
        />
      </g>
      {samples[index] && (
        <g className="no-print stroke-blue">
          <line
            x1={x(samples[index].second)}
            x2={x(samples[index].second)}
            y1={box.top}
            y2={bottom}
          />
          <circle
            cx={x(samples[index].second)}
            cy={y(samples[index].value)}
            r={3.5}
            className="fill-sheet"
            strokeWidth={2}
          />
        </g>
      )}
    </svg>
  );
}

/** Room for the largest deviation on either side of zero. */
function valueRange(values: readonly number[]): ChartRange {
  let low = 0;
  let high = 0;
  for (const value of values) {
    if (value < low) low = value;
    else if (value > high) high = value;
  }
  return low === high ? { from: -1, to: 1 } : { from: low, to: high };
}
