import type { EntityManager } from '@mikro-orm/postgresql';
import { LimitSet } from '@/entities/limit-set';
import { Site } from '@/entities/site';
import type { Actor } from '@/lib/schemas/actor';
import { readRecordFile } from '@/lib/server/balance-job/record-file';
import { addAddendum } from '@/lib/server/commands/add-addendum';
import { cosignRecord } from '@/lib/server/commands/cosign-record';
import { checkedRecords } from '@/lib/server/queries/checked-records';
import { machineHistory } from '@/lib/server/queries/machine-history';
import { recordOfFile } from '@/lib/server/queries/record-of-file';
import { signedRecord } from '@/lib/server/queries/signed-record';
import type { OtherSiteCase } from '@/tests/support/other-site';
import { seedMachine, type SmallPlant } from '@/tests/support/plant';
import { valueOf } from '../balance-job/job-driver';
import { signedJob } from '../record/signed-job';

let signed: Promise<number> | null = null;

/** A signed job of the home site on a machine of its own, shared by the cases. */
function signedJobId(plant: SmallPlant, em: EntityManager): Promise<number> {
  signed ??= (async () => {
    const site = await em.findOneOrFail(Site, plant.home.siteId);
    const limits = await em.findOneOrFail(LimitSet, plant.limitSetId);
    const { jobId } = await signedJob(plant, await seedMachine(em, site, limits, 'KX-7'));
    return jobId;
  })();
  return signed;
}

async function fileAs(reader: Actor, jobId: number) {
  const file = await signedRecord(reader, jobId);
  return valueOf(readRecordFile(JSON.stringify(file)));
}

export const cases: OtherSiteCase[] = [
  {
    name: 'machineHistory',
    expects: 'null',
    run: (foreigner, plant) => machineHistory(foreigner, plant.home.machineId),
  },
  {
    name: 'addAddendum',
    expects: 'not-found',
    run: async (foreigner, plant, em) =>
      addAddendum(foreigner, { jobId: await signedJobId(plant, em), text: 'x', reason: 'x' }),
  },
  {
    name: 'cosignRecord',
    expects: 'not-found',
    run: async (foreigner, plant, em) =>
      cosignRecord(foreigner, {
        jobId: await signedJobId(plant, em),
        capacity: 'area owner',
        statement: 'x',
      }),
  },
  {
    name: 'checkedRecords',
    expects: 'empty',
    run: async (foreigner, plant, em) => {
      const reader = plant.at('reader');
      const { contentHash } = await fileAs(reader, await signedJobId(plant, em));
      if ((await checkedRecords(reader, contentHash)).length === 0)
        throw new Error('nothing to hide');
      return checkedRecords(foreigner, contentHash);
    },
  },
  {
    name: 'recordOfFile',
    expects: 'null',
    run: async (foreigner, plant, em) => {
      const reader = plant.at('reader');
      const file = await fileAs(reader, await signedJobId(plant, em));
      if (!(await recordOfFile(reader, file))) throw new Error('nothing to hide');
      return recordOfFile(foreigner, file);
    },
  },
];
