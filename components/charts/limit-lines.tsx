import { spreadApart } from '@/lib/domain/drawing/leader-rows';
import { formatNumber } from '@/lib/format';
import type { PlotBox } from './chart-types';
import type { LinearScale } from './chart-scales';
import type { TrendLimit } from './trend-types';

type LimitLinesProps = { box: PlotBox; y: LinearScale; limits: readonly TrendLimit[] };

/** Limits as thin lines with their letter and value at the right edge; those out of sight are left out. */
export function LimitLines({ box, y, limits }: LimitLinesProps) {
  const shown = limits.filter(({ value }) => y(value) >= box.top);
  const heights = spreadApart(
    shown.map(({ value }) => y(value)),
    13,
    { min: box.top, max: box.top + box.height },
  );
  return shown.map(({ label, value }, i) => (
    <g key={label}>
      <line
        x1={box.left}
        x2={box.left + box.width}
        y1={y(value)}
        y2={y(value)}
        className="stroke-ink-soft"
        strokeDasharray="1.5 2.5"
      />
      <text
        x={box.left + box.width + 6}
        y={(heights[i] ?? 0) + 4}
        className="figures fill-ink-soft text-xs"
      >
        {label} {formatNumber(value, { significant: 2 })}
      </text>
    </g>
  ));
}
