import 'server-only';
import { Photo } from '@/entities/photo';
import { query } from '../query';
import { readStoredFile } from '../store/files';

/** The bytes of a weight's photo, or of its thumbnail. */
export const weightPhoto = query(
  'balanceJob:read',
  async ({ em, siteIds }, asked: { photoId: number; size: 'full' | 'thumbnail' }) => {
    const photo = await em.findOne(Photo, { id: asked.photoId, site: { $in: siteIds } });
    if (!photo) return null;
    return readStoredFile(asked.size === 'thumbnail' ? photo.thumbnailSha256 : photo.sha256);
  },
);
