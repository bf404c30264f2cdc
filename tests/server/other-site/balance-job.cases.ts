import { SignOff } from '@/entities/caution';
import { Run } from '@/entities/balance-job';
import { Weight } from '@/entities/weight';
import { addPhoto } from '@/lib/server/commands/add-photo';
import { acceptAnswer } from '@/lib/server/commands/accept-answer';
import { acceptBase } from '@/lib/server/commands/accept-base';
import { confirmSlip } from '@/lib/server/commands/confirm-slip';
import { correctLedger, recordFoundWeight } from '@/lib/server/commands/correct-ledger';
import { fitWeight } from '@/lib/server/commands/fit-weight';
import { openBalanceJob } from '@/lib/server/commands/open-balance-job';
import { recordRun } from '@/lib/server/commands/record-run';
import { reuseCoefficients, withdrawReuse } from '@/lib/server/commands/reuse-coefficients';
import { keepRun, lineThroughRun } from '@/lib/server/commands/settle-run';
import { settleTrial, takeOffWeight } from '@/lib/server/commands/settle-weight';
import { signJob } from '@/lib/server/commands/sign-job';
import { stopJob } from '@/lib/server/commands/stop-job';
import { balanceJob } from '@/lib/server/queries/balance-job';
import { balanceJobs } from '@/lib/server/queries/balance-jobs';
import { jobRecord } from '@/lib/server/queries/job-record';
import { newBalanceJob } from '@/lib/server/queries/new-balance-job';
import { signedRecord } from '@/lib/server/queries/signed-record';
import { weightPhoto } from '@/lib/server/queries/weight-photo';
import type { OtherSiteCase } from '@/tests/support/other-site';
import type { SmallPlant } from '@/tests/support/plant';
import { JobDriver, valueOf } from '../balance-job/job-driver';
import { pngFile } from '../balance-job/photo-files';

let opened: Promise<JobDriver> | null = null;

/** One job of the home site with a base run and a trial weight, shared by the cases. */
function homeJob(plant: SmallPlant): Promise<JobDriver> {
  opened ??= (async () => {
    const job = await JobDriver.open(plant.at('technician'), plant.home, {
      kind: 'one-plane',
      speedRpm: 990,
    });
    valueOf(await job.run('base', [{ amp: 3.9, deg: 100 }]));
    await job.acceptBase('One base run.');
    valueOf(await job.fit('trial', 0, { g: 20, radius_mm: 700, deg: 0 }));
    return job;
  })();
  return opened;
}

const ticks = { standingStill: 'on', fixingHolds: 'on', namedPerson: 'Ida Berg' } as const;

