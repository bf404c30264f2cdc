import { speedDifferencePct } from '@/lib/domain/balance-job/speed-difference';
import type { PlaneAnswer } from '@/lib/domain/balancing/build-answer';
import type { FittedWeight, JobInput, JobRun } from '@/lib/domain/balancing/job-input';
import type { JobSolution } from '@/lib/domain/balancing/job-solution';
import { readingNoise } from '@/lib/domain/balancing/reading-noise';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { proposeTrial } from '@/lib/domain/balancing/trial-proposal';
import { runBlocks } from '@/lib/domain/balancing/weight-steps';
import type { Result } from '@/lib/domain/result';
import { TARGET_MM_S, type SimJob } from './draw-job';
import { explanationOf, isMissed, type Explanation } from './explain-check';
import type { Outcome } from './outcome';
import { asMade, firstTrial, loadN } from './trial-choice';
import { Workshop } from './workshop';

type Correction = Pick<PlaneAnswer, 'planeId' | 'unbalanceGmm' | 'angleDeg'>;

/** Hold limit of the screens, per cent. */
const HOLD_PCT = 1;
const BASE_REPEATS = 3;
const TRIALS_AT_MOST = 3;
const HEAVIER = 1.2;
/** A trial at the force cap that is not heard: everything is read again, averaged so many times longer. */
const LONGER = 8;

/**
 * A job as the screens lead it: base read three times (again where it scatters), trial at the mark, a run off
 * in speed repeated, a trial that was not heard repeated with a heavier one, the offered answer (the
 * static pair where the exact one is withheld), a missed check run put to the slip tests, and one trim.
 */
export function productWay(job: SimJob): Outcome {
  const sheet = new RunSheet(job);
  const stopped = sheet.lead();
  const { shop } = sheet;
  return {
    slip: job.slip,
    worst: shop.worst,
    atEnd: shop.worstPoint(),
    starts: shop.starts,
    explainedBy: sheet.explainedBy,
    stopped,
  };
}

class RunSheet {
  readonly shop: Workshop;
  explainedBy: string | null = null;
  private input: JobInput;
  /** Corrections on the rotor, as the ledger has them. */
  private on: FittedWeight[] = [];
  private nextId = 1;

  constructor(private readonly job: SimJob) {
    this.shop = new Workshop(job);
    this.input = {
      unit: 'mm/s rms',
      planes: job.planes.map(({ radiusMm }, i) => ({ id: i + 1, name: `${i + 1}`, radiusMm })),
      points: job.sensors.map((_, i) => ({ id: i + 1, label: `point ${i + 1}` })),
      runs: [],
      coefficientsFrom: { kind: 'learning runs' },
      rotor: { massKg: job.rotor.massKg },
    };
  }

  /** The whole job; why it stopped early, or null. */
  lead(): string | null {
    let learned = this.learn((planeId) => firstTrialOf(this.job, planeId));
    if (learned === 'trial-too-small') {
      this.shop.averaging = LONGER;
      const last = this.input.runs.flatMap(({ weights }) => weights);
      this.input = { ...this.input, runs: [] };
      learned = this.learn(
        (id) => last.findLast(({ planeId }) => planeId === id) ?? firstTrialOf(this.job, id),
      );
    }
    return typeof learned === 'string' ? learned : this.correct(learned);
  }

  /** Base and trial runs, and what they are solved to; or why there is no answer. */
  private learn(trialOf: (planeId: number) => FittedWeight): JobSolution | string {
    this.takeBase();
    for (const { id } of this.input.planes) this.trial({ ...trialOf(id) });
    return this.learned();
  }

  private takeBase(): void {
    this.record(this.shop.start('base', BASE_REPEATS), []);
    const noise = readingNoise(this.input, runBlocks(this.input.runs, this.input.points));
    if (noise.some(({ base }) => base?.good === false))
      this.record(this.shop.start('base', BASE_REPEATS), []);
  }

  private trial(weight: FittedWeight): void {
    this.shop.fit(weight, 'trial');
    this.runHeld('trial', [weight]);
    this.shop.takeOff(weight);
  }

  /** Solves; a trial that was not heard is repeated heavier. */
  private learned(): JobSolution | string {
    for (let attempt = 1; ; attempt += 1) {
      const solved = this.weighed(solveJob({ ...this.input, weightsNow: [] }));
      if (!solved.ok) return solved.failure.code;
      const { answer, withheld } = solved.value;
      if (answer) return solved.value;
      const code = withheld?.failure.code ?? 'no answer';
      if (code !== 'trial-too-small' || attempt === TRIALS_AT_MOST) return code;
      if (!this.heavierTrials(solved.value)) return code;
    }
  }

  /** Where the product doubts the mass of a trial, it is weighed again and solved again. */
  private weighed(solved: Result<JobSolution>): Result<JobSolution> {
    const doubted = solved.ok && solved.value.notices.some(({ code }) => code === 'trial-heavy');
    if (!doubted) return solved;
    const runs = this.input.runs.map((run) => ({
      ...run,
      weights: run.weights.map((weight) => this.shop.weighedAgain(weight)),
    }));
    this.input = { ...this.input, runs };
    return solveJob({ ...this.input, weightsNow: [] });
  }

