'use server';

import { routes } from '@/lib/routes';
import { action } from '@/lib/server/action';
import {
  closePerson,
  createPerson,
  editPerson,
  reopenPerson,
  setPassword,
} from '@/lib/server/commands/people';

const toPeople = () => routes.people();

export const createPersonAction = action(createPerson);
export const editPersonAction = action(editPerson, toPeople);
export const setPasswordAction = action(setPassword);
export const closePersonAction = action(closePerson, toPeople);
export const reopenPersonAction = action(reopenPerson, toPeople);
