'use client';

import dynamic from 'next/dynamic';
import { Fact, Facts } from '@/components/ui/fact';
import { Notice } from '@/components/ui/notice';
import { Skeleton } from '@/components/ui/skeleton';
import { formatDuration, formatExact } from '@/lib/format';
import type { PreviewDto, UploadPageDto } from '@/lib/schemas/in-tray';

const WaveformChart = dynamic(
  () => import('@/components/charts/waveform-chart').then((module) => module.WaveformChart),
  { ssr: false, loading: () => <Skeleton className="h-72" /> },
);

const QUANTITIES = {
  acceleration: 'Acceleration',
  velocity: 'Velocity',
  displacement: 'Displacement',
} as const;

type PreviewPlotProps = { preview: PreviewDto; page: UploadPageDto; stale: boolean };

/** The record as it reads with these choices, or the sentence that stops it. */
export function PreviewPlot({ preview, page, stale }: PreviewPlotProps) {
  const { plot, problem } = preview;
  const { fileName, site } = page.upload;
  if (problem !== null) return <Notice kind="failure" title={problem} />;
  if (plot === null)
    return <p className="text-ink-soft">Answer what is asked and the curve is drawn here.</p>;
  const { decimalMark } = site;
  return (
    <div className="flex flex-col gap-4">
      {plot.doubts.map((doubt) => (
        <Notice key={doubt} kind="caution" title={doubt} />
      ))}
      <Facts>
        <Fact label="samples">{plot.sampleCount}</Fact>
        <Fact label={`sample rate (${plot.rateSource})`}>
          {formatExact(plot.sampleRateHz, 'Hz', decimalMark)}
        </Fact>
        <Fact label="length">{formatDuration(plot.durationS)}</Fact>
        <Fact label="tacho">
          {plot.turns.length === 0 ? 'none' : `${plot.turns.length} pulses`}
        </Fact>
      </Facts>
      <WaveformChart
        title={{
          quantity: QUANTITIES[plot.quantity],
          unit: plot.unit,
          point: fileName,
          decimalMark,
        }}
        curve={plot}
        full={{ from: 0, to: plot.durationS }}
        turns={plot.turns}
        refining={stale}
      />
    </div>
  );
}
