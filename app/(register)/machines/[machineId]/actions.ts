'use server';

import { routes } from '@/lib/routes';
import { action } from '@/lib/server/action';
import {
  editMachine,
  newSetup,
  recordEvent,
  restoreMachine,
  retireMachine,
  chooseLimitSet,
} from '@/lib/server/commands/edit-machine';

const toMachine = ({ machineId }: { machineId: number }) => routes.machine(machineId);

export const recordEventAction = action(recordEvent);
export const editMachineAction = action(editMachine, toMachine);
export const retireMachineAction = action(retireMachine, toMachine);
export const restoreMachineAction = action(restoreMachine, toMachine);
export const newSetupAction = action(newSetup);
export const chooseLimitSetAction = action(chooseLimitSet);
