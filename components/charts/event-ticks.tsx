import Link from 'next/link';
import { formatDate } from '@/lib/format';
import type { PlotBox } from './chart-types';
import type { LinearScale } from './chart-scales';
import type { ChartSite, TrendEvent } from './trend-types';

type EventTicksProps = { box: PlotBox; x: LinearScale; events: readonly TrendEvent[] };

/** Balance events as a brass line in the plot, with their words where there is room. */
export function EventLines({ box, x, events }: EventTicksProps) {
  const worded = events.length <= 2 && box.width > 420;
  return inSight({ box, x, events }).map(({ event, left }) => {
    const room = left < box.left + box.width * 0.6;
    return (
      <g key={event.id}>
        <line
          x1={left}
          x2={left}
          y1={box.top}
          y2={box.top + box.height}
          className="stroke-brass-line"
        />
        {worded && (
          <text
            x={left + (room ? 6 : -6)}
            y={box.top + 10}
            textAnchor={room ? 'start' : 'end'}
            className="fill-ink-soft text-xs"
            paintOrder="stroke"
            stroke="rgb(var(--sheet))"
            strokeWidth={3}
          >
            {event.label}
          </text>
        )}
      </g>
    );
  });
}

/** The ticks on the time axis: brass dots, each the link to its job. */
export function EventLinks({ box, x, events, site }: EventTicksProps & { site: ChartSite }) {
  return inSight({ box, x, events }).map(({ event, left }) => (
    <Link
      key={event.id}
      href={event.href}
      title={event.label}
      aria-label={`${event.label}, ${formatDate(event.at, site.timeZone)}`}
      className="absolute z-10 flex size-6 items-center justify-center"
      style={{ left: left - 12, top: box.top + box.height - 12 }}
    >
      <span className="size-2.5 rounded-full border border-ink bg-brass" />
    </Link>
  ));
}

function inSight({ box, x, events }: EventTicksProps) {
  return events
    .map((event) => ({ event, left: x(Date.parse(event.at)) }))
    .filter(({ left }) => left >= box.left && left <= box.left + box.width);
}
