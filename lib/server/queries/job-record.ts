import 'server-only';
import { createHash } from 'node:crypto';
import { CautionShown, SignOff } from '@/entities/caution';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { canonicalJson } from '../balance-job/canonical-json';
import { loadJob } from '../balance-job/load-job';
import { signedContent } from '../balance-job/signed-content';
import { query } from '../query';
import { visibleJob } from '../scope';
import { balanceJobDto } from './balance-job';

export type CautionLine = {
  cautionId: string;
  step: string;
  namedPerson: string | null;
  person: string;
  at: string;
};

export type JobRecordDto = {
  job: BalanceJobDto;
  /** Set once signed: what was frozen, and whether it still has the hash that was signed. */
  signed: { contentHash: string; areaOwner: string; intact: boolean } | null;
  cautions: CautionLine[];
};

/** The job record: as signed where it is signed, as it stands otherwise. */
export const jobRecord = query(
  'balanceJob:read',
  async (context, jobId: number): Promise<JobRecordDto | null> => {
    const { em } = context;
    const job = await visibleJob(context, jobId);
    if (!job) return null;
    const live = await balanceJobDto(em, await loadJob(em, job));
    const signOff = await em.findOne(SignOff, { job: job.id }, { orderBy: { at: 'asc' } });
    const cautions = await em.find(
      CautionShown,
      { job: job.id },
      { orderBy: { id: 'asc' }, populate: ['person'] },
    );
    const frozen = signOff && signedContent(signOff.content);
    return {
      job: frozen ? { ...frozen, signOffs: live.signOffs } : live,
      signed: frozen && {
        contentHash: signOff.contentHash,
        areaOwner: frozen.areaOwner,
        intact: hashOf(signOff.content) === signOff.contentHash,
      },
      cautions: cautions.map((shown) => ({
        cautionId: shown.cautionId,
        step: shown.step,
        namedPerson: shown.namedPerson ?? null,
        person: shown.person.$.name,
        at: shown.at.toISOString(),
      })),
    };
  },
);

function hashOf(content: unknown): string {
  return createHash('sha256').update(canonicalJson(content)).digest('hex');
}
