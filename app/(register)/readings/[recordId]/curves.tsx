'use client';

import { useQuery } from '@tanstack/react-query';
import dynamic from 'next/dynamic';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { Skeleton } from '@/components/ui/skeleton';
import { Tabs } from '@/components/ui/tabs';
import { spectrumQuery, waveformQuery } from '@/lib/client/reading-query';
import { formatDateTime } from '@/lib/format';
import { routes } from '@/lib/routes';
import type {
  ReadingPageDto,
  SpectrumDataDto,
  SpectrumKind,
  WaveformDataDto,
} from '@/lib/schemas/reading-page';
import { useAddressRange } from './use-address-range';

const loading = () => <Skeleton className="h-72" />;
const WaveformChart = dynamic(
  () => import('@/components/charts/waveform-chart').then((module) => module.WaveformChart),
  { ssr: false, loading },
);
const SpectrumChart = dynamic(
  () => import('@/components/charts/spectrum-chart').then((module) => module.SpectrumChart),
  { ssr: false, loading },
);

type CurvesProps = {
  page: ReadingPageDto;
  kind: SpectrumKind;
  /** Whole curves as the page was made; finer ones are fetched when somebody zooms. */
  first: { waveform: WaveformDataDto; lines: SpectrumDataDto | null };
};

/** The record over time and over frequency. */
export function Curves({ page, kind, first }: CurvesProps) {
  return (
    <>
      <WaveformPanel page={page} first={first.waveform} />
      <SpectrumPanel page={page} kind={kind} first={first.lines} />
    </>
  );
}

const QUANTITIES = {
  acceleration: 'Acceleration',
  velocity: 'Velocity',
  displacement: 'Displacement',
} as const;

function WaveformPanel({ page, first }: { page: ReadingPageDto; first: WaveformDataDto }) {
  const { recordId, waveform } = page;
  const [range, setRange] = useAddressRange('time');
  const { data, isFetching, error } = useQuery({
    ...waveformQuery(recordId, range),
    ...(range === null ? { initialData: first } : {}),
  });
  const curve = data ?? first;
  return (
    <Panel title="Waveform" note="as received, mean kept">
      {error && <Notice kind="failure" title={error.message} />}
      <WaveformChart
        title={{
          ...titleOf(page),
          quantity: QUANTITIES[waveform?.quantity ?? 'acceleration'],
          unit: curve.unit,
        }}
        curve={curve}
        full={{ from: 0, to: first.durationS }}
        turns={curve.turns}
        zoom={{ range, onRange: setRange }}
        refining={isFetching}
      />
    </Panel>
  );
}

const KINDS = [
  { kind: 'velocity', label: 'Velocity' },
  { kind: 'acceleration', label: 'Acceleration' },
  { kind: 'envelope', label: 'Envelope' },
] as const;

const SPECTRUM_TITLES = {
  velocity: 'Velocity spectrum',
  acceleration: 'Acceleration spectrum',
  envelope: 'Envelope spectrum',
} as const;

type SpectrumPanelProps = {
  page: ReadingPageDto;
  kind: SpectrumKind;
  first: SpectrumDataDto | null;
};

function SpectrumPanel({ page, kind, first }: SpectrumPanelProps) {
  const tabs = KINDS.map((one) => ({
    label: one.label,
    href: `${routes.reading(page.recordId)}${one.kind === 'velocity' ? '' : `?spectrum=${one.kind}`}`,
    current: one.kind === kind,
  }));
  return (
    <Panel title="Spectrum" note={first ? noteOf(first) : undefined}>
      <div className="flex flex-col gap-3">
        <Tabs label="Which spectrum" tabs={tabs} />
        {first === null ? (
          <p className="text-ink-soft">
            There is none of this kind: an envelope needs a record of acceleration.
          </p>
        ) : (
          <SpectrumLines key={kind} page={page} kind={kind} first={first} />
        )}
      </div>
    </Panel>
  );
}

function SpectrumLines({ page, kind, first }: SpectrumPanelProps & { first: SpectrumDataDto }) {
  const [range, setRange] = useAddressRange('hz');
  const { data, error } = useQuery({
    ...spectrumQuery(page.recordId, kind, range),
    ...(range === null ? { initialData: first } : {}),
  });
  const lines = data?.kind === kind ? data : first;
  return (
    <>
      {error && <Notice kind="failure" title={error.message} />}
      <SpectrumChart
        title={{ ...titleOf(page), quantity: SPECTRUM_TITLES[kind], unit: lines.unit }}
        curve={lines}
        speedRpm={page.made?.speedRpm ?? null}
        marks={page.marks}
        zoom={{ range, onRange: setRange }}
      />
    </>
  );
}

function noteOf({ kind, settings }: SpectrumDataDto): string {
  const { blockLength, averages, lowHz, highHz } = settings;
  const blocks = averages === 1 ? 'one block' : `${averages} blocks`;
  const band = {
    velocity: `from ${lowHz} Hz up`,
    acceleration: '',
    envelope: `of ${Math.round(lowHz)} to ${Math.round(highHz)} Hz`,
  };
  return ['Hann', `${blocks} of ${blockLength} samples`, band[kind]].filter(Boolean).join(', ');
}

function titleOf({ place, takenAt, site }: ReadingPageDto) {
  return {
    point: `${place.machineTag} ${place.label}`,
    date: formatDateTime(takenAt, site.timeZone),
    decimalMark: site.decimalMark,
  };
}
