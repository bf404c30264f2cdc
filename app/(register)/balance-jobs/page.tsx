import type { Metadata } from 'next';
import Link from 'next/link';
import { RowKeys } from '@/components/register/row-keys';
import { Badge } from '@/components/ui/badge';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { RowHead, Table, Td, Th } from '@/components/ui/table';
import { formatDate, formatNumber, formatPlural, NOT_MEASURED } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { JobListRow } from '@/lib/schemas/balance-job';
import { requireActor } from '@/lib/server/actor';
import { narrowed } from '@/lib/server/chosen-site';
import { balanceJobs } from '@/lib/server/queries/balance-jobs';

export const metadata: Metadata = { title: 'Balance jobs' };

export default async function BalanceJobsPage() {
  const actor = await narrowed(await requireActor());
  const rows = await balanceJobs(actor, undefined);
  const open = rows.filter((row) => row.closedAt === null);
  const closed = rows.filter((row) => row.closedAt !== null);
  const timeZone = actor.sites[0]?.timeZone ?? 'UTC';
  return (
    <>
      <PageHead
        title="Balance jobs"
        note={`${open.length} open, ${closed.length} closed`}
        actions={<LinkButton href={routes.verifyRecord()}>Check a job record</LinkButton>}
      />
      {rows.length === 0 ? (
        <EmptyState
          title="No balance job yet"
          action={<LinkButton href={routes.plantBook()}>Find a machine</LinkButton>}
        >
          A balance job opens from a machine and keeps its runs, weights and coefficients.
        </EmptyState>
      ) : (
        <RowKeys>
          <JobsPanel title="Open" rows={open} timeZone={timeZone} />
          <JobsPanel title="Closed" rows={closed} timeZone={timeZone} />
        </RowKeys>
      )}
    </>
  );
}

function JobsPanel(props: { title: string; rows: JobListRow[]; timeZone: string }) {
  const { title, rows, timeZone } = props;
  return (
    <Panel title={title} note={formatPlural(rows.length, 'job')}>
      <Table caption={`${title} balance jobs`}>
        <thead>
          <tr>
            <Th>job</Th>
            <Th>machine</Th>
            <Th>state</Th>
            <Th>opened</Th>
            <Th numeric>1x before</Th>
            <Th numeric>1x after</Th>
            <Th>unit</Th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.id}>
              <RowHead>
                <Link className="link" href={routes.balanceJob(row.id)}>
                  Job {row.number}
                </Link>
              </RowHead>
              <Td>
                <Link className="link" href={routes.machine(row.machineId)}>
                  {row.machineTag}
                </Link>{' '}
                {row.machineName}, {row.siteName}
              </Td>
              <Td>
                <Badge>{row.state}</Badge>
              </Td>
              <Td>
                {formatDate(row.openedAt, timeZone)}, {row.openedBy}
              </Td>
              <Td numeric>{row.before === null ? NOT_MEASURED : formatNumber(row.before)}</Td>
              <Td numeric>{row.after === null ? NOT_MEASURED : formatNumber(row.after)}</Td>
              <Td>{row.unit}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </Panel>
  );
}
