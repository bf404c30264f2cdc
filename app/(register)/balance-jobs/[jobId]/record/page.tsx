import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache } from 'react';
import { AnswerCard } from '@/components/balancing/answer-card';
import { Notice } from '@/components/ui/notice';
import { PageHead } from '@/components/ui/page-head';
import { Panel } from '@/components/ui/panel';
import { STANDING_SENTENCE } from '@/lib/domain/cautions';
import { routes } from '@/lib/routes';
import { requireActor } from '@/lib/server/actor';
import { idOf } from '@/lib/server/address-numbers';
import { jobRecord } from '@/lib/server/queries/job-record';
import { CheckTable } from '../check-table';
import { Faces } from '../faces';
import { RunsTable } from '../runs-table';
import { WeightsTable } from '../weights-table';
import { CautionsTable } from './cautions-table';
import { PhotosPanel } from './photos-panel';
import { PrintButton } from './print-button';
import { RecordHead } from './record-head';
import { SignOffStrip } from './sign-off-strip';
import { ToleranceTable } from './tolerance-table';

type Props = { params: Promise<{ jobId: string }> };

/** Once per request: the title needs it too. */
const foundOf = cache(async (jobId: number) => jobRecord(await requireActor(), jobId));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { job } = await load(params);
  return { title: `Job record ${job.number} · ${job.machine.tag}` };
}

export default async function JobRecordPage({ params }: Props) {
  const record = await load(params);
  const { job } = record;
  const readOnly = { record: false, override: false };
  const crumbs = [
    { label: 'Balance jobs', href: routes.balanceJobs() },
    { label: `Job ${job.number}`, href: routes.balanceJob(job.id) },
    { label: 'Job record' },
  ];
  return (
    <>
      <PageHead
        title={`Job record ${job.number}: ${job.machine.tag} ${job.machine.name}`}
        crumbs={crumbs}
        note="Angles: degrees against rotation from the mark. Phase: lag, the turn from the mark at the tacho to the next positive peak."
        actions={<TakeAway jobId={job.id} isSigned={record.signed !== null} />}
      />
      {record.signed?.intact === false && (
        <Notice kind="failure">
          The stored record no longer has the hash that was signed. Tell your administrator.
        </Notice>
      )}
      {!record.signed && (
        <Notice kind="info">Not signed: this record still follows the job.</Notice>
      )}
      <RecordHead job={job} />
      <Panel title="Before and after">
        {job.check ? <CheckTable job={job} /> : <p>No check run yet.</p>}
      </Panel>
      <Panel title="Runs">
        <RunsTable job={{ ...job, closedAt: job.closedAt ?? job.openedAt }} may={readOnly} />
      </Panel>
      <Panel title="Weights on the rotor">
        <WeightsTable job={job} mayRecord={false} />
      </Panel>
      {job.accepted.map((answer) => (
        <Panel
          key={answer.number}
          title={`Answer ${answer.number}, ${answer.kind}`}
          note={`accepted by ${answer.acceptedBy}`}
        >
          <AnswerCard job={job} answer={answer} />
        </Panel>
      ))}
      <div className="grid gap-6 lg:grid-cols-2 print:block">
        <Faces job={job} />
      </div>
      <PhotosPanel job={job} />
      <ToleranceTable job={job} />
      <CautionsTable cautions={record.cautions} timeZone={job.site.timeZone} />
      <SignOffStrip job={job} areaOwner={record.signed?.areaOwner ?? null} />
      <p className="text-xs text-ink-soft">{STANDING_SENTENCE}</p>
    </>
  );
}

function TakeAway({ jobId, isSigned }: { jobId: number; isSigned: boolean }) {
  return (
    <>
      <PrintButton />
      {isSigned && (
        <a className="link" href={routes.api.signedRecord(jobId)} download>
          As JSON
        </a>
      )}
    </>
  );
}

async function load(params: Props['params']) {
  const found = await foundOf(idOf((await params).jobId));
  if (!found) notFound();
  return found;
}
