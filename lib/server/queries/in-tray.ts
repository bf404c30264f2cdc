import 'server-only';
import type {
  InTrayDto,
  InTrayFilter,
  InTrayRow,
  Reason,
  UploadState,
} from '@/lib/schemas/in-tray';
import { query, type QueryContext } from '../query';
import { readUploadLayout } from '../intake/upload-layout';

/** Most files a list shows at once. */
export const IN_TRAY_ROWS = 200;

/** The uploads of the actor's sites: held first, then waiting, then by time; with counts by state. */
export const inTray = query(
  'measurement:read',
  async (context, filter: InTrayFilter): Promise<InTrayDto> => {
    const sites = sitesOf(context);
    const counts = await countsOf(context, sites);
    const states = statesOf(filter.state);
    const rows = await context.em
      .getConnection()
      .execute<Row[]>(ROWS, [sites, states, IN_TRAY_ROWS]);
    const found = states.reduce((sum, state) => sum + counts[state], 0);
    return { rows: rows.map(rowDto), counts, found };
  },
);

// The driver hands raw timestamps back as PostgreSQL spells them, which is no ISO 8601.
const instant = (column: string) =>
  `to_char(${column} at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"')`;

const ROWS = `
  with listed as (
    select * from upload where site_id in (?) and state in (?)
     order by case state when 'held' then 0 when 'waiting' then 1 else 2 end, at desc, id desc
     limit ?
  ), latest as (
    select distinct on (upload_id) * from measured_record
     where upload_id in (select id from listed) order by upload_id, id desc
  )
  select u.id, u.file_name, u.size_bytes, ${instant('u.at')} as at, u.state, u.layout, pe.name as person,
         s.id as site_id, s.name as site_name, s.time_zone,
         r.id as record_id, ${instant('r.taken_at')} as taken_at, r.hold_reasons,
         p.id as point_id, p.label, m.id as machine_id, m.tag,
         o.value as overall, o.zone
    from listed u
    join site s on s.id = u.site_id
    join person pe on pe.id = u.person_id
    left join latest r on r.upload_id = u.id
    left join point p on p.id = coalesce(r.point_id, u.point_id)
    left join machine m on m.id = p.machine_id
    left join reading o on o.record_id = r.id and o.kind = 'overall velocity'
   order by case u.state when 'held' then 0 when 'waiting' then 1 else 2 end, u.at desc, u.id desc`;

type Row = {
  id: number;
  file_name: string;
  size_bytes: number;
  at: string;
  state: UploadState;
  layout: unknown;
  person: string;
  site_id: number;
  site_name: string;
  time_zone: string;
  record_id: number | null;
  taken_at: string | null;
  hold_reasons: Reason[] | null;
  point_id: number | null;
  label: string | null;
  machine_id: number | null;
  tag: string | null;
  overall: number | null;
  zone: 'A' | 'B' | 'C' | 'D' | null;
};

function rowDto(row: Row): InTrayRow {
  const layout = row.state === 'waiting' ? readUploadLayout(row.layout) : null;
  return {
    uploadId: row.id,
    fileName: row.file_name,
    sizeBytes: row.size_bytes,
    at: row.at,
    person: row.person,
    state: row.state,
    site: { id: row.site_id, name: row.site_name, timeZone: row.time_zone },
    point: pointOf(row),
    // A file taken up again waits anew: the record it once made is not shown beside it.
    record: row.state === 'waiting' ? null : recordOf(row),
    problem: layout?.problem ?? null,
    questions: (layout?.questions ?? []).map(({ message }) => message),
  };
}

function pointOf({ point_id: id, label, machine_id: machineId, tag }: Row): InTrayRow['point'] {
  if (id === null || label === null || machineId === null || tag === null) return null;
  return { id, label, machineId, machineTag: tag };
}

function recordOf(row: Row): InTrayRow['record'] {
  const { record_id: id, taken_at: takenAt, hold_reasons: reasons, overall, zone } = row;
  if (id === null || takenAt === null) return null;
  return {
    id,
    takenAt,
    reasons: reasons ?? [],
    overallMmS: overall,
    zone,
  };
}

async function countsOf({ em }: QueryContext, sites: number[]): Promise<InTrayDto['counts']> {
  const rows = await em
    .getConnection()
    .execute<{ state: UploadState; count: number }[]>(
      'select state, count(*)::int as count from upload where site_id in (?) group by state',
      [sites],
    );
  const counts = { waiting: 0, held: 0, kept: 0, withdrawn: 0 };
  for (const { state, count } of rows) counts[state] = count;
  return counts;
}

function statesOf(state: InTrayFilter['state']): UploadState[] {
  if (state === 'open') return ['held', 'waiting'];
  return state === 'all' ? ['held', 'waiting', 'kept', 'withdrawn'] : [state];
}

// Site 0 does not exist: `in ()` is no SQL.
function sitesOf({ siteIds }: QueryContext): number[] {
  return siteIds.length === 0 ? [0] : siteIds;
}
