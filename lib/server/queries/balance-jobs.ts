import 'server-only';
import type { JobListRow } from '@/lib/schemas/balance-job';
import { query } from '../query';

const SQL = `
  select j.id, j.number, s.name as "siteName", m.id as "machineId", m.tag as "machineTag",
         m.name as "machineName", j.kind, j.state, j.opened_at as "openedAt",
         p.name as "openedBy", j.closed_at as "closedAt", j.unit,
         (select max(v.amplitude) from run_vector v where v.run_id = first.id) as before,
         (select max(v.amplitude) from run_vector v where v.run_id = last.id) as after
    from balance_job j
    join site s on s.id = j.site_id
    join machine m on m.id = j.machine_id
    join person p on p.id = j.opened_by_id
    left join lateral (select id from run where job_id = j.id and purpose = 'base' and state = 'kept'
                        order by number limit 1) first on true
    left join lateral (select id from run where job_id = j.id and purpose = 'check' and state = 'kept'
                        order by number desc limit 1) last on true
   where j.site_id in (?)
   order by j.closed_at is not null, coalesce(j.closed_at, j.opened_at) desc
   limit 200`;

type Row = Omit<JobListRow, 'openedAt' | 'closedAt'> & { openedAt: Date; closedAt: Date | null };

/** Open jobs first, then closed ones, newest first (at most 200). */
export const balanceJobs = query('balanceJob:read', async ({ em, siteIds }, _args: undefined) => {
  const rows = await em.getConnection().execute<Row[]>(SQL, [siteIds]);
  return rows.map((row): JobListRow => ({
    ...row,
    openedAt: new Date(row.openedAt).toISOString(),
    closedAt: row.closedAt === null ? null : new Date(row.closedAt).toISOString(),
  }));
});
