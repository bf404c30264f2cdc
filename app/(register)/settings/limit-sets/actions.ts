'use server';

import { action } from '@/lib/server/action';
import { createLimitSet, retireLimitSet } from '@/lib/server/commands/limit-sets';

export const createLimitSetAction = action(createLimitSet);
export const retireLimitSetAction = action(retireLimitSet);
