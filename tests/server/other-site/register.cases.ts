import { createMachine } from '@/lib/server/commands/create-machine';
import {
  chooseLimitSet,
  editMachine,
  newSetup,
  recordEvent,
  restoreMachine,
  retireMachine,
} from '@/lib/server/commands/edit-machine';
import { findMachines } from '@/lib/server/queries/find-machines';
import { machineForm, newMachineForm } from '@/lib/server/queries/machine-forms';
import { machinePage } from '@/lib/server/queries/machine-page';
import { plantBook } from '@/lib/server/queries/plant-book';
import { pointPage } from '@/lib/server/queries/point-page';
import { pointTrend } from '@/lib/server/queries/point-trend';
import type { OtherSiteCase } from '@/tests/support/other-site';
import { newMachine } from '../register/new-machine';

export const cases: OtherSiteCase[] = [
  {
    name: 'createMachine',
    expects: 'not-found',
    run: (foreigner, plant) => createMachine(foreigner, newMachine(plant, { tag: 'X-1' })),
  },
  {
    name: 'editMachine',
    expects: 'not-found',
    run: (foreigner, plant) => {
      const { rotorSerial: _serial, ...identity } = newMachine(plant);
      return editMachine(foreigner, { ...identity, machineId: plant.home.machineId, reason: 'x' });
    },
  },
  {
    name: 'retireMachine',
    expects: 'not-found',
    run: (foreigner, plant) =>
      retireMachine(foreigner, { machineId: plant.home.machineId, reason: 'x' }),
  },
  {
    name: 'restoreMachine',
    expects: 'not-found',
    run: (foreigner, plant) =>
      restoreMachine(foreigner, { machineId: plant.home.machineId, reason: 'x' }),
  },
  {
    name: 'recordEvent',
    expects: 'not-found',
    run: (foreigner, plant) =>
      recordEvent(foreigner, {
        machineId: plant.home.machineId,
        kind: 'other',
        text: 'x',
        breaksTrend: undefined,
      }),
  },
  {
    name: 'newSetup',
    expects: 'not-found',
    run: (foreigner, plant) =>
      newSetup(foreigner, {
        machineId: plant.home.machineId,
        mark: 'x',
        tachoDeg: '0',
        tachoEdge: 'rising',
        rotationFromDriveEnd: 'clockwise',
        reason: 'x',
      }),
  },
  {
    name: 'chooseLimitSet',
    expects: 'not-found',
    run: (foreigner, plant) =>
      chooseLimitSet(foreigner, {
        machineId: plant.home.machineId,
        limitSetId: plant.limitSetId,
        reason: 'x',
      }),
  },
  {
    name: 'findMachines',
    expects: 'empty',
    run: async (foreigner, plant) =>
      (await findMachines(foreigner, 'KX-2')).machines.filter(
        ({ id }) => id === plant.home.machineId,
      ),
  },
  {
    name: 'plantBook',
    expects: 'empty',
    run: async (foreigner, plant) =>
      (await plantBook(foreigner, { text: '', area: '', state: 'active' })).rows.filter(
        ({ siteId }) => siteId === plant.home.siteId,
      ),
  },
  {
    name: 'newMachineForm',
    expects: 'empty',
    run: async (foreigner, plant) => {
      const { sites, areas } = await newMachineForm(foreigner, undefined);
      return [
        ...sites.filter(({ id }) => id === plant.home.siteId),
        ...areas.filter(({ siteId }) => siteId === plant.home.siteId),
      ];
    },
  },
  {
    name: 'machineForm',
    expects: 'null',
    run: (foreigner, plant) => machineForm(foreigner, plant.home.machineId),
  },
  {
    name: 'machinePage',
    expects: 'null',
    run: (foreigner, plant) => machinePage(foreigner, plant.home.machineId),
  },
  {
    name: 'pointPage',
    expects: 'null',
    run: (foreigner, plant) => pointPage(foreigner, plant.home.pointIds[0]),
  },
  {
    name: 'pointTrend',
    expects: 'null',
    run: (foreigner, plant) => pointTrend(foreigner, plant.home.pointIds[0]),
  },
];
