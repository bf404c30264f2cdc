import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';

/**
 * The name of the first of these sites that would have no active administrator without this person;
 * null where each keeps one. The sites stay locked until the transaction ends, so that two
 * administrators cannot remove each other at the same moment.
 */
export async function siteWithoutAdministrator(
  em: EntityManager,
  siteIds: readonly number[],
  personId: number,
): Promise<string | null> {
  if (siteIds.length === 0) return null;
  await em.execute('select id from site where id in (?) order by id for update', [siteIds]);
  const rows = await em.execute<{ name: string }[]>(
    `select s.name from site s
      where s.id in (?) and not exists (
        select 1 from site_access a join person p on p.id = a.person_id
         where a.site_id = s.id and p.role = 'administrator' and p.state = 'active' and p.id <> ?)
      order by s.name limit 1`,
    [siteIds, personId],
  );
  return rows[0]?.name ?? null;
}
