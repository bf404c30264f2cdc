'use client';

import { SpectrumChart } from '@/components/charts/spectrum-chart';
import { TrendChart } from '@/components/charts/trend-chart';
import { WaveformChart } from '@/components/charts/waveform-chart';
import { Panel } from '@/components/ui/panel';
import { routes } from '@/lib/routes';

/** The server and the browser must draw the same, and their sines differ in the last digit. */
function rounded(value: number): number {
  return Math.round(value * 10_000) / 10_000;
}

const DAY_MS = 86_400_000;
const START = Date.UTC(2025, 9, 1);
const BALANCED = 150;

const overall = Array.from({ length: 60 }, (_, i) => {
  const day = i * 6.2;
  const since = day < BALANCED ? 1.1 + day * 0.012 : 0.7 + (day - BALANCED) * 0.0105;
  const missing = i === 20 || i === 21;
  const value = missing ? null : rounded(since + 0.12 * Math.sin(i * 1.7));
  return { at: new Date(START + day * DAY_MS).toISOString(), value, href: routes.reading(i + 1) };
});
const oneX = overall.map(({ at, value }) => ({
  at,
  value: value === null ? null : rounded(value * 0.86),
}));
const LIMITS = [
  { label: 'A/B', value: 1.4 },
  { label: 'B/C', value: 2.8 },
  { label: 'C/D', value: 4.5 },
];
const EVENTS = [
  {
    id: 1,
    at: new Date(START + BALANCED * DAY_MS).toISOString(),
    label: 'balanced, 90 g + 75 g',
    href: routes.balanceJob(14),
    breaksTrend: true,
  },
];
const ahead = (days: number, value: number) => ({
  at: new Date(START + (366 + days) * DAY_MS).toISOString(),
  value,
  low: value - 0.1 - days * 0.004,
  high: value + 0.1 + days * 0.004,
});

const seconds = Array.from({ length: 1200 }, (_, i) => i / 1600);
const wave = seconds.map((t) =>
  rounded(3.7 * Math.cos(2 * Math.PI * 24.8 * t) + 0.9 * Math.sin(2 * Math.PI * 171 * t)),
);
const hz = Array.from({ length: 801 }, (_, i) => i * 0.5);
const lines = hz.map((f, i) =>
  rounded(
    [24.8, 49.6, 74.4, 171].reduce(
      (sum, tone, n) => sum + (2.6 / (n * 2 + 1)) * Math.exp(-((f - tone) ** 2) / 0.3),
      0.02 + 0.01 * Math.abs(Math.sin(i * 12.9)),
    ),
  ),
);

/** The three charts with invented numbers. */
export function StyleSheetCharts() {
  return (
    <>
      <Panel>
        <TrendChart
          title={{ quantity: 'Velocity', unit: 'mm/s rms', point: 'KX-2, bearing A horizontal' }}
          series={[
            { name: 'overall', readings: overall },
            { name: '1x', readings: oneX },
          ]}
          limits={LIMITS}
          events={EVENTS}
          forecast={{
            words: 'straight line, based on 35 readings since the balance',
            points: [ahead(0, 2.95), ahead(60, 3.58)],
          }}
          site={{ timeZone: 'Europe/Berlin' }}
        />
      </Panel>
      <Panel>
        <SpectrumChart
          title={{
            quantity: 'Velocity',
            unit: 'mm/s rms',
            point: 'KX-2, bearing A horizontal',
            date: '3 Feb 2026',
          }}
          curve={{ hz, values: lines, dfHz: 0.5 }}
          speedRpm={1488}
          marks={[{ label: 'BPFO', frequencyHz: 88.7 }]}
        />
      </Panel>
      <Panel>
        <WaveformChart
          title={{
            quantity: 'Velocity',
            unit: 'mm/s',
            point: 'KX-2, bearing A horizontal',
            date: '3 Feb 2026',
          }}
          curve={{ seconds, values: wave, sampleCount: 65_536 }}
          full={{ from: 0, to: 0.75 }}
          turns={Array.from({ length: 18 }, (_, i) => i / 24.8)}
        />
      </Panel>
    </>
  );
}
