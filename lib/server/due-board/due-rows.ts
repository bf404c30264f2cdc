import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { Criticality } from '@/lib/domain/due/due-machine';

/** An active machine with its limits in use and its ruling point; null where there is none. */
export type RulingRow = {
  machineId: number;
  tag: string;
  name: string;
  criticality: Criticality;
  siteName: string;
  areaName: string;
  timeZone: string;
  setupId: number | null;
  ab: number | null;
  bc: number | null;
  cd: number | null;
  pointId: number | null;
  pointLabel: string | null;
  bearingId: number | null;
};

export type SeriesRow = {
  pointId: number;
  at: Date | string;
  value: number;
  speedRpm: number | null;
  oneX: number | null;
  lagDeg: number | null;
  setupId: number | null;
};

export type BreakRow = {
  machineId: number;
  at: Date | string;
  isBalance: boolean;
  breaks: boolean;
};

export type DirectionRow = {
  bearingId: number;
  direction: string;
  oneX: number;
  lagDeg: number | null;
  setupId: number | null;
  at: Date | string;
};

/** How far back the readings of a card reach. */
const SERIES_DAYS = 800;
// Site, point and bearing 0 do not exist: `in ()` is no SQL.
const NONE = 0;

const RULING = `
  with latest as (
    select distinct on (r.point_id) r.point_id, r.value, r.zone
      from reading r
      join point p on p.id = r.point_id
      join machine m on m.id = p.machine_id
     where m.site_id in (?) and m.state = 'active' and r.status = 'kept'
       and r.kind = 'overall velocity' and r.unit = 'mm/s rms'
     order by r.point_id, r.taken_at desc
  )
  select distinct on (m.id) m.id as "machineId", m.tag, m.name, m.criticality,
         s.name as "siteName", a.name as "areaName", s.time_zone as "timeZone",
         u.id as "setupId", ls.b_ab as ab, ls.b_bc as bc,
         ls.b_cd as cd, l.point_id as "pointId", p.label as "pointLabel", p.bearing_id as "bearingId"
    from machine m
    join site s on s.id = m.site_id
    join area a on a.id = m.area_id
    left join setup u on u.machine_id = m.id and u.valid_to is null
    left join limit_use lu on lu.machine_id = m.id and lu.to_at is null
    left join limit_set ls on ls.id = lu.limit_set_id and ls.quantity = 'velocity'
    left join point p on p.machine_id = m.id
    left join latest l on l.point_id = p.id
   where m.site_id in (?) and m.state = 'active'
   order by m.id, l.zone desc nulls last, l.value desc nulls last`;

const SERIES = `
  select r.point_id as "pointId", r.taken_at as at, r.value,
         coalesce(r.speed_rpm, v.speed_rpm) as "speedRpm", v.amplitude as "oneX",
         v.lag_deg as "lagDeg", v.setup_id as "setupId"
    from reading r
    left join one_x_vector v
      on v.record_id = r.record_id and v.status = 'kept' and v.unit = 'mm/s rms'
   where r.point_id in (?) and r.status = 'kept' and r.kind = 'overall velocity'
     and r.unit = 'mm/s rms' and r.taken_at > ? and r.taken_at <= ?
   order by r.taken_at`;

const BREAKS = `
  select e.machine_id as "machineId", e.at, e.kind = 'balance' as "isBalance",
         e.breaks_trend as breaks
    from machine_event e join machine m on m.id = e.machine_id
   where m.site_id in (?) and m.state = 'active' and (e.breaks_trend or e.kind = 'balance')
     and e.at <= ?
  union all
  select u.machine_id, u.valid_from, false, true
    from setup u join machine m on m.id = u.machine_id
   where m.site_id in (?) and m.state = 'active' and u.number > 1 and u.valid_from <= ?
   order by 2`;

const DIRECTIONS = `
  select distinct on (p.id) p.bearing_id as "bearingId", p.direction, v.amplitude as "oneX",
         v.lag_deg as "lagDeg", v.setup_id as "setupId", v.taken_at as at
    from point p join one_x_vector v on v.point_id = p.id
   where p.bearing_id in (?) and p.direction in ('H', 'V') and v.status = 'kept'
     and v.unit = 'mm/s rms'
   order by p.id, v.taken_at desc`;

/** Everything the board's cards are made of, in four statements whatever the number of machines. */
export type DueRows = {
  ruling: RulingRow[];
  series: Map<number, SeriesRow[]>;
  breaks: Map<number, BreakRow[]>;
  directions: Map<number, DirectionRow[]>;
};

/** Reads the board's rows for the active machines of these sites. */
export async function dueRows(em: EntityManager, siteIds: number[], now: Date): Promise<DueRows> {
  const connection = em.getConnection();
  const ruling = await connection.execute<RulingRow[]>(RULING, [siteIds, siteIds]);
  const pointIds = ruling.map(({ pointId }) => pointId ?? NONE);
  const bearingIds = ruling.map(({ bearingId }) => bearingId ?? NONE);
  const since = new Date(now.getTime() - SERIES_DAYS * 86_400_000);
  const series = await connection.execute<SeriesRow[]>(SERIES, [
    [NONE, ...pointIds],
    since.toISOString(),
    now.toISOString(),
  ]);
  const until = now.toISOString();
  const breaks = await connection.execute<BreakRow[]>(BREAKS, [siteIds, until, siteIds, until]);
  const directions = await connection.execute<DirectionRow[]>(DIRECTIONS, [[NONE, ...bearingIds]]);
  return {
    ruling,
    series: grouped(series, ({ pointId }) => pointId),
    breaks: grouped(breaks, ({ machineId }) => machineId),
    directions: grouped(directions, ({ bearingId }) => bearingId),
  };
}

function grouped<Row>(rows: readonly Row[], keyOf: (row: Row) => number): Map<number, Row[]> {
  const groups = new Map<number, Row[]>();
  for (const row of rows) {
    const group = groups.get(keyOf(row));
    if (group) group.push(row);
    else groups.set(keyOf(row), [row]);
  }
  return groups;
}
