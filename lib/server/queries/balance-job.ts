import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { SignOff } from '@/entities/caution';
import { OneXVector } from '@/entities/measured-record';
import { Person } from '@/entities/person';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import type { BalanceJobDto, RunDto } from '@/lib/schemas/balance-job';
import { answerDto } from '../balance-job/answer-dto';
import { asFitted } from '../balance-job/as-fitted';
import { baseRepeats } from '../balance-job/base-repeats';
import { beforeFirstRun } from '../balance-job/before-first-run';
import { bookPart } from '../balance-job/book-dto';
import { checkVerdict } from '../balance-job/check-verdict';
import { withEvidence } from '../balance-job/fit-evidence';
import { jobInput } from '../balance-job/job-input';
import { limitsOf } from '../balance-job/limits-of';
import { loadJob, type LoadedJob, type LoadedRun } from '../balance-job/load-job';
import { placements } from '../balance-job/placements';
import { planeDtos, pointDto, setupDto, weightDto, weightsOnRotor } from '../balance-job/places';
import { rotorAsItIsSince } from '../balance-job/run-vectors';
import { slipExplanations } from '../balance-job/slip-explanations';
import { toleranceDto, trialCheckDtos, trialProposal } from '../balance-job/solution-dto';
import { query } from '../query';
import { visibleJob } from '../scope';

/** Everything the run sheet, the answer card and the job record show. */
export const balanceJob = query('balanceJob:read', async (context, jobId: number) => {
  const job = await visibleJob(context, jobId);
  return job ? balanceJobDto(context.em, await loadJob(context.em, job)) : null;
});

/** The same for code that has loaded the job within its own transaction. */
export async function balanceJobDto(em: EntityManager, loaded: LoadedJob): Promise<BalanceJobDto> {
  const { job, points, weights } = loaded;
  const names = await namesOf(em, loaded);
  const rotorWeights = await weightsOnRotor(em, job.rotor.id);
  const planes = await planeDtos(em, loaded.planes);
  const limits = await limitsOf(em, job.machine.id);
  const check = checkVerdict(loaded);
  const { offered, ...book } = await bookPart(em, loaded);
  return {
    ...headOf(loaded, names),
    limits,
    ...(await beforeFirstRun(em, loaded, limits)),
    planes,
    points: points.map((point) => pointDto(point)),
    runs: loaded.runs.map((run) => runDto(run, names, loaded.runs)),
    weights: await withEvidence(
      em,
      weights.map((weight) => weightDto(weight)),
    ),
    olderWeights: await withEvidence(
      em,
      [
        ...rotorWeights.filter((weight) => weight.job?.id !== job.id),
        ...loaded.goneBefore,
        ...loaded.removed,
      ].map((weight) => weightDto(weight)),
    ),
    choices: await choicesOf(em, loaded),
    step: loaded.step,
    repeats: baseRepeats(loaded),
    ...arithmeticOf(loaded),
    ...book,
    trialProposal: trialProposal(loaded, offered),
    accepted: acceptedOf(loaded, names),
    placements: placements(loaded, planes, rotorWeights),
    asFitted: asFitted(loaded),
    check,
    slips: slipExplanations(loaded, planes, check),
    signOffs: await signOffsOf(em, job.id),
  };
}

type Names = ReadonlyMap<number, string>;

async function namesOf(em: EntityManager, { job, runs, answers }: LoadedJob): Promise<Names> {
  const ids = [
    job.openedBy.id,
    ...runs.map(({ run }) => run.person.id),
    ...answers.map((answer) => answer.acceptedBy.id),
  ];
  const people = await em.find(Person, { id: { $in: ids } });
  return new Map(people.map(({ id, name }) => [id, name]));
}

function headOf({ job }: LoadedJob, names: Names) {
  const { site, machine, rotor } = job;
  return {
    id: job.id,
    number: job.number,
    state: job.state,
    kind: job.kind,
    unit: job.unit,
    phaseSense: job.phaseSense,
    angleSense: job.angleSense,
    reason: job.reason,
    targets: job.targets,
    startsAllowed: job.startsAllowed ?? null,
    cleaned: job.cleaned ?? null,
    openedAt: job.openedAt.toISOString(),
    openedBy: names.get(job.openedBy.id) ?? '',
    closedAt: job.closedAt?.toISOString() ?? null,
    closingNote: job.closingNote ?? null,
    site: {
      id: site.id,
      name: site.$.name,
      timeZone: site.$.timeZone,
      decimalMark: site.$.decimalMark,
    },
    machine: {
      id: machine.id,
      tag: machine.$.tag,
      name: machine.$.name,
      nominalSpeedRpm: machine.$.nominalSpeedRpm,
    },
    rotor: {
      name: rotor.$.name,
      massKg: rotor.$.massKg ?? null,
      grade: rotor.$.balanceGrade ?? null,
      behaviour: rotor.$.behaviour,
    },
    setup: setupDto(job.setup.$),
  };
}

