import 'server-only';
import type { EntityManager, Loaded } from '@mikro-orm/postgresql';
import { Run, RunVector, type WeightOnRotor } from '@/entities/balance-job';
import { Position } from '@/entities/rotor';
import { Weight } from '@/entities/weight';
import { otherOf, type SlipRepair } from '@/lib/domain/balance-job/slip-repair';
import { lagDeg } from '@/lib/domain/units';
import type { LoadedJob, LoadedRun, LoadedWeight } from './load-job';
import { runsWithTrials, trialsStillOn } from './trials-still-on';

type By = { em: EntityManager; personId: number; now: Date };
type Repaired = ReadonlyMap<number, Weight | null>;

/** The job's own weights that hang in a run and did not in the kept run before it. */
export function fittedIds({ runs, weights }: LoadedJob, { run }: LoadedRun): Set<number> {
  const before = runs.findLast((one) => one.run.number < run.number && one.run.state === 'kept');
  const known = new Set(before?.run.weightsState.map(({ weightId }) => weightId));
  const own = new Set(weights.map(({ id }) => id));
  const ids = run.weightsState.map(({ weightId }) => weightId);
  return new Set(ids.filter((id) => own.has(id) && !known.has(id)));
}

/**
 * Ledger entries that were recorded wrongly are ended, and newer ones say what really hung there. Hands
 * back which weight stands for which, null for one that never was on the rotor.
 */
export async function repairWeights(
  by: By,
  loaded: LoadedJob,
  of: { repair: SlipRepair; check: LoadedRun; reason: string },
): Promise<Repaired> {
  const seen = {
    repair: of.repair,
    fitted: fittedIds(loaded, of.check),
    inCheck: new Set(of.check.run.weightsState.map(({ weightId }) => weightId)),
    trialsOn: trialsStillOn(loaded, of),
  };
  const repaired = new Map<number, Weight | null>();
  for (const weight of loaded.weights) {
    const fate = fateOf(weight, seen);
    if (!fate) continue;
    repaired.set(weight.id, await anew(by, weight, fate));
    by.em.assign(weight, {
      endedAt: weight.endedAt ?? by.now,
      ending: fate.ending,
      endedBy: weight.endedBy ?? by.personId,
      endReason: of.reason,
    });
  }
  await by.em.flush();
  return repaired;
}

type Fate = {
  facts: Facts | null;
  stillOn: boolean;
  ending: 'recorded wrongly' | 'found missing';
};

type Seen = {
  repair: SlipRepair;
  fitted: Set<number>;
  inCheck: Set<number>;
  trialsOn: Set<number>;
};

/** What the slip says of a weight; null where its entry stands. */
function fateOf(weight: LoadedWeight, { repair, fitted, inCheck, trialsOn }: Seen): Fate | null {
  const facts = factsOf(weight);
  const fate = { stillOn: false, ending: 'recorded wrongly' as const };
  if (repair.weights === 'all' || (repair.weights === 'fitted' && fitted.has(weight.id)))
    return { ...fate, facts: repair.weight(facts) };
  if (trialsOn.has(weight.id)) return { ...fate, facts, stillOn: true };
  if (repair.earlierGone && inCheck.has(weight.id) && !fitted.has(weight.id))
    return { ...fate, facts: null, ending: 'found missing' };
  return null;
}

/** Kept runs that say something else now are lined through, and a newer run says what really was. */
export function repairRuns(
  by: By,
  loaded: LoadedJob,
  of: { repair: SlipRepair; check: LoadedRun; repaired: Repaired; words: string },
): number[] {
  let number = loaded.runs.at(-1)?.run.number ?? 0;
  const replaced: number[] = [];
  const touched = runsWithTrials(loaded, of);
  for (const one of loaded.runs.filter(({ run }) => run.state === 'kept')) {
    const isCheck = one.run.id === of.check.run.id;
    const weightsState = stateAnew(one.run, touched.has(one.run.id), of);
    const turned = isTurned(of.repair, isCheck);
    if (!weightsState && !turned) continue;
    number += 1;
    const run = by.em.create(Run, {
      ...factsOfRun(one.run),
      number,
      weightsState: weightsState ?? one.run.weightsState,
      person: by.personId,
      createdAt: by.now,
      replaces: one.run,
    });
    for (const vector of one.vectors)
      by.em.create(RunVector, { run, ...vectorAnew(loaded, vector, turned ? of.repair : null) });
    by.em.assign(one.run, {
      state: 'lined through',
      stateReason: `Corrected by run ${number}: ${of.words}`,
    });
    replaced.push(one.run.number);
  }
  return replaced;
}

