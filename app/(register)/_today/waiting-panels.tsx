import Link from 'next/link';
import { Badge } from '@/components/ui/badge';
import { LinkButton } from '@/components/ui/link-button';
import { Panel } from '@/components/ui/panel';
import { formatAge, formatCount, formatPlural } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { JobListRow } from '@/lib/schemas/balance-job';
import type { InTrayDto, InTrayRow } from '@/lib/schemas/in-tray';

const SHOWN = 6;

/** Balance jobs that somebody has begun. */
export function OpenJobsPanel({ jobs }: { jobs: readonly JobListRow[] }) {
  const now = new Date();
  return (
    <Panel
      title="Open balance jobs"
      note={jobs.length === 0 ? undefined : formatPlural(jobs.length, 'job')}
      actions={<LinkButton href={routes.balanceJobs()}>Balance jobs</LinkButton>}
    >
      {jobs.length === 0 ? (
        <p className="text-ink-soft">No balance job is open.</p>
      ) : (
        <ul className="flex flex-col divide-y divide-rule">
          {jobs.slice(0, SHOWN).map((job) => (
            <li key={job.id} className="flex flex-wrap items-baseline gap-x-3 gap-y-1 py-2.5">
              <Link className="link font-semibold" href={routes.balanceJob(job.id)}>
                {job.machineTag}, job {job.number}
              </Link>
              <span>{job.machineName}</span>
              <Badge>{job.state}</Badge>
              <span className="text-sm text-ink-soft">
                opened {formatAge(job.openedAt, now)} by {job.openedBy}
              </span>
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}

/** Files that a person must still decide on. */
export function WaitingPanel({ tray }: { tray: InTrayDto }) {
  const shown = tray.rows.slice(0, SHOWN);
  return (
    <Panel
      title="In the tray"
      note={tray.found === 0 ? undefined : `${formatCount(shown.length, tray.found)} files`}
      actions={<LinkButton href={routes.inTray()}>In-tray</LinkButton>}
    >
      {shown.length === 0 ? (
        <p className="text-ink-soft">Nothing waits to be confirmed and nothing is held.</p>
      ) : (
        <ul className="flex flex-col divide-y divide-rule">
          {shown.map((row) => (
            <WaitingLine key={row.uploadId} row={row} />
          ))}
        </ul>
      )}
    </Panel>
  );
}

function WaitingLine({ row }: { row: InTrayRow }) {
  const why = row.record?.reasons[0]?.message ?? row.problem ?? row.questions[0];
  return (
    <li className="flex flex-col gap-1 py-2.5">
      <p className="flex flex-wrap items-baseline gap-x-3">
        <Link className="link font-semibold break-all" href={routes.upload(row.uploadId)}>
          {row.fileName}
        </Link>
        <Badge>{row.state}</Badge>
        {row.point && (
          <span>
            {row.point.machineTag} {row.point.label}
          </span>
        )}
      </p>
      {why !== undefined && <p className="text-sm text-ink-soft">{why}</p>}
    </li>
  );
}
