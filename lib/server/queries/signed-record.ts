import 'server-only';
import { SignOff } from '@/entities/caution';
import type { SignedRecordFile } from '@/lib/schemas/signed-record';
import { query } from '../query';
import { visibleJob } from '../scope';

/** What a signature froze, as a file that can be checked without this product; null where none is. */
export const signedRecord = query(
  'balanceJob:read',
  async (context, jobId: number): Promise<SignedRecordFile | null> => {
    const job = await visibleJob(context, jobId);
    if (!job) return null;
    const signOff = await context.em.findOne(SignOff, { job: job.id }, { orderBy: { at: 'asc' } });
    if (!signOff) return null;
    return {
      kind: 'Evenrun job record',
      version: 1,
      name: `job-record-${job.machine.$.tag}-${String(job.number)}.json`,
      convention: {
        angles: 'degrees against rotation from the mark',
        phase: 'lag, the turn from the mark at the tacho to the next positive peak',
        model: 'V = V0 + H*U, U = mass*radius at the angle',
      },
      signedAt: signOff.at.toISOString(),
      signedBy: signOff.personName,
      role: signOff.role,
      statement: signOff.statement,
      hashedAs:
        'SHA-256 over the UTF-8 text of content as JSON, keys of every object in ascending order, no white space',
      contentHash: signOff.contentHash,
      content: signOff.content,
    };
  },
);
