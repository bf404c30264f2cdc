import 'server-only';
import type { PointPageDto } from '@/lib/schemas/register';
import { pointDto } from '../balance-job/places';
import { query } from '../query';
import { iso } from '../rows';
import { visiblePoint } from '../scope';

const SQL = `
  select r.id, r.taken_at as "takenAt", r.state, r.source, o.value as overall, o.zone,
         v.amplitude as "oneX", v.lag_deg as "lagDeg",
         coalesce(v.speed_rpm, o.speed_rpm, r.stated_speed_rpm) as "speedRpm"
    from measured_record r
    left join reading o on o.record_id = r.id and o.kind = 'overall velocity'
    left join one_x_vector v on v.record_id = r.id
   where r.point_id = ?
   order by r.taken_at desc
   limit 200`;

type Row = Omit<PointPageDto['records'][number], 'takenAt'> & { takenAt: Date | string };

/** A point with its last 200 records, held and lined-through ones included. */
export const pointPage = query(
  'measurement:read',
  async (context, pointId: number): Promise<PointPageDto | null> => {
    const { em, actor } = context;
    const point = await visiblePoint(context, pointId);
    if (!point) return null;
    const machine = point.machine.$;
    const site = actor.sites.find(({ id }) => id === machine.site.id);
    if (!site) return null;
    const rows = await em.getConnection().execute<Row[]>(SQL, [point.id]);
    const { label, bearing, direction } = pointDto(point);
    return {
      id: point.id,
      label,
      bearing,
      direction,
      mounting: point.mounting ?? null,
      machine: { id: machine.id, tag: machine.tag, name: machine.name },
      site: { name: site.name, timeZone: site.timeZone, decimalMark: site.decimalMark },
      records: rows.map((row) => ({ ...row, takenAt: iso(row.takenAt) })),
    };
  },
);
