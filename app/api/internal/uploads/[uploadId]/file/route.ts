import { idOf } from '@/lib/server/address-numbers';
import { uploadedFile } from '@/lib/server/queries/upload-page';
import { handler } from '@/lib/server/route-handler';

export const GET = handler<{ uploadId: string }>(async (actor, { uploadId }) => {
  const file = await uploadedFile(actor, idOf(uploadId));
  if (!file) return null;
  return new Response(new Uint8Array(file.bytes), {
    headers: {
      'content-type': 'text/csv',
      // Always a download, never a page: what was uploaded is shown by nobody's browser.
      'content-disposition': `attachment; filename="${plainName(file.fileName)}"; filename*=UTF-8''${encodeURIComponent(file.fileName)}`,
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, no-store',
    },
  });
});

function plainName(fileName: string): string {
  return fileName.replace(/[^\w.\- ]/g, '_');
}
