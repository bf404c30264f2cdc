import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { ReportBody } from '@/components/report/report-body';
import { Notice } from '@/components/ui/notice';
import { PageHead } from '@/components/ui/page-head';
import { allows } from '@/lib/domain/access/permissions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { jobRecord } from '@/lib/server/queries/job-record';
import { AfterSigning } from './after-signing';
import { TakeAway } from './take-away';

type Props = { params: Promise<{ jobId: string }> };

/** Once per request: the title needs it too. */
const foundOf = cache(async (jobId: number) => jobRecord(await requireActor(), jobId));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { job } = await load(params);
  return { title: `Job record ${job.number} · ${job.machine.tag}` };
}

export default async function JobRecordPage({ params }: Props) {
  const { role } = await requireActor();
  const { job, signed, hasSigned, report } = await load(params);
  const may = {
    addAddendum: allows(role, 'balanceJob:addendum'),
    cosign: !hasSigned && allows(role, 'balanceJob:cosign'),
    signAsEngineer: allows(role, 'balanceJob:override'),
  };
  const crumbs = [
    { label: 'Balance jobs', href: routes.balanceJobs() },
    { label: `Job ${job.number}`, href: routes.balanceJob(job.id) },
    { label: 'Job record' },
  ];
  return (
    <>
      <PageHead
        title={report.title}
        crumbs={crumbs}
        note={report.convention}
        actions={<TakeAway jobId={job.id} contentHash={report.contentHash} />}
      />
      {signed?.intact === false && (
        <Notice kind="failure">
          The stored record no longer has the hash that was signed. Tell your administrator.
        </Notice>
      )}
      {signed?.addendaIntact === false && (
        <Notice kind="failure">
          The addenda no longer follow each other as they were written. Tell your administrator.
        </Notice>
      )}
      {!signed && <Notice kind="info">Not signed: this record still follows the job.</Notice>}
      <ReportBody report={report} />
      {signed && <AfterSigning jobId={job.id} may={may} />}
    </>
  );
}

async function load(params: Props['params']) {
  const found = await foundOf(idOf((await params).jobId));
  if (!found) notFound();
  return found;
}
