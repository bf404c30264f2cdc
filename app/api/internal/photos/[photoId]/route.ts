import { idOf } from '@/lib/server/address-numbers';
import { photoResponse } from '@/lib/server/photo/photo-response';
import { weightPhoto } from '@/lib/server/queries/weight-photo';
import { handler } from '@/lib/server/route-handler';

export const GET = handler<{ photoId: string }>(async (actor, { photoId }, request) => {
  const asked = new URL(request.url).searchParams.get('size');
  const size = asked === 'thumbnail' ? 'thumbnail' : 'full';
  const bytes = await weightPhoto(actor, { photoId: idOf(photoId), size });
  return bytes && photoResponse(bytes);
});
