import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { Badge } from '@/components/ui/badge';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { allows } from '@/lib/domain/access/permissions';
import { formatDateTime } from '@/lib/format';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { balanceJob } from '@/lib/server/queries/balance-job';
import { Faces } from './faces';
import { NextStep } from './next-step';
import { RunsTable } from './runs-table';
import { StopForm } from './stop-form';
import { WeightsTable } from './weights-table';

type Props = { params: Promise<{ jobId: string }> };

/** Once per request: the title needs it too. */
const foundOf = cache(async (jobId: number) => balanceJob(await requireActor(), jobId));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const job = await load(params);
  return { title: `Job ${job.number} · ${job.machine.tag}` };
}

export default async function BalanceJobPage({ params }: Props) {
  const actor = await requireActor();
  const job = await load(params);
  const may = {
    record: allows(actor.role, 'balanceJob:record'),
    override: allows(actor.role, 'balanceJob:override'),
  };
  const open = job.closedAt === null;
  const crumbs = [
    { label: 'Balance jobs', href: routes.balanceJobs() },
    { label: job.machine.tag, href: routes.machine(job.machine.id) },
    { label: `Job ${job.number}` },
  ];
  return (
    <>
      <PageHead
        title={`Balance job ${job.number}, ${job.machine.tag} ${job.machine.name}`}
        crumbs={crumbs}
        note={`${job.kind}, opened ${formatDateTime(job.openedAt, job.site.timeZone)} by ${job.openedBy}: ${job.reason}`}
        actions={
          <>
            <Badge>{job.state}</Badge>
            <LinkButton href={routes.jobRecord(job.id)}>Job record</LinkButton>
            {open && may.record && <StopForm job={job} />}
          </>
        }
      />
      <div className="grid gap-6 xl:grid-cols-[minmax(0,3fr)_minmax(20rem,2fr)]">
        <div className="flex min-w-0 flex-col gap-6">
          {open && may.record && <NextStep job={job} />}
          {open && !may.record && (
            <Notice kind="info">
              Your role reads this job; technicians and engineers record it.
            </Notice>
          )}
          {!open && job.state !== 'signed' && job.closingNote !== null && (
            <Notice kind="info" title={`Ended: ${job.state}`}>
              <span className="whitespace-pre-line">{job.closingNote}</span>
            </Notice>
          )}
          <Panel title="Run sheet">
            <RunsTable job={job} may={may} />
          </Panel>
          <Panel title="Weights">
            <WeightsTable job={job} mayRecord={may.record} />
          </Panel>
        </div>
        <div className="flex min-w-0 flex-col gap-6">
          <Faces job={job} />
        </div>
      </div>
    </>
  );
}

async function load(params: Props['params']) {
  const found = await foundOf(idOf((await params).jobId));
  if (!found) notFound();
  return found;
}
