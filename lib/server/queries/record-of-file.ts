import 'server-only';
import { SignOff } from '@/entities/caution';
import { contentDifferences } from '@/lib/domain/balance-job/content-differences';
import type { RecordFileMatchDto } from '@/lib/schemas/record-check';
import { contentHash } from '../balance-job/canonical-json';
import { checkRecord } from '../balance-job/check-record';
import { loadSigned, type SignedRecord } from '../balance-job/load-signed';
import type { KeptRecord } from '../balance-job/record-file';
import { query, type QueryContext } from '../query';
import { visibleJob } from '../scope';

/** The record a kept file was made of, and where the two differ; null where the actor sees none. */
export const recordOfFile = query(
  'balanceJob:read',
  async (context, file: KeptRecord): Promise<RecordFileMatchDto | null> => {
    const job = await visibleJob(context, await jobIdOf(context, file));
    const record = job && (await loadSigned(context.em, job.id));
    if (!job || !record) return null;
    const differences = [
      ...contentDifferences(file.content, record.first.content),
      ...contentDifferences(signatureIn(file), signatureOf(record)),
      ...addendaDifferences(file, record),
    ];
    return {
      record: await checkRecord(context.em, job, record),
      same: contentHash(file.content) === record.first.contentHash,
      differences,
      newerAddenda: Math.max(0, record.addenda.length - file.addenda.length),
    };
  },
);

/** By the hash the file states; where nothing has it, by the job that its content names. */
async function jobIdOf({ em, siteIds }: QueryContext, file: KeptRecord): Promise<number> {
  const signOff = await em.findOne(SignOff, {
    contentHash: file.contentHash,
    job: { site: { $in: siteIds } },
  });
  return signOff?.job.id ?? file.content.id;
}

function signatureIn({ signedAt, signedBy, role, statement, contentHash: hash }: KeptRecord) {
  return { signedAt, signedBy, role, statement, contentHash: hash };
}

function signatureOf({ first }: SignedRecord) {
  return {
    signedAt: first.at.toISOString(),
    signedBy: first.personName,
    role: first.role,
    statement: first.statement,
    contentHash: first.contentHash,
  };
}

function addendaDifferences({ addenda }: KeptRecord, record: SignedRecord) {
  const kept = record.addenda.slice(0, addenda.length);
  return contentDifferences({ addenda }, { addenda: kept });
}
