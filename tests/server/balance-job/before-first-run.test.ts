import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { LimitSet } from '@/entities/limit-set';
import { Machine, MachineEvent } from '@/entities/machine';
import { Person } from '@/entities/person';
import { Site } from '@/entities/site';
import { fitWeight } from '@/lib/server/commands/fit-weight';
import { recordRun } from '@/lib/server/commands/record-run';
import { openPlant } from '@/tests/support/open-plant';
import { seedMachine, type SeededMachine, type SmallPlant } from '@/tests/support/plant';
import { JobDriver, valueOf } from './job-driver';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let made = 0;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

async function aMachine(): Promise<SeededMachine> {
  made += 1;
  const site = await em.findOneOrFail(Site, plant.home.siteId);
  const limits = await em.findOneOrFail(LimitSet, plant.limitSetId);
  return seedMachine(em, site, limits, `PRE-${made}`);
}

const open = (machine: SeededMachine, over: { startsAllowed?: string } = {}) =>
  JobDriver.open(plant.at('technician'), machine, { kind: 'two-plane', speedRpm: 990, ...over });

const base = [
  { amp: 3.9, deg: 100 },
  { amp: 3.2, deg: 200 },
];

it('counts the starts that a job needs, fewer with the coefficient book', async () => {
  const { startsPlanned, startsAllowed } = await (
    await open(await aMachine(), { startsAllowed: '3' })
  ).sheet();
  // Base, two trials, check and trim.
  expect([startsPlanned, startsAllowed]).toEqual([5, 3]);
});

it('names neighbours whose speed lies within 3 %, and no others', async () => {
  const machine = await aMachine();
  const own = await em.findOneOrFail(Machine, machine.machineId);
  for (const [tag, nominalSpeedRpm] of [
    ['NEAR-1', 1005],
    ['FAR-1', 1030],
  ] as const) {
    const other = await em.findOneOrFail(Machine, (await aMachine()).machineId);
    em.assign(other, {
      area: own.area,
      nominalSpeedRpm,
      speedMaxRpm: 1100,
      tag: `${tag}-${made}`,
      tagKey: `${tag}-${made}`.toLowerCase(),
    });
  }
  await em.flush();
  const { neighbours } = await (await open(machine)).sheet();
  expect(neighbours).toMatchObject([{ speedRpm: 1005 }]);
});

it('tells of the last job on the rotor and of what happened since', async () => {
  const machine = await aMachine();
  const first = await JobDriver.open(plant.at('technician'), machine, {
    kind: 'check only',
    speedRpm: 990,
  });
  valueOf(await first.run('base', base));
  await first.acceptBase('One reading is asked for.');
  valueOf(await first.sign(''));
  em.create(MachineEvent, {
    machine: machine.machineId,
    at: new Date(),
    kind: 'repair',
    text: 'New isolators',
    person: em.getReference(Person, plant.at('technician').personId, { wrapped: true }),
  });
  await em.flush();
  const { lastJob } = await (await open(machine)).sheet();
  expect(lastJob).toMatchObject({
    id: first.jobId,
    before: 3.9,
    after: null,
    sameSetup: true,
    events: [{ kind: 'repair', text: 'New isolators' }],
  });
});

it('in zone D a trial weight needs an engineer, or one who is named', async () => {
  const job = await open(await aMachine());
  valueOf(
    await recordRun(job.actor, {
      jobId: job.jobId,
      purpose: 'base',
      speedRpm: '990',
      unit: 'mm/s rms',
      vectors: base.map(({ amp, deg }, index) => ({
        pointId: job.machine.pointIds[index],
        amplitude: String(amp),
        phaseDeg: String(deg),
        overall: index === 0 ? '4.6' : '3.9',
      })),
      clearOfRotor: 'on',
      namedPerson: 'Ida Berg',
    }),
  );
  await job.acceptBase('One base run.');
  expect((await job.sheet()).needsConsent).toBe(true);
  const weight = { g: 20, radius_mm: 700, deg: 0 };
  expect(await job.fit('trial', 0, weight)).toMatchObject({
    failure: { code: 'zone-d', field: 'consent' },
  });
  valueOf(
    await fitWeight(job.actor, {
      jobId: job.jobId,
      purpose: 'trial',
      planeId: job.machine.planeIds[0],
      massG: '20',
      massSource: 'scale',
      radiusMm: '700',
      angleDeg: '0',
      angleSense: 'against',
      arcMm: '',
      fixing: 'clamp',
      fixingKind: 'temporary',
      noPhoto: 'later',
      consent: 'Aldo Marsh',
      standingStill: 'on',
      fixingHolds: 'on',
      namedPerson: 'Ida Berg',
    }),
  );
});

it('asks about a trial weight that pulls twice the usual before the start, not after', async () => {
  const job = await open(await aMachine());
  valueOf(await job.run('base', base));
  await job.acceptBase('One base run.');
  // 200 g at 700 mm and 990 r/min pull 1505 N; half of 640 kg weighs 3138 N: 48 %.
  expect(await job.fit('trial', 0, { g: 200, radius_mm: 700, deg: 0 })).toMatchObject({
    failure: {
      code: 'trial-heavy',
      field: 'consent',
      message: expect.stringContaining('1505 N') as string,
    },
  });
  valueOf(await job.fit('trial', 0, { g: 20, radius_mm: 700, deg: 0 }));
});
