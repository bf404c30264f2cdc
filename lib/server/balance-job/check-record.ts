import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { contentDifferences } from '@/lib/domain/balance-job/content-differences';
import type { ContentDifference } from '@/lib/domain/balance-job/content-differences';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { RecordCheckDto } from '@/lib/schemas/record-check';
import { balanceJobDto } from '../queries/balance-job';
import { contentHash } from './canonical-json';
import { loadJob, type VisibleJob } from './load-job';
import type { SignedRecord } from './load-signed';
import { signedContent } from './signed-content';

/** Whether a signed record still is what was signed; where it is not, what differs from the job itself. */
export async function checkRecord(
  em: EntityManager,
  job: VisibleJob,
  record: SignedRecord,
): Promise<RecordCheckDto> {
  const { first, signOffs, addenda, intact, addendaIntact } = record;
  return {
    jobId: job.id,
    number: job.number,
    machine: `${job.machine.$.tag} ${job.machine.$.name}`,
    timeZone: job.site.$.timeZone,
    signedBy: first.personName,
    signedAt: first.at.toISOString(),
    contentHash: first.contentHash,
    recomputedHash: contentHash(first.content),
    intact,
    signatures: signOffs.length,
    addenda: addenda.length,
    addendaIntact,
    differences: intact ? [] : await differencesFromJob(em, job, first.content),
  };
}

async function differencesFromJob(
  em: EntityManager,
  job: VisibleJob,
  content: unknown,
): Promise<ContentDifference[]> {
  const live = await balanceJobDto(em, await loadJob(em, job));
  return contentDifferences(factsOf(signedContent(content)), factsOf(live));
}

/** What of a job never changes after it was signed, whatever happens to rotor, limits or set-up later. */
function factsOf(job: BalanceJobDto) {
  const { number, kind, unit, phaseSense, angleSense, reason, openedAt, closedAt, closingNote } =
    job;
  return {
    ...{ number, kind, unit, phaseSense, angleSense, reason, openedAt, closedAt, closingNote },
    runs: job.runs,
    weights: job.weights.map(({ planeName, massG, radiusMm, angleDeg, purpose, fittedAt }) => ({
      planeName,
      massG,
      radiusMm,
      angleDeg,
      purpose,
      fittedAt,
    })),
    accepted: job.accepted.map(({ number: answer, planes }) => ({ number: answer, planes })),
  };
}
