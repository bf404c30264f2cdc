import 'server-only';
import { Coefficient } from '@/entities/answer';
import { BalanceJob } from '@/entities/balance-job';
import { Point } from '@/entities/bearing';
import { Plane, RotorStay } from '@/entities/rotor';
import { Setup } from '@/entities/setup';
import type { NewJobDto } from '@/lib/schemas/balance-job';
import { planeDtos, pointDto, setupDto, weightDto, weightsOnRotor } from '../balance-job/places';
import { query } from '../query';
import { visibleMachine } from '../scope';

/** What opening a job on a machine needs; null where there is no machine, rotor or set-up. */
export const newBalanceJob = query(
  'balanceJob:open',
  async (context, machineId: number): Promise<NewJobDto | null> => {
    const { em } = context;
    const machine = await visibleMachine(context, machineId);
    if (!machine) return null;
    const stay = await em.findOne(
      RotorStay,
      { machine: machine.id, toAt: null },
      { populate: ['rotor'] },
    );
    const setup = await em.findOne(Setup, { machine: machine.id, validTo: null });
    if (!stay || !setup) return null;
    const rotor = stay.rotor.$;
    const planes = await em.find(Plane, { rotor: rotor.id }, { orderBy: { order: 'asc' } });
    const points = await em.find(
      Point,
      { machine: machine.id },
      { orderBy: { order: 'asc' }, populate: ['bearing'] },
    );
    const open = await em.findOne(BalanceJob, { rotor: rotor.id, closedAt: null });
    return {
      machine: {
        id: machine.id,
        tag: machine.tag,
        name: machine.name,
        confinedSpace: machine.confinedSpace,
      },
      rotorName: rotor.name,
      setup: setupDto(setup),
      planes: await planeDtos(em, planes),
      points: points.map(pointDto),
      ledger: (await weightsOnRotor(em, rotor.id)).map(weightDto),
      openJobId: open?.id ?? null,
      estimates: await em.count(Coefficient, { rotor: rotor.id }),
    };
  },
);
