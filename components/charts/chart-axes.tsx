import { AxisBottom, AxisLeft } from '@visx/axis';
import { GridRows } from '@visx/grid';
import { formatTick, type DecimalMark } from '@/lib/format';
import type { PlotBox } from './chart-types';
import type { LinearScale } from './chart-scales';

const WORDS = {
  className: 'figures fill-ink-soft',
  fontSize: 12,
  fontFamily: undefined,
  fill: undefined,
} as const;

type YAxisProps = {
  box: PlotBox;
  scale: LinearScale;
  unit: string;
  decimalMark?: DecimalMark;
  /** Ticks of a scale that is not linear in the value, with their words. */
  ticks?: { values: readonly number[]; text: (value: number) => string };
};

/** Hairlines and numbers of the y axis, the unit with its detection on top. */
export function YAxis({ box, scale, unit, decimalMark, ticks }: YAxisProps) {
  const values = ticks?.values ?? scale.ticks(Math.max(3, Math.round(box.height / 45)));
  const step = Math.abs((values[1] ?? 1) - (values[0] ?? 0));
  const text = ticks?.text ?? ((value: number) => formatTick(value, step, decimalMark));
  return (
    <>
      <GridRows
        left={box.left}
        width={box.width}
        scale={scale}
        tickValues={[...values]}
        stroke="rgb(var(--rule))"
      />
      <AxisLeft
        left={box.left}
        scale={scale}
        tickValues={[...values]}
        hideAxisLine
        hideTicks
        tickFormat={(value) => text(Number(value))}
        tickLabelProps={{ ...WORDS, textAnchor: 'end', dx: -4, dy: 4 }}
      />
      <text x={2} y={12} className="figures fill-ink-soft text-xs">
        {unit}
      </text>
    </>
  );
}

type XAxisProps = {
  box: PlotBox;
  scale: LinearScale;
  ticks: readonly number[];
  tickText: (value: number) => string;
  label?: string;
};

/** Numbers or dates of the x axis. */
export function XAxis({ box, scale, ticks, tickText, label }: XAxisProps) {
  return (
    <>
      <AxisBottom
        top={box.top + box.height}
        scale={scale}
        tickValues={[...ticks]}
        stroke="rgb(var(--edge))"
        tickStroke="rgb(var(--edge))"
        tickLength={4}
        tickFormat={(value) => tickText(Number(value))}
        tickLabelProps={{ ...WORDS, textAnchor: 'middle', dy: 2 }}
      />
      {label !== undefined && (
        <text
          x={box.left + box.width}
          y={box.top + box.height + 34}
          textAnchor="end"
          className="fill-ink-soft text-xs"
        >
          {label}
        </text>
      )}
    </>
  );
}
