import { Group } from '@visx/group';
import { LinePath } from '@visx/shape';
import { curvePieces } from '@/lib/domain/drawing/curve-pieces';
import { spreadApart } from '@/lib/domain/drawing/leader-rows';
import { formatNumber } from '@/lib/format';
import type { PlotBox } from './chart-types';
import type { LinearScale } from './chart-scales';
import type { TimedSeries, TrendModel } from './trend-model';
import type { TrendForecast } from './trend-types';

type Scales = { x: LinearScale; y: LinearScale };
type TrendCurvesProps = Scales & { box: PlotBox; model: TrendModel; breaks: readonly number[] };

/** The series as thin lines with their names at the last value; gaps stay gaps. */
export function TrendCurves({ box, model, breaks, x, y }: TrendCurvesProps) {
  const ends = model.series.map((series) => lastValue(series));
  const heights = spreadApart(
    ends.map((end, i) => y(end?.value ?? 0) + (i === 0 ? -9 : 17)),
    14,
    { min: box.top + 10, max: box.top + box.height - 4 },
  );
  return (
    <Group>
      {model.series.map((series, i) => (
        <Curve key={series.name} {...{ series, breaks, x, y }} main={i === 0} />
      ))}
      {model.series.map(({ name }, i) => {
        const end = ends[i];
        if (!end || x(end.at) < box.left || x(end.at) > box.left + box.width) return null;
        return (
          <text
            key={name}
            x={Math.max(box.left + 80, x(end.at) - 4)}
            y={heights[i]}
            textAnchor="end"
            className={`text-xs ${i === 0 ? 'fill-ink font-semibold' : 'fill-ink-soft'}`}
            paintOrder="stroke"
            stroke="rgb(var(--sheet))"
            strokeWidth={3}
          >
            {name} {formatNumber(end.value)}
          </text>
        );
      })}
    </Group>
  );
}

type CurveProps = Scales & { series: TimedSeries; breaks: readonly number[]; main: boolean };

function Curve({ series, breaks, x, y, main }: CurveProps) {
  const points = [...series.byTime]
    .sort(([a], [b]) => a - b)
    .map(([at, { value }]) => ({ x: at, y: value }));
  const look = main ? 'stroke-ink' : 'stroke-ink-soft';
  return curvePieces(points, breaks).map((piece) => {
    const [first] = piece;
    if (!first) return null;
    if (piece.length === 1)
      return <circle key={first.x} cx={x(first.x)} cy={y(first.y)} r={2} className="fill-ink" />;
    return (
      <LinePath
        key={first.x}
        data={piece}
        x={(point) => x(point.x)}
        y={(point) => y(point.y)}
        className={`fill-none ${look}`}
        strokeWidth={main ? 1.75 : 1}
        strokeLinejoin="round"
      />
    );
  });
}

/** The forecast, dashed, with the lines it stays between. */
export function ForecastCurve({ forecast, x, y }: Scales & { forecast: TrendForecast }) {
  const lines = [
    { key: 'value', dash: '6 4', of: (p: TrendForecast['points'][number]) => p.value },
    { key: 'low', dash: '2 3', of: (p: TrendForecast['points'][number]) => p.low },
    { key: 'high', dash: '2 3', of: (p: TrendForecast['points'][number]) => p.high },
  ];
  return lines.map(({ key, dash, of }) => (
    <LinePath
      key={key}
      data={[...forecast.points]}
      defined={(point) => of(point) !== undefined}
      x={(point) => x(Date.parse(point.at))}
      y={(point) => y(of(point) ?? 0)}
      className="fill-none stroke-ink-soft"
      strokeDasharray={dash}
    />
  ));
}

function lastValue({ byTime }: TimedSeries): { at: number; value: number } | null {
  let last: { at: number; value: number } | null = null;
  for (const [at, { value }] of byTime) {
    if (value !== null && (last === null || at > last.at)) last = { at, value };
  }
  return last;
}
