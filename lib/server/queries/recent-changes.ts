import 'server-only';
import type { RecentChangesDto, RecentEvent, ZoneChange } from '@/lib/schemas/recent-changes';
import { iso } from '../rows';
import { query } from '../query';

/** How far back "recent" reaches, and how much of it is shown. */
const DAYS = 30;
const MOST = 10;
/** The reading before a change may be older than the change. */
const BEFORE_DAYS = 400;

/** Each machine's newest passing of a zone boundary, of the points that are read now. */
const ZONES = `
  with read as (
    select p.machine_id, p.label, r.record_id, r.value, r.zone, r.taken_at,
           lag(r.value) over visits as before_value, lag(r.zone) over visits as before_zone
      from reading r
      join point p on p.id = r.point_id
      join machine m on m.id = p.machine_id
     where m.site_id in (?) and m.state = 'active' and r.status = 'kept'
       and r.kind = 'overall velocity' and r.zone is not null and r.taken_at > ? and r.taken_at <= ?
    window visits as (partition by r.point_id order by r.taken_at)
  ), newest as (
    select distinct on (machine_id) * from read
     where taken_at > ? and zone <> before_zone
     order by machine_id, taken_at desc, zone desc, value desc
  )
  select m.id as "machineId", m.tag, m.name, s.name as "siteName", s.time_zone as "timeZone",
         n.label as "pointLabel", n.record_id as "recordId",
         n.taken_at as at, n.before_value as "beforeValue", n.before_zone as "beforeZone",
         n.value as "afterValue", n.zone as "afterZone"
    from newest n join machine m on m.id = n.machine_id join site s on s.id = m.site_id
   order by n.zone desc, n.taken_at desc`;

const EVENTS = `
  select e.id, m.id as "machineId", m.tag, e.at, s.time_zone as "timeZone", e.kind, e.text,
         pe.name as person, e.balance_job_id as "balanceJobId"
    from machine_event e
    join machine m on m.id = e.machine_id
    join site s on s.id = m.site_id
    join person pe on pe.id = e.person_id
   where m.site_id in (?) and e.at > ? and e.at <= ?
   order by e.at desc limit ?`;

type ZoneRow = Omit<ZoneChange, 'at' | 'before' | 'after'> & {
  at: Date | string;
  beforeValue: number;
  beforeZone: ZoneChange['before']['zone'];
  afterValue: number;
  afterZone: ZoneChange['after']['zone'];
};
type EventRow = Omit<RecentEvent, 'at'> & { at: Date | string };

/** What has changed in the last 30 days: zones passed, worse and better apart, and events. */
export const recentChanges = query(
  'register:read',
  async ({ em, siteIds, now }, _args: undefined): Promise<RecentChangesDto> => {
    const [since, before] = [DAYS, BEFORE_DAYS].map((days) =>
      new Date(now.getTime() - days * 86_400_000).toISOString(),
    );
    const until = now.toISOString();
    const connection = em.getConnection();
    const zones = await connection.execute<ZoneRow[]>(ZONES, [siteIds, before, until, since]);
    const events = await connection.execute<EventRow[]>(EVENTS, [siteIds, since, until, MOST]);
    const changes = zones.map(changeOf);
    return {
      days: DAYS,
      worse: changes.filter(({ before, after }) => after.zone > before.zone).slice(0, MOST),
      better: changes.filter(({ before, after }) => after.zone < before.zone).slice(0, MOST),
      events: events.map((event) => ({ ...event, at: iso(event.at) })),
    };
  },
);

function changeOf(row: ZoneRow): ZoneChange {
  const { beforeValue, beforeZone, afterValue, afterZone, at, ...place } = row;
  return {
    ...place,
    at: iso(at),
    before: { value: beforeValue, zone: beforeZone },
    after: { value: afterValue, zone: afterZone },
  };
}
