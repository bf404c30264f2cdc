'use client';

import { useQuery } from '@tanstack/react-query';
import dynamic from 'next/dynamic';
import { Notice } from '@/components/ui/notice';
import { Skeleton } from '@/components/ui/skeleton';
import type { DecimalMark } from '@/lib/format';
import { pointTrendQuery } from '@/lib/client/register-query';
import { routes } from '@/lib/routes';
import type { PointTrendDto } from '@/lib/schemas/register';

const TrendChart = dynamic(
  () => import('@/components/charts/trend-chart').then((part) => part.TrendChart),
  { ssr: false, loading: () => <Skeleton className="h-80 w-full" /> },
);

type PointTrendProps = {
  pointId: number;
  /** “KX-2 A-H”. */
  name: string;
  site: { timeZone: string; decimalMark: DecimalMark };
  machineId: number;
};

/** A point's overall velocity and 1x over the months, with its limits and the balance events. */
export function PointTrend({ pointId, name, site, machineId }: PointTrendProps) {
  const { data, error } = useQuery(pointTrendQuery(pointId));
  if (error) return <Notice kind="failure">{error.message}</Notice>;
  if (!data) return <Skeleton className="h-80 w-full" />;
  if (data.overall.length === 0 && data.oneX.length === 0)
    return (
      <p className="text-ink-soft">No kept reading yet: the trend begins with the first one.</p>
    );
  return (
    <TrendChart
      title={{ quantity: 'velocity', unit: 'mm/s rms', point: name, decimalMark: site.decimalMark }}
      series={seriesOf(data)}
      limits={data.limits}
      events={data.events.map((event) => ({
        id: event.id,
        at: event.at,
        label: event.label,
        href: event.jobId === null ? routes.machine(machineId) : routes.balanceJob(event.jobId),
        breaksTrend: event.breaksTrend,
      }))}
      site={site}
    />
  );
}

function seriesOf({ overall, oneX }: PointTrendDto) {
  const drawn = (readings: PointTrendDto['overall']) =>
    readings.map(({ at, value, recordId }) => ({ at, value, href: routes.reading(recordId) }));
  return [
    { name: 'overall', readings: drawn(overall) },
    { name: '1x', readings: drawn(oneX) },
  ].filter(({ readings }) => readings.length > 0);
}
