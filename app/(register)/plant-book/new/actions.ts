'use server';

import { routes } from '@/lib/routes';
import { action } from '@/lib/server/action';
import { createMachine } from '@/lib/server/commands/create-machine';

export const createMachineAction = action(createMachine, ({ machineId }) =>
  routes.machine(machineId),
);
