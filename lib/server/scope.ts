import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { BalanceJob } from '@/entities/balance-job';
import { Point } from '@/entities/bearing';
import { Machine } from '@/entities/machine';
import { MeasuredRecord } from '@/entities/measured-record';
import { Person, SiteAccess } from '@/entities/person';
import { Upload } from '@/entities/upload';
import { fail } from '@/lib/domain/result';

type Scope = { readonly em: EntityManager; readonly siteIds: number[] };

/** The failure for a record that does not exist, or that the actor may not see: the same words. */
export function notFound(what: string) {
  return fail('not-found', `There is no such ${what}, or you have no access to its site.`);
}

/** The machine of that id, if it stands in one of the actor's sites. */
export function visibleMachine({ em, siteIds }: Scope, machineId: number) {
  return em.findOne(Machine, { id: machineId, site: { $in: siteIds } });
}

/** The point of that id, with its machine and bearing, within the actor's sites. */
export function visiblePoint({ em, siteIds }: Scope, pointId: number) {
  return em.findOne(
    Point,
    { id: pointId, machine: { site: { $in: siteIds } } },
    { populate: ['machine', 'bearing'] },
  );
}

/** The upload of that id within the actor's sites. */
export function visibleUpload({ em, siteIds }: Scope, uploadId: number) {
  return em.findOne(Upload, { id: uploadId, site: { $in: siteIds } });
}

/** The measured record of that id, with point and machine, within the actor's sites. */
export function visibleRecord({ em, siteIds }: Scope, recordId: number) {
  return em.findOne(
    MeasuredRecord,
    { id: recordId, point: { machine: { site: { $in: siteIds } } } },
    { populate: ['point', 'point.machine', 'upload'] },
  );
}

/** The balance job of that id, with machine, rotor and set-up, within the actor's sites. */
export function visibleJob({ em, siteIds }: Scope, jobId: number) {
  return em.findOne(
    BalanceJob,
    { id: jobId, site: { $in: siteIds } },
    { populate: ['machine', 'rotor', 'setup', 'site'] },
  );
}

/** The person of that id, if a site of theirs is one of the actor's. */
export async function visiblePerson({ em, siteIds }: Scope, personId: number) {
  const shared = await em.count(SiteAccess, { person: personId, site: { $in: siteIds } });
  return shared === 0 ? null : em.findOne(Person, { id: personId });
}
