import { idOf } from '@/lib/server/address-numbers';
import { pointTrend } from '@/lib/server/queries/point-trend';
import { handler } from '@/lib/server/route-handler';

export const GET = handler((actor, { pointId }: { pointId: string }) =>
  pointTrend(actor, idOf(pointId)),
);
