import type { SmallPlant } from '@/tests/support/plant';
import { signJob } from '@/lib/server/commands/sign-job';
import { JobDriver, valueOf } from '../balance-job/job-driver';
import scenarios from '../balance-job/scenarios.json';

const { inputs } = scenarios.S02;

/** The two-plane scenario S02 up to its check run. */
export async function checkedJob(plant: SmallPlant, machine = plant.home): Promise<JobDriver> {
  const job = await JobDriver.open(plant.at('technician'), machine, {
    kind: 'two-plane',
    speedRpm: 990,
  });
  valueOf(await job.run('base', inputs.base));
  await job.acceptBase('One base run: the stop is short.');
  for (const [plane, { run, ...weight }] of inputs.trial.entries())
    await job.trial(plane, weight, { readings: run, stays: 'taken off' });
  await job.accept();
  for (const [plane, weight] of inputs.installed.entries())
    valueOf(await job.fit('correction', plane, weight));
  valueOf(await job.run('check', inputs.check_run));
  return job;
}

/** The same, signed by the technician. */
export async function signedJob(plant: SmallPlant, machine = plant.home): Promise<JobDriver> {
  const job = await checkedJob(plant, machine);
  const { weights } = await job.sheet();
  valueOf(
    await signJob(plant.at('technician'), {
      jobId: job.jobId,
      statement: 'Done as recorded.',
      permanentWeightIds: weights.filter(({ endedAt }) => endedAt === null).map(({ id }) => id),
      handBack: 'on',
      areaOwner: 'Marta Lowe',
      reason: 'The prediction was missed by little.',
    }),
  );
  return job;
}