  /** Whether a heavier trial could be made for every plane that was not heard. */
  private heavierTrials(solution: JobSolution): boolean {
    const weak = solution.trials.filter(({ verdict }) => verdict === 'refuse');
    return weak.every((check) => {
      const run = this.input.runs.find(({ id }) => id === check.runId);
      const weight = run?.weights[0];
      if (!weight) return false;
      const change = Math.max(...check.points.map(({ changeAmplitude }) => changeAmplitude));
      const amplitudeNow = Math.max(...solution.model.asFound.map(({ amplitude }) => amplitude));
      const { massG } = proposeTrial({
        radiusMm: weight.radiusMm,
        speedRpm: this.job.speedRpm,
        rotorMassKg: this.job.rotor.massKg,
        bearingLoadN: loadN(this.job),
        response: { perGmm: change / (weight.massG * weight.radiusMm), amplitudeNow },
      });
      if (massG < HEAVIER * weight.massG) return false;
      this.input = { ...this.input, runs: this.input.runs.filter(({ id }) => id !== check.runId) };
      this.trial(asMade({ ...weight, massG }));
      return true;
    });
  }

  /** First correction, what a missed check run asks for, and one trim; why it stopped, or null. */
  private correct(first: JobSolution): string | null {
    let solution = first;
    let next = addOf(first);
    let trimmed = false;
    for (;;) {
      const then = this.fitAndCheck(next, solution);
      if (then === 'met') return null;
      if (typeof then !== 'string') {
        next = then;
        continue;
      }
      if (trimmed) return 'target not met after a trim';
      if (then === 'rougher') return this.allOff();
      trimmed = true;
      const trim = this.trim();
      if (typeof trim === 'string') return trim;
      solution = trim;
      next = addOf(trim);
    }
  }

  /** Solved with what hangs there now; or why there is no answer. */
  private trim(): JobSolution | string {
    const solved = solveJob({ ...this.input, weightsNow: this.on });
    if (!solved.ok) return solved.failure.code;
    const { answer, withheld } = solved.value;
    return answer ? solved.value : (withheld?.failure.code ?? 'no answer');
  }

  /** Fits, checks, and says what is next: nothing, what a slip asks for, a trim, or to stop. */
  private fitAndCheck(
    next: readonly Correction[],
    solution: JobSolution,
  ): readonly Correction[] | 'met' | 'trim' | 'rougher' {
    const before = this.input;
    const fitted = next.map((one) => this.weightOf(one));
    fitted.forEach((weight) => this.shop.fit(weight, 'correction'));
    this.shop.fitted();
    this.on = [...this.on, ...fitted];
    const check = this.runHeld('check', this.on);
    if (check.vectors.every(({ amplitude }) => amplitude <= TARGET_MM_S)) return 'met';
    if (!isMissed(before, solution, check)) return 'trim';
    return this.explained(check, fitted)?.add ?? (this.isRougher() ? 'rougher' : 'trim');
  }

  /** What the slip tests say of a check run, at most once a job; the entries are put right by it. */
  private explained(check: JobRun, fitted: readonly FittedWeight[]): Explanation | null {
    if (this.explainedBy) return null;
    const told = explanationOf(this.input, check, fitted);
    if (!told) return null;
    this.explainedBy = told.slip;
    this.input = told.job;
    this.on = told.on;
    if (told.slip === 'angles counted with rotation') this.shop.countsRight = true;
    if (told.slip === 'lead read as lag') this.shop.entersLead = true;
    return told;
  }

  private isRougher(): boolean {
    return this.shop.worstPoint() > (this.shop.worst[0] ?? 0);
  }

  private allOff(): string {
    this.on.forEach((weight) => this.shop.takeOff(weight));
    return 'rougher and not explained: corrections taken off';
  }

  private weightOf({ planeId, unbalanceGmm, angleDeg }: Correction): FittedWeight {
    const radiusMm = this.job.planes[planeId - 1]?.radiusMm ?? 1;
    return asMade({ planeId, radiusMm, massG: unbalanceGmm / radiusMm, angleDeg });
  }

  /** A run; where its speed is off it is held, and made again. */
  private runHeld(purpose: 'trial' | 'check', weights: readonly FittedWeight[]): JobRun {
    for (;;) {
      const runs = this.shop.start(purpose);
      const off = speedDifferencePct(
        this.input.runs.map(({ speedRpm }) => speedRpm),
        runs[0]?.speedRpm ?? 0,
      );
      if ((off ?? 0) > HOLD_PCT) continue;
      const [run] = this.record(runs, weights);
      if (run) return run;
    }
  }

  private record(
    runs: readonly Omit<JobRun, 'id' | 'weights'>[],
    weights: readonly FittedWeight[],
  ): JobRun[] {
    const entered = runs.map((run) => ({
      ...run,
      id: this.nextId++,
      weights: weights.filter(({ massG }) => massG > 0),
    }));
    this.input = { ...this.input, runs: [...this.input.runs, ...entered] };
    return entered;
  }
}

/** The product proposes the mark, where the trial is right whichever way degrees are counted. */
function firstTrialOf(job: SimJob, planeId: number): FittedWeight {
  return firstTrial(job, planeId, job.markReachable ? 0 : job.trialDeg);
}

function addOf({ answer }: JobSolution): readonly Correction[] {
  return answer?.add ?? [];
}
