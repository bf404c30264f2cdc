import type { RecordFileCheckDto } from '@/lib/schemas/record-check';
import { contentHash } from '@/lib/server/balance-job/canonical-json';
import { readRecordFile } from '@/lib/server/balance-job/record-file';
import { recordOfFile } from '@/lib/server/queries/record-of-file';
import { handler, problem } from '@/lib/server/route-handler';

export const POST = handler(async (actor, _params: Record<string, string>, request) => {
  const file = readRecordFile(await request.text());
  if (!file.ok) return problem(422, 'No job record', file.failure.message);
  const checked: RecordFileCheckDto = {
    statedHash: file.value.contentHash,
    recomputedHash: contentHash(file.value.content),
    match: await recordOfFile(actor, file.value),
  };
  return checked;
});
