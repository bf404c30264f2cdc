'use server';

import { routes } from '@/lib/routes';
import { action } from '@/lib/server/action';
import { openBalanceJob } from '@/lib/server/commands/open-balance-job';

export const openBalanceJobAction = action(openBalanceJob, ({ jobId }) => routes.balanceJob(jobId));
