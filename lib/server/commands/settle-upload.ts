import 'server-only';
import type { Upload } from '@/entities/upload';
import { fail, ok } from '@/lib/domain/result';
import { settleUploadInput } from '@/lib/schemas/upload-input';
import { command, type CommandContext } from '../command';
import { notFound, visibleUpload } from '../scope';

/** Sets a waiting file aside with a reason; its bytes stay. */
export const withdrawUpload = command(
  { name: 'withdrawUpload', permission: 'measurement:upload', input: settleUploadInput },
  (context, input) => settle(context, input, { from: 'waiting', to: 'withdrawn' }),
);

/** Takes a withdrawn file up again, to be confirmed anew; a new record of it corrects the old one. */
export const reopenUpload = command(
  { name: 'reopenUpload', permission: 'measurement:upload', input: settleUploadInput },
  (context, input) => settle(context, input, { from: 'withdrawn', to: 'waiting' }),
);

async function settle(
  context: CommandContext,
  { uploadId, reason }: { uploadId: number; reason: string },
  { from, to }: { from: Upload['state']; to: Upload['state'] },
) {
  const upload = await visibleUpload(context, uploadId);
  if (!upload) return notFound('upload');
  if (upload.state !== from)
    return fail('state', `This file is ${upload.state} and not ${from}: open it to see why.`);
  upload.state = to;
  context.audit({
    siteId: upload.site.id,
    entity: 'Upload',
    entityId: upload.id,
    before: { state: from },
    after: { state: to },
    reason,
  });
  return ok({ uploadId });
}
