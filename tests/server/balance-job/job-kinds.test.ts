import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { LimitSet } from '@/entities/limit-set';
import { MachineEvent } from '@/entities/machine';
import { Plane } from '@/entities/rotor';
import { Point } from '@/entities/bearing';
import { Site } from '@/entities/site';
import { add, angleDeg, fromPolar, multiply, size, sum, ZERO } from '@/lib/domain/complex';
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
  return seedMachine(em, site, limits, `KIND-${made}`);
}

describe('a check only', () => {
  const open = async (over: { targetOneX?: string } = {}) =>
    JobDriver.open(plant.at('technician'), await aMachine(), {
      kind: 'check only',
      speedRpm: 990,
      ...over,
    });

  it('goes from its readings to the signature, and says that nothing was hung', async () => {
    const job = await open();
    valueOf(
      await job.run('base', [
        { amp: 1.2, deg: 40 },
        { amp: 0.9, deg: 70 },
      ]),
    );
    await job.acceptBase('One reading is asked for.');
    const sheet = await job.sheet();
    expect(sheet.planes).toEqual([]);
    expect(sheet.step).toEqual({ step: 'decide' });
    valueOf(await job.sign(''));
    const machine = job.machine.machineId;
    const events = await em.fork().find(MachineEvent, { machine, balanceJobId: job.jobId });
    expect(events).toMatchObject([{ kind: 'other', breaksTrend: false }]);
  });

  it('above its 1x target is signed with a reason only', async () => {
    const job = await open({ targetOneX: '1.0' });
    valueOf(
      await job.run('base', [
        { amp: 1.2, deg: 40 },
        { amp: 0.9, deg: 70 },
      ]),
    );
    await job.acceptBase('One reading is asked for.');
    expect(await job.sign('')).toMatchObject({ failure: { code: 'reason-needed' } });
    valueOf(await job.sign('A balance job follows.'));
  });

  it('takes no plane', async () => {
    const machine = await aMachine();
    const opened = JobDriver.open(plant.at('technician'), machine, {
      kind: 'check only',
      speedRpm: 990,
      planeIds: [machine.planeIds[0]],
    });
    await expect(opened).rejects.toThrow(/Choose no plane/);
  });
});

describe('two planes, a part only', () => {
  const base = [
    { amp: 3.9, deg: 100 },
    { amp: 3.2, deg: 200 },
  ];
  const answerOf = async (kind: 'static only' | 'couple only') => {
    const job = await JobDriver.open(plant.at('technician'), await aMachine(), {
      kind,
      speedRpm: 990,
    });
    valueOf(await job.run('base', base));
    await job.acceptBase('One base run.');
    for (const plane of [0, 1])
      await job.trial(
        plane,
        { g: 20, radius_mm: 700, deg: 0 },
        {
          readings: [
            { amp: plane === 0 ? 3.1 : 3.8, deg: 110 },
            { amp: plane === 0 ? 3.1 : 2.5, deg: 190 },
          ],
          stays: 'taken off',
        },
      );
    return job.accept();
  };

  it('static only asks for the same in both planes, couple only for the opposite', async () => {
    const [one, other] = (await answerOf('static only')).planes;
    expect(one?.massG).toBeCloseTo(other?.massG ?? 0, 9);
    expect(one?.angleDeg).toBeCloseTo(other?.angleDeg ?? 0, 9);
    const [first, second] = (await answerOf('couple only')).planes;
    expect(first?.massG).toBeCloseTo(second?.massG ?? 0, 9);
    expect(Math.abs((first?.angleDeg ?? 0) - (second?.angleDeg ?? 0))).toBeCloseTo(180, 9);
  });
});

describe('three planes', () => {
  /** Answers of three points to a g·mm in three planes, and what the points show as found. */
  const H = [
    [fromPolar(2e-4, 30), fromPolar(0.8e-4, 50), fromPolar(0.3e-4, 10)],
    [fromPolar(0.7e-4, 60), fromPolar(2.2e-4, 80), fromPolar(0.9e-4, 100)],
    [fromPolar(0.2e-4, 300), fromPolar(0.8e-4, 320), fromPolar(1.9e-4, 340)],
  ];
  const asFound = [fromPolar(3.1, 20), fromPolar(4.4, 140), fromPolar(2.6, 260)];
  type Hung = { plane: number; g: number; deg: number };
  const readings = (hung: readonly Hung[]) =>
    H.map((row, p) => {
      const effects = hung.map(({ plane, g, deg }) =>
        multiply(row[plane] ?? ZERO, fromPolar(g * 700, deg)),
      );
      const v = add(asFound[p] ?? ZERO, sum(effects));
      return { amp: size(v), deg: angleDeg(v) };
    });

  it('are learned one by one and solved together', async () => {
    const machine = await aMachine();
    const middle = em.create(Plane, {
      rotor: machine.rotorId,
      name: 'M',
      order: 3,
      fromAM: 0.95,
      radiusMm: 700,
    });
    const third = em.create(Point, {
      machine: machine.machineId,
      bearing: machine.bearingIds[0],
      label: 'A-A',
      direction: 'A',
      order: 3,
    });
    await em.flush();
    const planeIds = [...machine.planeIds, middle.id];
    const pointIds = [...machine.pointIds, third.id];
    const job = await JobDriver.open(
      plant.at('technician'),
      { ...machine, planeIds, pointIds } as unknown as SeededMachine,
      { kind: 'three or more planes', speedRpm: 990, planeIds, pointIds },
    );
    valueOf(await job.run('base', readings([])));
    await job.acceptBase('One base run.');
    for (const plane of [0, 1, 2]) {
      const trial = { plane, g: 20, deg: 0 };
      await job.trial(
        plane,
        { g: 20, radius_mm: 700, deg: 0 },
        { readings: readings([trial]), stays: 'taken off' },
      );
    }
    const answer = await job.accept();
    expect(answer.planes).toHaveLength(3);
    const fitted: Hung[] = [];
    for (const [plane, { massG, angleDeg: deg }] of answer.planes.entries()) {
      fitted.push({ plane, g: massG, deg });
      valueOf(await job.fit('correction', plane, { g: massG, radius_mm: 700, deg }));
    }
    // With the answer on, the rotor that made the readings runs still.
    for (const { amp } of readings(fitted)) expect(amp).toBeLessThan(1e-9);
    valueOf(
      await job.run(
        'check',
        readings(fitted).map(() => ({ amp: 0, deg: 0 })),
      ),
    );
    expect((await job.sheet()).step.step).toBe('decide');
  });
});
