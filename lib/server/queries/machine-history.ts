import 'server-only';
import { Coefficient } from '@/entities/answer';
import { BalanceJob, Run, RunVector } from '@/entities/balance-job';
import type { Machine } from '@/entities/machine';
import { Plane, RotorStay } from '@/entities/rotor';
import { Site } from '@/entities/site';
import { Weight } from '@/entities/weight';
import type { Report } from '@/lib/schemas/report';
import { query, type QueryContext } from '../query';
import { ledgerPlanes } from '../register/rotor-book';
import type { HistoryGround } from '../report/history-ground';
import { historyReport } from '../report/history-report';
import { visibleMachine } from '../scope';

export type MachineHistoryDto = { machine: { id: number; tag: string }; report: Report };

/** Everything that balancing has left behind on a machine, as a report. */
export const machineHistory = query(
  'balanceJob:read',
  async (context, machineId: number): Promise<MachineHistoryDto | null> => {
    const machine = await visibleMachine(context, machineId);
    if (!machine) return null;
    const report = historyReport(await groundOf(context, machine));
    return { machine: { id: machine.id, tag: machine.tag }, report };
  },
);

async function groundOf(
  { em, actor, now }: QueryContext,
  machine: Machine,
): Promise<HistoryGround> {
  const here = { machine: machine.id };
  const { name, timeZone, decimalMark } = await em.findOneOrFail(Site, machine.site.id);
  const stays = await em.find(RotorStay, here, {
    orderBy: { fromAt: 'asc' },
    populate: ['rotor'],
  });
  const rotorIds = stays.map(({ rotor }) => rotor.id);
  const rotorNow = stays.find(({ toAt }) => !toAt)?.rotor.id ?? 0;
  const planes = await em.find(Plane, { rotor: rotorNow }, { orderBy: { order: 'asc' } });
  return {
    machine,
    site: { name, timeZone, decimalMark },
    stays,
    jobs: await em.find(BalanceJob, here, {
      orderBy: { openedAt: 'asc', id: 'asc' },
      populate: ['openedBy', 'rotor'],
    }),
    runs: await em.find(Run, { job: here }, { orderBy: { job: 'asc', number: 'asc' } }),
    vectors: await em.find(
      RunVector,
      { run: { job: here } },
      { orderBy: { id: 'asc' }, populate: ['point'] },
    ),
    weights: await em.find(
      Weight,
      { rotor: { $in: rotorIds } },
      {
        orderBy: { fittedAt: 'asc', id: 'asc' },
        populate: ['plane', 'position', 'fittedBy', 'endedBy', 'job', 'rotor'],
      },
    ),
    coefficients: await em.find(
      Coefficient,
      { job: here },
      { orderBy: { madeAt: 'asc', id: 'asc' }, populate: ['plane', 'point', 'setup', 'job'] },
    ),
    planes: await ledgerPlanes(em, rotorNow, planes),
    asked: { by: actor.name, at: now },
  };
}
