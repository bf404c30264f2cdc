import 'server-only';
import type { Weight } from '@/entities/weight';
import { choosePositions, type PositionChoice } from '@/lib/domain/balancing/choose-positions';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { permissibleUnbalance } from '@/lib/domain/balancing/permissible-unbalance';
import { predictAdded } from '@/lib/domain/balancing/predict-run';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { fromPolar, type Complex } from '@/lib/domain/complex';
import type { PlaneDto } from '@/lib/schemas/balance-job';
import type { PlacementDto } from '@/lib/schemas/balance-job-parts';
import { jobInput } from './job-input';
import type { LoadedJob } from './load-job';

type Task = { input: JobInput; solution: JobSolution; answerNumber: number | null };

/** Where no grade is stated, a tenth of what is wanted may remain; and a quarter of a grade's allowance. */
const SHARE_OF_WANTED = 0.1;
const SHARE_OF_GRADE = 0.25;
/** Without a stock of pieces the weights are cut to whole grams. */
const WHOLE_GRAMS = 1;

/** The answer in hand put on the fixed positions of its planes, with the room that the ledger leaves. */
export function placements(
  loaded: LoadedJob,
  planes: readonly PlaneDto[],
  onRotor: readonly Weight[],
): PlacementDto[] {
  const fixed = planes.filter(({ kind, positions }) => kind !== 'free' && positions.length > 0);
  const task = fixed.length > 0 ? taskOf(loaded) : null;
  if (!task) return [];
  return fixed.flatMap((plane) => placement(task, plane, { loaded, onRotor }));
}

function taskOf(loaded: LoadedJob): Task | null {
  const { step } = loaded.step;
  const newest = loaded.answers.at(-1);
  if (step === 'fit correction' && newest) return solved(newest.inputs, newest.number);
  return step === 'answer' || step === 'decide' ? solved(jobInput(loaded), null) : null;
}

function solved(input: JobInput, answerNumber: number | null): Task | null {
  const solution = solveJob(input);
  return solution.ok ? { input, solution: solution.value, answerNumber } : null;
}

function placement(
  task: Task,
  plane: PlaneDto,
  { loaded, onRotor }: { loaded: LoadedJob; onRotor: readonly Weight[] },
): PlacementDto[] {
  const wanted = task.solution.answer?.add.find(({ planeId }) => planeId === plane.id);
  if (!wanted) return [];
  // The room before anything was hung for this answer, so that the plan stands while it is fitted.
  const before = onRotor.filter(
    (weight) =>
      weight.job?.id !== loaded.job.id ||
      task.answerNumber === null ||
      weight.answerNumber !== task.answerNumber,
  );
  const pieceG = plane.pieceG ?? WHOLE_GRAMS;
  const targetGmm = allowanceGmm(task) ?? SHARE_OF_WANTED * wanted.unbalanceGmm;
  const plan = choosePositions({
    wanted,
    positions: plane.positions.map((position) => ({
      ...position,
      radiusMm: plane.radiusMm,
      roomG: roomG(plane, position, before),
    })),
    piecesG: [pieceG],
    targetGmm,
  });
  const head = { planeId: plane.id, planeName: plane.name, pieceG, targetGmm };
  if (!plan.ok) return [{ ...head, failure: plan.failure.message, choices: [] }];
  const { choices, proposal } = plan.value;
  const shown = choices.map((choice) => ({
    ...choiceDto(task, plane, choice),
    proposed: choice === proposal,
  }));
  return [{ ...head, failure: null, choices: shown }];
}

function choiceDto({ input, solution }: Task, plane: PlaneDto, choice: PositionChoice) {
  const added = input.planes.map(({ id }): Complex => {
    const asked = solution.answer?.add.find(({ planeId }) => planeId === id);
    const given = id === plane.id ? choice.placed : asked;
    return fromPolar(given?.unbalanceGmm ?? 0, given?.angleDeg ?? 0);
  });
  const { weights, totalG, residualGmm, meetsTarget, proven } = choice;
  return {
    ...{ weights: [...weights], totalG, residualGmm, meetsTarget, proven },
    expected: predictAdded(solution, input, added).map(({ pointId, amplitude }) => ({
      label: input.points.find(({ id }) => id === pointId)?.label ?? '',
      amplitude,
    })),
  };
}

/** A quarter of what the grade allows in a plane; null where no grade is stated. */
function allowanceGmm({ input }: Task): number | null {
  const { rotor, planes } = input;
  if (!rotor?.balanceGrade || !rotor.serviceSpeedRpm) return null;
  const allowed = permissibleUnbalance(rotor.balanceGrade, rotor.massKg, rotor.serviceSpeedRpm);
  return allowed.ok ? (SHARE_OF_GRADE * allowed.value.totalGmm) / planes.length : null;
}

function roomG(
  plane: PlaneDto,
  position: PlaneDto['positions'][number],
  on: readonly Weight[],
): number | null {
  const here = on.filter((weight) => weight.plane.id === plane.id);
  const sum = (weights: readonly Weight[]) => weights.reduce((total, w) => total + w.massG, 0);
  const at = here.filter((weight) => weight.position?.id === position.id);
  const rooms = [
    ...(position.maxG === null ? [] : [position.maxG - sum(at)]),
    ...(plane.maxGTotal === null ? [] : [plane.maxGTotal - sum(here)]),
  ];
  return rooms.length === 0 ? null : Math.max(0, Math.min(...rooms));
}
