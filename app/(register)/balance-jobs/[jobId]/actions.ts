'use server';

import { action } from '@/lib/server/action';
import { acceptAnswer } from '@/lib/server/commands/accept-answer';
import { acceptBase } from '@/lib/server/commands/accept-base';
import { correctLedger, recordFoundWeight } from '@/lib/server/commands/correct-ledger';
import { fitWeight } from '@/lib/server/commands/fit-weight';
import { recordRun } from '@/lib/server/commands/record-run';
import { reuseCoefficients, withdrawReuse } from '@/lib/server/commands/reuse-coefficients';
import { keepRun, lineThroughRun } from '@/lib/server/commands/settle-run';
import { settleTrial, takeOffWeight } from '@/lib/server/commands/settle-weight';
import { signJob } from '@/lib/server/commands/sign-job';
import { stopJob } from '@/lib/server/commands/stop-job';

export const recordRunAction = action(recordRun);
export const acceptBaseAction = action(acceptBase);
export const fitWeightAction = action(fitWeight);
export const reuseCoefficientsAction = action(reuseCoefficients);
export const withdrawReuseAction = action(withdrawReuse);
export const correctLedgerAction = action(correctLedger);
export const recordFoundWeightAction = action(recordFoundWeight);
export const settleTrialAction = action(settleTrial);
export const takeOffWeightAction = action(takeOffWeight);
export const acceptAnswerAction = action(acceptAnswer);
export const lineThroughRunAction = action(lineThroughRun);
export const keepRunAction = action(keepRun);
export const stopJobAction = action(stopJob);
export const signJobAction = action(signJob);
