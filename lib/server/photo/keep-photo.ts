import 'server-only';
import { Person } from '@/entities/person';
import { Photo } from '@/entities/photo';
import type { Weight } from '@/entities/weight';
import type { CommandContext } from '../command';
import { putFile } from '../store/files';
import type { PreparedPhoto } from './prepare-photo';

/** Stores the pictures and writes the photo of a weight, with its audit row. */
export async function keepPhoto(
  { em, actor, now, audit }: CommandContext,
  site: Photo['site'],
  weight: Weight,
  photo: PreparedPhoto,
): Promise<Photo> {
  const { fileName, widthPx, heightPx } = photo;
  const picture = await putFile(photo.picture);
  const thumbnail = await putFile(photo.thumbnail);
  const kept = em.create(Photo, {
    site,
    weight,
    fileName,
    sha256: picture.sha256,
    thumbnailSha256: thumbnail.sha256,
    widthPx,
    heightPx,
    person: em.getReference(Person, actor.personId, { wrapped: true }),
    at: now,
  });
  await em.flush();
  audit({
    siteId: site.id,
    entity: 'Photo',
    entityId: kept.id,
    after: { weightId: weight.id, fileName, sha256: picture.sha256, widthPx, heightPx },
  });
  return kept;
}
