import 'server-only';
import { SignOff } from '@/entities/caution';
import type { RecordCheckDto } from '@/lib/schemas/record-check';
import { checkRecord } from '../balance-job/check-record';
import { loadSigned } from '../balance-job/load-signed';
import { query } from '../query';
import { visibleJob } from '../scope';

/** The signed records whose hash begins with these digits, each checked; of the actor's sites only. */
export const checkedRecords = query(
  'balanceJob:read',
  async (context, digits: string): Promise<RecordCheckDto[]> => {
    const { em, siteIds } = context;
    if (!/^[0-9a-f]{8,64}$/.test(digits)) return [];
    const signOffs = await em.find(
      SignOff,
      { contentHash: { $like: `${digits}%` }, job: { site: { $in: siteIds } } },
      { orderBy: { id: 'asc' }, limit: 20 },
    );
    const checked: RecordCheckDto[] = [];
    for (const jobId of new Set(signOffs.map(({ job }) => job.id))) {
      const job = await visibleJob(context, jobId);
      const record = await loadSigned(em, jobId);
      if (job && record) checked.push(await checkRecord(em, job, record));
    }
    return checked;
  },
);
