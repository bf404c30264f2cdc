import { formatTimeTick } from '@/lib/format';
import { XAxis, YAxis } from './chart-axes';
import { linearX, linearY, timeTicks, type LinearScale } from './chart-scales';
import type { ChartRange, PlotBox } from './chart-types';
import { EventLines } from './event-ticks';
import { LimitLines } from './limit-lines';
import { Clip, clipId } from './plot-clip';
import { ForecastCurve, TrendCurves } from './trend-curves';
import { breakTimes, valueTop, type TrendModel } from './trend-model';
import type { ChartSite, TrendEvent, TrendForecast, TrendLimit } from './trend-types';

const HEIGHT = 264;

export function trendBox(width: number, withLimits: boolean): PlotBox {
  const right = withLimits ? 62 : 12;
  return { left: 40, top: 22, width: Math.max(60, width - 40 - right), height: HEIGHT - 56 };
}

type TrendScales = { x: LinearScale; y: LinearScale; shown: ChartRange };

export function trendScales(
  box: PlotBox,
  model: TrendModel,
  shown: ChartRange,
  limits: readonly TrendLimit[],
): TrendScales {
  const top = valueTop(model, shown, limits);
  return { x: linearX(shown, box), y: linearY({ from: 0, to: top }, box), shown };
}

type TrendPlotProps = {
  width: number;
  box: PlotBox;
  scales: TrendScales;
  model: TrendModel;
  limits: readonly TrendLimit[];
  events: readonly TrendEvent[];
  forecast?: TrendForecast;
  site: ChartSite;
  /** Where the cursor stands, epoch milliseconds. */
  at?: number;
  unit: string;
};

/** The drawing of the trend; its numbers are in the table beside it. */
export function TrendPlot(props: TrendPlotProps) {
  const { width, box, scales, model, limits, events, forecast, site, at, unit } = props;
  const { x, y, shown } = scales;
  const span = shown.to - shown.from;
  return (
    <svg width={width} height={HEIGHT} className="block" aria-hidden="true">
      <YAxis box={box} scale={y} unit={unit} decimalMark={site.decimalMark} />
      <XAxis
        box={box}
        scale={x}
        ticks={timeTicks(shown, Math.max(3, Math.floor(box.width / 90)))}
        tickText={(value) => formatTimeTick(value, span, site.timeZone)}
      />
      <LimitLines box={box} y={y} limits={limits} />
      <EventLines box={box} x={x} events={events} />
      <Clip box={box} />
      <g clipPath={`url(#${clipId(box)})`}>
        {forecast && <ForecastCurve forecast={forecast} x={x} y={y} />}
        <TrendCurves box={box} model={model} breaks={breakTimes(events)} x={x} y={y} />
      </g>
      {at !== undefined && <Cursor at={at} box={box} scales={scales} model={model} />}
    </svg>
  );
}

function Cursor({
  at,
  box,
  scales,
  model,
}: Pick<TrendPlotProps, 'box' | 'scales' | 'model'> & { at: number }) {
  const { x, y } = scales;
  return (
    <g className="no-print">
      <line x1={x(at)} x2={x(at)} y1={box.top} y2={box.top + box.height} className="stroke-blue" />
      {model.series.map(({ name, byTime }) => {
        const value = byTime.get(at)?.value ?? null;
        if (value === null) return null;
        return (
          <circle
            key={name}
            cx={x(at)}
            cy={y(value)}
            r={3.5}
            className="fill-sheet stroke-blue"
            strokeWidth={2}
          />
        );
      })}
    </g>
  );
}