export const cases: OtherSiteCase[] = [
  {
    name: 'openBalanceJob',
    expects: 'not-found',
    run: (foreigner, plant) =>
      openBalanceJob(foreigner, {
        machineId: plant.home.machineId,
        kind: 'one-plane',
        planeIds: [plant.home.planeIds[0]],
        pointIds: [plant.home.pointIds[0]],
        unit: 'mm/s rms',
        phaseSense: 'lag',
        angleSense: 'against',
        reason: 'x',
        targetOneX: '',
        startsAllowed: '',
        gradeTarget: undefined,
        cleaned: 'yes',
        nothingLoose: 'on',
        readingSteady: 'on',
        stateAgreed: 'on',
        setupConfirmed: 'on',
        standingSentence: 'on',
      }),
  },
  {
    name: 'recordRun',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      recordRun(foreigner, {
        jobId: (await homeJob(plant)).jobId,
        purpose: 'base',
        speedRpm: '990',
        unit: 'mm/s rms',
        vectors: [{ pointId: plant.home.pointIds[0], amplitude: '1', phaseDeg: '1', overall: '' }],
        clearOfRotor: 'on',
        namedPerson: 'Ida Berg',
      }),
  },
  {
    name: 'acceptBase',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      acceptBase(foreigner, { jobId: (await homeJob(plant)).jobId, reason: 'x' }),
  },
  {
    name: 'fitWeight',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      fitWeight(foreigner, {
        jobId: (await homeJob(plant)).jobId,
        purpose: 'trial',
        planeId: plant.home.planeIds[0],
        massG: '10',
        massSource: 'scale',
        radiusMm: '700',
        angleDeg: '0',
        angleSense: 'against',
        arcMm: '',
        fixing: 'clamp',
        fixingKind: 'temporary',
        noPhoto: 'later',
        ...ticks,
      }),
  },
  {
    name: 'settleTrial',
    expects: 'not-found',
    run: async (foreigner, plant, em) => {
      const { jobId } = await homeJob(plant);
      const weight = await em.findOneOrFail(Weight, { job: jobId });
      return settleTrial(foreigner, { jobId, weightId: weight.id, stays: 'taken off', ...ticks });
    },
  },
  {
    name: 'takeOffWeight',
    expects: 'not-found',
    run: async (foreigner, plant, em) => {
      const { jobId } = await homeJob(plant);
      const weight = await em.findOneOrFail(Weight, { job: jobId });
      return takeOffWeight(foreigner, { jobId, weightId: weight.id, reason: 'x', ...ticks });
    },
  },
  {
    name: 'acceptAnswer',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      acceptAnswer(foreigner, { jobId: (await homeJob(plant)).jobId, fingerprint: 'x' }),
  },
  {
    name: 'lineThroughRun',
    expects: 'not-found',
    run: async (foreigner, plant, em) => {
      const { jobId } = await homeJob(plant);
      const run = await em.findOneOrFail(Run, { job: jobId });
      return lineThroughRun(foreigner, { jobId, runId: run.id, reason: 'x' });
    },
  },
  {
    name: 'keepRun',
    expects: 'not-found',
    run: async (foreigner, plant, em) => {
      const { jobId } = await homeJob(plant);
      const run = await em.findOneOrFail(Run, { job: jobId });
      return keepRun(foreigner, { jobId, runId: run.id, reason: 'x' });
    },
  },
  {
    name: 'stopJob',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      stopJob(foreigner, {
        jobId: (await homeJob(plant)).jobId,
        outcome: 'stopped safe',
        reason: 'x',
        rotorState: 'x',
        safe: 'on',
      }),
  },
  {
    name: 'reuseCoefficients',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      reuseCoefficients(foreigner, {
        jobId: (await homeJob(plant)).jobId,
        sameSensors: 'on',
        sameMark: 'on',
        sameSupports: 'on',
        sameState: 'on',
      }),
  },
  {
    name: 'withdrawReuse',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      withdrawReuse(foreigner, { jobId: (await homeJob(plant)).jobId, reason: 'x' }),
  },
  {
    name: 'correctLedger',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      correctLedger(foreigner, {
        ...{ jobId: (await homeJob(plant)).jobId, weightId: 1, found: 'missing', reason: 'x' },
        ...{ massG: '', standingStill: 'on', namedPerson: 'x' },
      }),
  },
  {
    name: 'recordFoundWeight',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      recordFoundWeight(foreigner, {
        ...{ jobId: (await homeJob(plant)).jobId, planeId: plant.home.planeIds[0], massG: '5' },
        ...{ radiusMm: '700', angleDeg: '10', angleSense: 'against', arcMm: '', fixing: 'bolt' },
        ...{ standingStill: 'on', namedPerson: 'x' },
      }),
  },
  {
    name: 'confirmSlip',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      confirmSlip(foreigner, {
        ...{ jobId: (await homeJob(plant)).jobId, runId: 1, slip: 'not fitted', reason: 'x' },
      }),
  },
  {
    name: 'signJob',
    expects: 'not-found',
    run: async (foreigner, plant) =>
      signJob(foreigner, {
        jobId: (await homeJob(plant)).jobId,
        statement: 'x',
        permanentWeightIds: [],
        handBack: 'on',
        areaOwner: 'x',
      }),
  },
  {
    name: 'balanceJob',
    expects: 'null',
    run: async (foreigner, plant) => balanceJob(foreigner, (await homeJob(plant)).jobId),
  },
  {
    name: 'jobRecord',
    expects: 'null',
    run: async (foreigner, plant) => jobRecord(foreigner, (await homeJob(plant)).jobId),
  },
  {
    name: 'signedRecord',
    expects: 'null',
    run: async (foreigner, plant, em) => {
      const { jobId } = await homeJob(plant);
      const { personId, name } = plant.at('technician');
      em.create(SignOff, {
        job: jobId,
        person: personId,
        personName: name,
        role: 'technician',
        statement: 'Done.',
        at: new Date(),
        contentHash: '0'.repeat(64),
        content: {},
      });
      await em.flush();
      if (!(await signedRecord(plant.at('reader'), jobId))) throw new Error('nothing to hide');
      return signedRecord(foreigner, jobId);
    },
  },
  {
    name: 'newBalanceJob',
    expects: 'null',
    run: (foreigner, plant) => newBalanceJob(foreigner, plant.home.machineId),
  },
  {
    name: 'balanceJobs',
    expects: 'empty',
    run: async (foreigner, plant) => {
      await homeJob(plant);
      return balanceJobs(foreigner, undefined);
    },
  },
  {
    name: 'addPhoto',
    expects: 'not-found',
    run: async (foreigner, plant) => {
      const job = await homeJob(plant);
      const weightId = (await job.sheet()).weights[0]?.id ?? 0;
      return addPhoto(foreigner, { jobId: job.jobId, weightId, photo: await pngFile('fan.png') });
    },
  },
  {
    name: 'weightPhoto',
    expects: 'null',
    run: async (foreigner, plant) => {
      const job = await homeJob(plant);
      const weightId = (await job.sheet()).weights[0]?.id ?? 0;
      const input = { jobId: job.jobId, weightId, photo: await pngFile('home.png') };
      const { photoId } = valueOf(await addPhoto(job.actor, input));
      return weightPhoto(foreigner, { photoId, size: 'thumbnail' });
    },
  },
];
