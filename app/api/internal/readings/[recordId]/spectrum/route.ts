import type { SpectrumKind } from '@/lib/schemas/reading-page';
import { columnsOf, idOf, numberOf } from '@/lib/server/address-numbers';
import { spectrumData } from '@/lib/server/queries/reading-data';
import { handler } from '@/lib/server/route-handler';

export const GET = handler<{ recordId: string }>((actor, { recordId }, request) => {
  const { searchParams } = new URL(request.url);
  return spectrumData(actor, {
    recordId: idOf(recordId),
    kind: kindOf(searchParams.get('kind')),
    from: numberOf(searchParams, 'from'),
    to: numberOf(searchParams, 'to'),
    columns: columnsOf(searchParams),
  });
});

function kindOf(text: string | null): SpectrumKind {
  return text === 'acceleration' || text === 'envelope' ? text : 'velocity';
}
