import { idOf } from '@/lib/server/address-numbers';
import { pdfResponse } from '@/lib/server/pdf/pdf-response';
import { machineHistory } from '@/lib/server/queries/machine-history';
import { handler } from '@/lib/server/route-handler';

export const GET = handler(async (actor, { machineId }: { machineId: string }, request) => {
  const history = await machineHistory(actor, idOf(machineId));
  if (!history) return null;
  const name = `balance-history-${history.machine.tag}.pdf`;
  return pdfResponse(actor, history.report, { request, name });
});
