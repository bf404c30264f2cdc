import { idOf } from '@/lib/server/address-numbers';
import { signedRecord } from '@/lib/server/queries/signed-record';
import { handler } from '@/lib/server/route-handler';

export const GET = handler(async (actor, { jobId }: { jobId: string }) => {
  const file = await signedRecord(actor, idOf(jobId));
  if (!file) return null;
  const disposition = `attachment; filename="${encodeURIComponent(file.name)}"`;
  return Response.json(file, {
    headers: { 'content-disposition': disposition, 'cache-control': 'private, no-store' },
  });
});
