import { idOf } from '@/lib/server/address-numbers';
import { pdfResponse } from '@/lib/server/pdf/pdf-response';
import { machineHistory } from '@/lib/server/queries/machine-history';
import { handler } from '@/lib/server/route-handler';

export const GET = handler(async (actor, { machineId }: { machineId: string }, request) => {
  const history = await machineHistory(actor, idOf(machineId));
  if (!history) return null;
  return pdfResponse(history.report, request, `balance-history-${history.machine.tag}.pdf`);
});
