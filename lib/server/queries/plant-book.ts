import 'server-only';
import type { PlantBookDto, PlantBookRow } from '@/lib/schemas/register';
import { isoOrNull } from '../rows';
import { query } from '../query';

export type PlantBookFilter = { text: string; area: string; state: 'active' | 'retired' };

/** Machines with their worst point of now: one statement, whatever the number of machines. */
const SQL = `
  with latest as (
    select distinct on (r.point_id) r.point_id, r.record_id, r.value, r.zone, r.taken_at
      from reading r
     where r.status = 'kept' and r.kind = 'overall velocity'
     order by r.point_id, r.taken_at desc
  ), worst as (
    select distinct on (p.machine_id) p.machine_id, p.id as point_id, p.label, l.value, l.zone, l.taken_at
      from latest l join point p on p.id = l.point_id
     order by p.machine_id, l.zone desc nulls last, l.value desc
  )
  select m.id, m.tag, m.name, s.id as "siteId", s.name as "siteName", a.name as "areaName", m.kind,
         m.nominal_speed_rpm as "nominalSpeedRpm", m.criticality, m.state, w.zone,
         w.label as "worstPoint", w.value as overall, w.taken_at as "readAt",
         (select v.amplitude from one_x_vector v
           where v.point_id = w.point_id and v.status = 'kept'
           order by v.taken_at desc limit 1) as "oneX",
         (select max(e.at) from machine_event e
           where e.machine_id = m.id and e.kind = 'balance') as "balancedAt"
    from machine m
    join site s on s.id = m.site_id
    join area a on a.id = m.area_id
    left join worst w on w.machine_id = m.id
   where m.site_id in (?) and m.state = ?
   order by w.zone desc nulls last, w.value desc nulls last, m.tag`;

type Row = Omit<PlantBookRow, 'readAt' | 'balancedAt'> & {
  readAt: Date | string | null;
  balancedAt: Date | string | null;
  aliases?: string;
};

/** The register as a table, worst first, with the tree of areas beside it. */
export const plantBook = query(
  'register:read',
  async ({ em, siteIds }, filter: PlantBookFilter): Promise<PlantBookDto> => {
    const found = await em.getConnection().execute<Row[]>(SQL, [siteIds, filter.state]);
    const rows = found.map((row) => ({
      ...row,
      readAt: isoOrNull(row.readAt),
      balancedAt: isoOrNull(row.balancedAt),
    }));
    return {
      rows: rows.filter((row) => matches(row, filter)),
      all: rows.length,
      areas: areasOf(rows),
    };
  },
);

function matches(row: PlantBookRow, { text, area }: PlantBookFilter): boolean {
  if (area !== '' && `${row.siteName} / ${row.areaName}` !== area) return false;
  const wanted = plain(text);
  return wanted === '' || plain(`${row.tag} ${row.name} ${row.kind}`).includes(wanted);
}

function plain(text: string): string {
  return text.toLowerCase().replace(/\s+/g, '');
}

function areasOf(rows: readonly PlantBookRow[]): PlantBookDto['areas'] {
  const counts = new Map<string, PlantBookDto['areas'][number]>();
  for (const { siteName, areaName } of rows) {
    const key = `${siteName} / ${areaName}`;
    const known = counts.get(key) ?? { siteName, areaName, machines: 0 };
    counts.set(key, { ...known, machines: known.machines + 1 });
  }
  return [...counts.values()].sort((a, b) =>
    `${a.siteName} ${a.areaName}`.localeCompare(`${b.siteName} ${b.areaName}`),
  );
}
