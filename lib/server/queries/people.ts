import 'server-only';
import type { PeopleDto, PersonRow } from '@/lib/schemas/settings';
import { isoOrNull } from '../rows';
import { query } from '../query';

const SQL = `
  select p.id, p.name, p.email, p.role, p.state,
         coalesce(json_agg(json_build_object('id', s.id, 'name', s.name) order by s.name)
           filter (where s.id in (?)), '[]') as sites,
         (count(s.id) filter (where s.id not in (?)))::int as "otherSites",
         (select max(x.created_at) from session x where x.person_id = p.id) as "signedInAt"
    from person p
    join site_access a on a.person_id = p.id
    join site s on s.id = a.site_id
   group by p.id
  having bool_or(s.id in (?))
   order by p.state, p.name, p.id`;

type Row = Omit<PersonRow, 'isSelf' | 'signedInAt'> & { signedInAt: Date | string | null };

/** Everybody with access to one of the administrator's sites. */
export const people = query(
  'person:read',
  async ({ em, siteIds, actor }, _args: undefined): Promise<PeopleDto> => {
    const rows = await em.getConnection().execute<Row[]>(SQL, [siteIds, siteIds, siteIds]);
    return {
      people: rows.map((row) => ({
        ...row,
        isSelf: row.id === actor.personId,
        signedInAt: isoOrNull(row.signedInAt),
      })),
      sites: actor.sites.map(({ id, name }) => ({ id, name })),
    };
  },
);