function runDto({ run, vectors }: LoadedRun, names: Names, runs: readonly LoadedRun[]): RunDto {
  return {
    id: run.id,
    number: run.number,
    purpose: run.purpose,
    takenAt: run.takenAt.toISOString(),
    speedRpm: run.speedRpm,
    state: run.state,
    stateReason: run.stateReason ?? null,
    corrects: runs.find((one) => one.run.id === run.replaces?.id)?.run.number ?? null,
    person: names.get(run.person.id) ?? '',
    vectors: vectors.map((vector) => ({
      pointId: vector.point.id,
      amplitude: vector.amplitude,
      lagDeg: vector.lagDeg,
      overall: vector.overall ?? null,
      entered: vector.entered ?? null,
      recordId: vector.record?.id ?? null,
    })),
    weightIds: run.weightsState.map(({ weightId }) => weightId),
  };
}

type Arithmetic = Pick<BalanceJobDto, 'answer' | 'answerFailure' | 'trialChecks' | 'tolerance'>;

/** What the runs say now. An answer is offered only at the steps where one may be accepted. */
function arithmeticOf(loaded: LoadedJob): Arithmetic {
  const { step } = loaded.step;
  const nothing = { answer: null, answerFailure: null, trialChecks: [], tolerance: null };
  const learned =
    loaded.reuse !== null ||
    loaded.answers.length > 0 ||
    loaded.runs.some(({ run }) => run.purpose === 'trial');
  if (!learned) return nothing;
  const input = jobInput(loaded);
  const solution = solveJob(input);
  const asked = step === 'answer' || step === 'decide';
  if (!solution.ok) return { ...nothing, answerFailure: asked ? solution.failure.message : null };
  return {
    ...(asked ? offered(input, solution.value, step) : { answer: null, answerFailure: null }),
    trialChecks: trialCheckDtos(input, solution.value),
    tolerance: toleranceDto(solution.value),
  };
}

function offered(input: JobInput, solution: JobSolution, step: 'answer' | 'decide') {
  const answer = answerDto(input, solution, step === 'decide' ? 'trim' : 'correction');
  const withheld = solution.withheld?.failure.message ?? 'These runs give no answer.';
  return { answer, answerFailure: answer ? null : withheld };
}

function acceptedOf({ answers }: LoadedJob, names: Names): BalanceJobDto['accepted'] {
  return answers.flatMap((answer) => {
    const dto = answerDto(answer.inputs, answer.result, answer.kind);
    if (!dto) return [];
    return {
      ...dto,
      number: answer.number,
      acceptedAt: answer.acceptedAt.toISOString(),
      acceptedBy: names.get(answer.acceptedBy.id) ?? '',
    };
  });
}

const CHOICES_PER_POINT = 5;

async function choicesOf(em: EntityManager, loaded: LoadedJob) {
  const { job, points } = loaded;
  if (job.closedAt) return [];
  const vectors = await em.find(
    OneXVector,
    {
      point: { $in: points.map((point) => point.id) },
      status: 'kept',
      lagDeg: { $ne: null },
      unit: job.unit,
      takenAt: { $gte: rotorAsItIsSince(loaded) },
    },
    { orderBy: { takenAt: 'desc' }, limit: 100 },
  );
  return points.map((point) => ({
    pointId: point.id,
    vectors: vectors
      .filter((vector) => vector.point.id === point.id)
      .slice(0, CHOICES_PER_POINT)
      .map((vector) => ({
        recordId: vector.record.id,
        takenAt: vector.takenAt.toISOString(),
        amplitude: vector.amplitude,
        lagDeg: vector.lagDeg ?? 0,
      })),
  }));
}

async function signOffsOf(em: EntityManager, jobId: number): Promise<BalanceJobDto['signOffs']> {
  return signOffDtos(await em.find(SignOff, { job: jobId }, { orderBy: { at: 'asc', id: 'asc' } }));
}

/** Signatures as a record shows them. */
export function signOffDtos(signed: readonly SignOff[]): BalanceJobDto['signOffs'] {
  return signed.map(({ personName, role, statement, at, contentHash }) => ({
    personName,
    role,
    statement,
    at: at.toISOString(),
    contentHash,
  }));
}
