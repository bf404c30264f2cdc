'use server';

import { action } from '@/lib/server/action';
import { combine } from '@/lib/server/workbench/combine';
import { pieces } from '@/lib/server/workbench/pieces';
import { sixPlaces } from '@/lib/server/workbench/six-places';
import { solveRuns } from '@/lib/server/workbench/solve-runs';
import { split } from '@/lib/server/workbench/split';
import { tolerance } from '@/lib/server/workbench/tolerance';
import { trialWeight } from '@/lib/server/workbench/trial-weight';
import { withoutPhase } from '@/lib/server/workbench/without-phase';

export const solveRunsAction = action(solveRuns);
export const splitAction = action(split);
export const toleranceAction = action(tolerance);
export const trialWeightAction = action(trialWeight);
export const withoutPhaseAction = action(withoutPhase);
export const piecesAction = action(pieces);
export const combineAction = action(combine);
export const sixPlacesAction = action(sixPlaces);
