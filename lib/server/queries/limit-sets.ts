import 'server-only';
import type { LimitSetRow, LimitSetsDto } from '@/lib/schemas/settings';
import { query } from '../query';

const SQL = `
  select l.id, l.title, l.edition, l.quantity, l.unit, l.band_low_hz as "bandLowHz",
         l.band_high_hz as "bandHighHz", l.b_ab as "bAb", l.b_bc as "bBc", l.b_cd as "bCd",
         l.speed_min_rpm as "speedMinRpm", l.speed_max_rpm as "speedMaxRpm",
         l.power_min_kw as "powerMinKw", l.power_max_kw as "powerMaxKw", l.support, l.citation,
         l.state, s.name as "siteName",
         (select count(*)::int from limit_use u join machine m on m.id = u.machine_id
           where u.limit_set_id = l.id and u.to_at is null and m.state = 'active'
             and m.site_id in (?)) as machines
    from limit_set l left join site s on s.id = l.site_id
   where l.site_id is null or l.site_id in (?)
   order by l.state, l.site_id nulls first, l.title, l.edition`;

/** The limit sets that come with the register and those of the actor's sites. */
export const limitSets = query(
  'limitSet:read',
  async ({ em, siteIds, actor }, _args: undefined): Promise<LimitSetsDto> => ({
    sets: await em.getConnection().execute<LimitSetRow[]>(SQL, [siteIds, siteIds]),
    sites: actor.sites.map(({ id, name }) => ({ id, name })),
  }),
);
