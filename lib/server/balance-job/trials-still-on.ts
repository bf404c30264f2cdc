import 'server-only';
import type { SlipRepair } from '@/lib/domain/balance-job/slip-repair';
import type { LoadedJob, LoadedRun } from './load-job';

type Told = { repair: SlipRepair; check: LoadedRun };

/** Ids of the trial weights that were recorded as taken off and, by the slip, were on. */
export function trialsStillOn(loaded: LoadedJob, told: Told): Set<number> {
  const { repair } = told;
  if (repair.trialsOn) {
    const inCheck = idsIn(told.check);
    const trials = loaded.weights.filter(({ purpose }) => purpose === 'trial');
    return new Set(trials.map(({ id }) => id).filter((id) => !inCheck.has(id)));
  }
  const stayed = stayedTrial(loaded, told);
  return new Set(stayed === null ? [] : [stayed]);
}

/** Ids of the runs in which they were on without being recorded: the check run, or all since their own run. */
export function runsWithTrials(loaded: LoadedJob, told: Told): Set<number> {
  const stayed = stayedTrial(loaded, told);
  if (stayed === null) return new Set([told.check.run.id]);
  const kept = keptRuns(loaded);
  const own = kept.findLastIndex((one) => idsIn(one).has(stayed));
  return new Set(kept.slice(own + 1).map(({ run }) => run.id));
}

/** The trial weight that stayed on since its run, counted in the order of the runs. */
function stayedTrial(loaded: LoadedJob, { repair, check }: Told): number | null {
  if (repair.stayedTrial === null) return null;
  const inCheck = idsIn(check);
  const takenOff = keptRuns(loaded)
    .filter(({ run }) => run.purpose === 'trial')
    .flatMap((one) => [...idsIn(one)])
    .filter((id) => !inCheck.has(id));
  return [...new Set(takenOff)][repair.stayedTrial] ?? null;
}

function keptRuns({ runs }: LoadedJob): LoadedRun[] {
  return runs.filter(({ run }) => run.state === 'kept');
}

function idsIn({ run }: LoadedRun): Set<number> {
  return new Set(run.weightsState.map(({ weightId }) => weightId));
}
