import { columnsOf, idOf, numberOf } from '@/lib/server/address-numbers';
import { waveformData } from '@/lib/server/queries/reading-data';
import { handler } from '@/lib/server/route-handler';

export const GET = handler<{ recordId: string }>((actor, { recordId }, request) => {
  const { searchParams } = new URL(request.url);
  return waveformData(actor, {
    recordId: idOf(recordId),
    from: numberOf(searchParams, 'from'),
    to: numberOf(searchParams, 'to'),
    columns: columnsOf(searchParams),
  });
});
