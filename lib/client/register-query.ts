import { queryOptions } from '@tanstack/react-query';
import { routes } from '@/lib/routes';
import type { PointTrendDto } from '@/lib/schemas/register';
import { fetchJson } from './fetch-json';

/** Everything a point's trend draws. */
export function pointTrendQuery(pointId: number) {
  return queryOptions({
    queryKey: ['points', pointId, 'trend'],
    queryFn: ({ signal }) => fetchJson<PointTrendDto>(routes.api.pointTrend(pointId), signal),
    staleTime: 60_000,
  });
}
