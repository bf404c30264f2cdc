'use server';

import { action } from '@/lib/server/action';
import { solveRuns } from '@/lib/server/workbench/solve-runs';
import { split } from '@/lib/server/workbench/split';
import { tolerance } from '@/lib/server/workbench/tolerance';

export const solveRunsAction = action(solveRuns);
export const splitAction = action(split);
export const toleranceAction = action(tolerance);
