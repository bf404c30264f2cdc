import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Addendum } from '@/entities/addendum';
import { SignOff } from '@/entities/caution';
import type { AddendumDto } from '@/lib/schemas/job-record';
import { isChainIntact } from './addendum-hash';
import { contentHash } from './canonical-json';

export type SignedRecord = {
  /** All signatures, the one that froze the content first. */
  signOffs: [SignOff, ...SignOff[]];
  first: SignOff;
  addenda: AddendumDto[];
  /** Whether the stored content gives the hash that was signed. */
  intact: boolean;
  addendaIntact: boolean;
};

/** What was signed of a job, and what was remarked since; null where nobody has signed. */
export async function loadSigned(em: EntityManager, jobId: number): Promise<SignedRecord | null> {
  const [first, ...further] = await em.find(
    SignOff,
    { job: jobId },
    { orderBy: { at: 'asc', id: 'asc' } },
  );
  if (!first) return null;
  const rows = await em.find(Addendum, { job: jobId }, { orderBy: { number: 'asc' } });
  const addenda = rows.map(
    ({ number, text, reason, personName, role, at, previousHash, hash }) => ({
      number,
      text,
      reason,
      personName,
      role,
      at: at.toISOString(),
      previousHash,
      hash,
    }),
  );
  return {
    signOffs: [first, ...further],
    first,
    addenda,
    intact: contentHash(first.content) === first.contentHash,
    addendaIntact: isChainIntact(first.contentHash, addenda),
  };
}