function isTurned({ vectors }: SlipRepair, isCheck: boolean): boolean {
  return vectors === 'mirrored' || (isCheck && vectors !== 'as entered');
}

function factsOfRun({ job, purpose, takenAt, speedRpm, setup, stateReason }: Run) {
  return { job, purpose, takenAt, speedRpm, setup, stateReason, state: 'kept' as const };
}

function stateAnew(
  run: Run,
  isTouched: boolean,
  { repair, repaired }: { repair: SlipRepair; repaired: Repaired },
): WeightOnRotor[] | null {
  // Trials put on again, and a weight that was gone, change the check run; one that stayed on, all since its run.
  const trialsOn = repair.trialsOn || repair.stayedTrial !== null;
  const onlySome = trialsOn || repair.earlierGone;
  if (onlySome && !isTouched) return null;
  if (!onlySome && !run.weightsState.some(({ weightId }) => repaired.has(weightId))) return null;
  const known = run.weightsState.flatMap((weight) => {
    const stands = repaired.get(weight.weightId);
    if (stands === undefined) return weight;
    return stands ? onRotor(stands) : [];
  });
  const trials = trialsOn ? [...repaired.values()].filter((weight) => weight !== null) : [];
  return [...known, ...trials.map(onRotor)];
}

function onRotor({ id, plane, massG, radiusMm, angleDeg }: Weight): WeightOnRotor {
  return { weightId: id, planeId: plane.id, massG, radiusMm, angleDeg };
}

function vectorAnew(loaded: LoadedJob, vector: RunVector, repair: SlipRepair | null) {
  const { point, amplitude, overall, entered, record } = vector;
  const same = { point, amplitude, lagDeg: vector.lagDeg, overall, entered, record };
  if (!repair) return same;
  if (repair.vectors === 'points swapped')
    return {
      ...same,
      point: otherOf(
        loaded.points.map(({ id }) => id),
        point.id,
      ),
    };
  // A vector computed from a waveform with tacho is lag whatever a display shows.
  if (!entered) return same;
  const phaseSense = entered.phaseSense === 'lag' ? ('lead' as const) : ('lag' as const);
  return { ...same, lagDeg: lagDeg(-vector.lagDeg), entered: { ...entered, phaseSense } };
}

type Facts = { planeId: number; massG: number; radiusMm: number; angleDeg: number };

function factsOf({ plane, massG, radiusMm, angleDeg }: LoadedWeight): Facts {
  return { planeId: plane.id, massG, radiusMm, angleDeg };
}

async function anew(
  { em }: By,
  weight: LoadedWeight,
  { facts, stillOn }: Fate,
): Promise<Weight | null> {
  if (!facts) return null;
  const { rotor, massSource, purpose, answerNumber, fixing, permanent, fittedAt, job } = weight;
  const ended = stillOn
    ? { stays: true }
    : {
        stays: weight.stays,
        endedAt: weight.endedAt,
        ending: weight.ending,
        endedBy: weight.endedBy,
        endReason: weight.endReason,
      };
  return em.create(Weight, {
    ...{ rotor, massSource, purpose, answerNumber, fixing, permanent, fittedAt, job, ...ended },
    plane: facts.planeId,
    position: await positionAt(em, weight, facts),
    massG: facts.massG,
    radiusMm: facts.radiusMm,
    angleDeg: facts.angleDeg,
    entered: enteredAnew(weight, facts),
    fittedBy: weight.fittedBy,
    replaces: weight,
  });
}

/** Counted the other way, what was typed stays and its sense turns; otherwise the angle is given anew. */
function enteredAnew({ entered, angleDeg }: Weight, facts: Facts): Weight['entered'] {
  if (facts.angleDeg === angleDeg) return entered;
  const mirrored = Math.abs(lagDeg(-angleDeg) - facts.angleDeg) < 1e-9;
  if (mirrored)
    return { ...entered, angleSense: entered.angleSense === 'with' ? 'against' : 'with' };
  return { angleDeg: facts.angleDeg, angleSense: 'against' };
}

async function positionAt(
  em: EntityManager,
  weight: Loaded<Weight, 'plane'>,
  { planeId, angleDeg }: Facts,
): Promise<Position | null> {
  if (!weight.position) return null;
  return em.findOne(Position, {
    plane: planeId,
    angleDeg: { $gte: angleDeg - NEAR_DEG, $lte: angleDeg + NEAR_DEG },
  });
}

const NEAR_DEG = 0.01;
