import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { PointStanding } from '@/lib/schemas/register';
import { isoOrNull } from '../rows';

const SQL = `
  select p.id, p.label, p.bearing_id as "bearingId", p.direction, o.value as overall, o.zone,
         o.taken_at as "readAt", o.record_id as "recordId", v.amplitude as "oneX",
         v.lag_deg as "lagDeg"
    from point p
    left join lateral (
      select r.value, r.zone, r.taken_at, r.record_id from reading r
       where r.point_id = p.id and r.status = 'kept' and r.kind = 'overall velocity'
       order by r.taken_at desc limit 1) o on true
    left join lateral (
      select x.amplitude, x.lag_deg from one_x_vector x
       where x.point_id = p.id and x.status = 'kept'
       order by x.taken_at desc limit 1) v on true
   where p.machine_id = ?
   order by p.point_order`;

type Row = Omit<PointStanding, 'readAt'> & { readAt: Date | string | null };

/** How each point of a machine stands now, by its latest kept readings. */
export async function pointStandings(
  em: EntityManager,
  machineId: number,
): Promise<PointStanding[]> {
  const rows = await em.getConnection().execute<Row[]>(SQL, [machineId]);
  return rows.map((row) => ({ ...row, readAt: isoOrNull(row.readAt) }));
}
