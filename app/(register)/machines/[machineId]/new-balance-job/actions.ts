'use server';

import { action } from '@/lib/server/action';
import { openBalanceJob } from '@/lib/server/commands/open-balance-job';

export const openBalanceJobAction = action(openBalanceJob);
