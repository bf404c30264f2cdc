import 'server-only';
import { LimitSet } from '@/entities/limit-set';
import { Area } from '@/entities/site';
import type { MachineFormDto, NewMachineDto } from '@/lib/schemas/register';
import { query } from '../query';
import { visibleMachine } from '../scope';

/** What the form for a new machine offers. */
export const newMachineForm = query(
  'register:edit',
  async ({ em, siteIds, actor }, _args: undefined): Promise<NewMachineDto> => {
    const areas = await em.find(
      Area,
      { site: { $in: siteIds }, parent: null },
      { orderBy: { name: 'asc' } },
    );
    const limitSets = await em.find(
      LimitSet,
      { state: 'in use', $or: [{ site: null }, { site: { $in: siteIds } }] },
      { orderBy: { title: 'asc' } },
    );
    return {
      sites: actor.sites.map(({ id, name }) => ({ id, name })),
      areas: areas.map(({ site, name }) => ({ siteId: site.id, name })),
      limitSets: limitSets.map(({ id, title, edition, bAb, bBc, bCd }) => ({
        id,
        label: `${title}, ${edition} (${bAb} / ${bBc} / ${bCd})`,
      })),
    };
  },
);

/** A machine's identity for its form. */
export const machineForm = query(
  'register:edit',
  async (context, machineId: number): Promise<MachineFormDto | null> => {
    const machine = await visibleMachine(context, machineId);
    if (!machine) return null;
    const area = await context.em.findOneOrFail(Area, machine.area.id);
    return {
      id: machine.id,
      tag: machine.tag,
      name: machine.name,
      kind: machine.kind,
      powerKw: machine.powerKw ?? null,
      speedMinRpm: machine.speedMinRpm,
      speedMaxRpm: machine.speedMaxRpm,
      nominalSpeedRpm: machine.nominalSpeedRpm,
      drive: machine.drive,
      lineHz: machine.lineHz,
      criticality: machine.criticality,
      support: machine.support,
      areaName: area.name,
      state: machine.state,
    };
  },
);
