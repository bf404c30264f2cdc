'use client';

import { useState } from 'react';
import Link from 'next/link';
import { ChartFrame } from './chart-frame';
import { shareToX } from './chart-scales';
import type { ChartRange, ChartTitle } from './chart-types';
import { PlotSurface } from './plot-surface';
import { EventLinks } from './event-ticks';
import { TrendPlot, trendBox, trendScales } from './trend-plot';
import {
  fullRange,
  nearestTime,
  readingHref,
  readoutText,
  timesIn,
  trendModel,
  trendNumbers,
} from './trend-model';
import type { ChartSite, TrendEvent, TrendForecast, TrendLimit, TrendSeries } from './trend-types';
import { useRange } from './use-range';

type TrendChartProps = {
  title: ChartTitle;
  series: readonly TrendSeries[];
  limits?: readonly TrendLimit[];
  events?: readonly TrendEvent[];
  forecast?: TrendForecast;
  site: ChartSite;
  /** Keeps the zoom outside, in the address; epoch milliseconds. */
  zoom?: { range: ChartRange | null; onRange: (range: ChartRange | null) => void };
};

/** Dated values against limits, with balance events on the time axis. */
export function TrendChart(props: TrendChartProps) {
  const { title, series, limits = [], events = [], forecast, site, zoom } = props;
  const model = trendModel(series);
  const range = useRange(fullRange(model, forecast), zoom?.range, zoom?.onRange);
  const times = timesIn(model, range.shown);
  const [wanted, setWanted] = useState<number | null>(null);
  const index = wanted === null ? times.length - 1 : nearestTime(times, wanted);
  const at = times[index];
  const text = readoutText(model, at, title.unit, site);
  return (
    <ChartFrame
      title={title}
      range={range}
      around={at ?? range.shown.to}
      numbers={trendNumbers(model, title.unit, `${title.point} ${title.quantity}`)}
      readout={<Readout text={text} href={readingHref(model, at)} forecast={forecast} />}
    >
      {(width) => {
        const box = trendBox(width, limits.length > 0);
        const scales = trendScales(box, model, range.shown, limits);
        return (
          <>
            <TrendPlot
              {...{ width, box, scales, model, limits, events, forecast, site }}
              at={at}
              unit={title.unit}
            />
            <PlotSurface
              box={box}
              label={`Cursor on ${title.quantity}`}
              cursor={{ index, count: times.length, text }}
              onCursor={(next) => setWanted(times[next] ?? null)}
              onPoint={(share) => setWanted(shareToX(share, range.shown))}
              onDrag={(from, to) =>
                range.zoomTo({ from: shareToX(from, range.shown), to: shareToX(to, range.shown) })
              }
              onEscape={range.reset}
            />
            <EventLinks box={box} x={scales.x} events={events} site={site} />
          </>
        );
      }}
    </ChartFrame>
  );
}

type ReadoutProps = { text: string; href?: string; forecast?: TrendForecast };

function Readout({ text, href, forecast }: ReadoutProps) {
  return (
    <>
      {text}
      {href !== undefined && (
        <>
          {' '}
          <Link href={href} className="link">
            Open this reading
          </Link>
        </>
      )}
      {forecast && <span className="block text-xs text-ink-soft">Dashed: {forecast.words}.</span>}
    </>
  );
}
