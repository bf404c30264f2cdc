import { idOf } from '@/lib/server/address-numbers';
import { pdfResponse } from '@/lib/server/pdf/pdf-response';
import { jobRecord } from '@/lib/server/queries/job-record';
import { handler } from '@/lib/server/route-handler';

export const GET = handler(async (actor, { jobId }: { jobId: string }, request) => {
  const record = await jobRecord(actor, idOf(jobId));
  if (!record) return null;
  const { machine, number } = record.job;
  const name = `job-record-${machine.tag}-${number}.pdf`;
  return pdfResponse(actor, record.report, { request, name });
});
