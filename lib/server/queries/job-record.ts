import 'server-only';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { JobRecordDto, SignedState } from '@/lib/schemas/job-record';
import { loadJob, type VisibleJob } from '../balance-job/load-job';
import { loadSigned, type SignedRecord } from '../balance-job/load-signed';
import { recordExtras, type RecordExtras } from '../balance-job/record-extras';
import { signedContent } from '../balance-job/signed-content';
import { query, type QueryContext } from '../query';
import { jobReport } from '../report/job-report';
import { visibleJob } from '../scope';
import { balanceJobDto, signOffDtos } from './balance-job';

/** The job record: as signed where it is signed, as it stands otherwise. */
export const jobRecord = query(
  'balanceJob:read',
  async (context, jobId: number): Promise<JobRecordDto | null> => {
    const job = await visibleJob(context, jobId);
    if (!job) return null;
    const record = await loadSigned(context.em, job.id);
    const { dto, extras } = record ? frozen(record) : await live(context, job);
    const { cautions, equipment } = { ...(await recordExtras(context.em, job)), ...extras };
    const signed = record && stateOf(record);
    const asked = { by: context.actor.name, at: context.now };
    return {
      job: dto,
      signed,
      hasSigned:
        record?.signOffs.some(({ person }) => person.id === context.actor.personId) ?? false,
      report: jobReport({ job: dto, equipment, cautions, signed, asked }),
    };
  },
);

type Content = { dto: BalanceJobDto; extras: Partial<RecordExtras> };

function frozen({ first, signOffs }: SignedRecord): Content {
  const { equipment, cautions, ...content } = signedContent(first.content);
  return {
    dto: { ...content, signOffs: signOffDtos(signOffs) },
    extras: { ...(equipment && { equipment }), ...(cautions && { cautions }) },
  };
}

async function live({ em }: QueryContext, job: VisibleJob): Promise<Content> {
  return { dto: await balanceJobDto(em, await loadJob(em, job)), extras: {} };
}

function stateOf(record: SignedRecord): SignedState {
  const { first, intact, addenda, addendaIntact } = record;
  const { areaOwner } = signedContent(first.content);
  return { contentHash: first.contentHash, areaOwner, intact, addenda, addendaIntact };
}
