import 'server-only';
import { Photo } from '@/entities/photo';
import { Weight } from '@/entities/weight';
import { fail, ok } from '@/lib/domain/result';
import { addPhotoInput } from '@/lib/schemas/photo-input';
import { command } from '../command';
import { keepPhoto } from '../photo/keep-photo';
import { preparePhoto } from '../photo/prepare-photo';
import { notFound, visibleJob } from '../scope';
import { sha256Of } from '../store/files';

/** Adds a photo to a weight of an open job, after it was recorded. */
export const addPhoto = command(
  { name: 'addPhoto', permission: 'balanceJob:record', input: addPhotoInput },
  async (context, { jobId, weightId, photo }) => {
    const job = await visibleJob(context, jobId);
    if (!job) return notFound('balance job');
    if (job.closedAt)
      return fail('closed', 'This job is closed: its record stays as it was signed.');
    const weight = await context.em.findOne(Weight, { id: weightId, job: job.id });
    if (!weight) return notFound('weight of this job');
    if (!photo) return fail('photo-needed', 'Choose a photo first.', 'photo');
    const prepared = await preparePhoto(photo);
    if (!prepared.ok) return prepared;
    const { picture, fileName } = prepared.value;
    const same = { weight: weight.id, sha256: sha256Of(picture) };
    if ((await context.em.count(Photo, same)) > 0)
      return fail('duplicate', `${fileName} is with this weight already: choose another.`, 'photo');
    const { id } = await keepPhoto(context, job.site, weight, prepared.value);
    return ok({ photoId: id });
  },
);
