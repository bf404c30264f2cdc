import 'server-only';
import type { SignedRecordFile } from '@/lib/schemas/signed-record';
import { loadSigned } from '../balance-job/load-signed';
import { query } from '../query';
import { visibleJob } from '../scope';

/** What a signature froze, as a file that can be checked without this product; null where none is. */
export const signedRecord = query(
  'balanceJob:read',
  async (context, jobId: number): Promise<SignedRecordFile | null> => {
    const job = await visibleJob(context, jobId);
    if (!job) return null;
    const record = await loadSigned(context.em, job.id);
    if (!record) return null;
    const { first, signOffs, addenda } = record;
    return {
      kind: 'Evenrun job record',
      version: 1,
      name: `job-record-${job.machine.$.tag}-${String(job.number)}.json`,
      convention: {
        angles: 'degrees against rotation from the mark',
        phase: 'lag, the turn from the mark at the tacho to the next positive peak',
        model: 'V = V0 + H*U, U = mass*radius at the angle',
      },
      signedAt: first.at.toISOString(),
      signedBy: first.personName,
      role: first.role,
      statement: first.statement,
      hashedAs:
        'SHA-256 over the UTF-8 text of content as JSON, keys of every object in ascending order, no white space (RFC 8785)',
      contentHash: first.contentHash,
      content: first.content,
      signatures: signOffs.map(({ personName, role, statement, at }) => ({
        name: personName,
        role,
        statement,
        at: at.toISOString(),
      })),
      addendaHashedAs:
        'The same over each addendum without its hash; previousHash is contentHash for the first, then the hash of the one before',
      addenda,
    };
  },
);
