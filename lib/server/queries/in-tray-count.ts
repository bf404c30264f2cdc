import 'server-only';
import { Upload } from '@/entities/upload';
import { query } from '../query';

/** How many files of the actor's sites wait for a person: waiting to be confirmed, or held. */
export const inTrayCount = query(
  'measurement:read',
  ({ em, siteIds }, _args: undefined): Promise<number> =>
    em.count(Upload, { site: { $in: siteIds }, state: { $in: ['waiting', 'held'] } }),
);
