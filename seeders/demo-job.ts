import type { EntityManager } from '@mikro-orm/postgresql';
import { oneXVectors, vibrationAt } from '@/lib/domain/plant-model/vibration-at';
import { influenceOf } from '@/lib/domain/plant-model/influence';
import { measure } from '@/lib/domain/plant-model/measure';
import type { RandomSource } from '@/lib/domain/plant-model/random-source';
import { size } from '@/lib/domain/complex';
import type { Result } from '@/lib/domain/result';
import type { Actor } from '@/lib/schemas/actor';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import { atTime } from '@/lib/server/clock';
import { acceptAnswer } from '@/lib/server/commands/accept-answer';
import { acceptBase } from '@/lib/server/commands/accept-base';
import { fitWeight } from '@/lib/server/commands/fit-weight';
import { openBalanceJob } from '@/lib/server/commands/open-balance-job';
import { recordRun } from '@/lib/server/commands/record-run';
import { settleTrial } from '@/lib/server/commands/settle-weight';
import { signJob } from '@/lib/server/commands/sign-job';
import { balanceJob } from '@/lib/server/queries/balance-job';
import type { DemoCalendar } from './demo-calendar';
import { ledgerOf, weightsOn } from './demo-ledger';
import type { DemoMachine } from './demo-machine';

/** A balance job of the demo's past. */
export type JobPlan = {
  readonly tag: string;
  /** Day of the models it was done on. */
  readonly day: number;
  /** Address of the person who did it. */
  readonly by: string;
  readonly reason: string;
  readonly trials: 'taken off' | 'stays on';
  readonly targetOneX: number;
  readonly areaOwner: string;
};

const STEP_MIN = 11;
const START_HOUR = 13;
const SCATTER = { absoluteMmS: 0.015, relative: 0.004 };
const FIXING = 'clamp with locked screw';
const READ_AT = ['A-H', 'B-H'];

/** Carries a job through the commands that the screens call, with readings of the machine's model. */
export class DemoJob {
  private minutes = 0;
  private jobId = 0;

  constructor(
    private readonly em: EntityManager,
    private readonly machine: DemoMachine,
    private readonly plan: JobPlan,
    private readonly means: { actor: Actor; calendar: DemoCalendar; random: RandomSource },
  ) {}

  /** The whole job: base, a trial in each plane, answer, check, a trim where wanted, signature. */
  async finish(): Promise<void> {
    await this.open();
    await this.base();
    for (const plane of this.machine.planeIds.keys()) {
      await this.trial(plane);
      await this.settle();
    }
    await this.correct();
    if (await this.isMissed()) await this.correct();
    await this.sign();
  }

  async open(): Promise<void> {
    const { machineId, planeIds } = this.machine;
    const { reason, targetOneX } = this.plan;
    const opened = await this.step((actor) =>
      openBalanceJob(actor, {
        machineId,
        kind: planeIds.length === 1 ? 'one-plane' : 'two-plane',
        planeIds: [...planeIds],
        pointIds: this.points().map(({ id }) => id),
        unit: 'mm/s rms',
        phaseSense: 'lag',
        angleSense: 'against',
        reason,
        targetOneX,
        startsAllowed: 8,
        gradeTarget: 'on',
        cleaned: 'yes',
        nothingLoose: 'on',
        readingSteady: 'on',
        stateAgreed: 'on',
        setupConfirmed: 'on',
        standingSentence: 'on',
      }),
    );
    this.jobId = opened.jobId;
  }

  async base(): Promise<void> {
    for (let i = 0; i < 3; i++) await this.run('base');
    const input = {
      jobId: this.jobId,
      reason: 'Scatter is small beside the size; warm since noon.',
    };
    await this.step((actor) => acceptBase(actor, input));
  }

  async trial(plane: number): Promise<void> {
    await this.fit('trial', plane, { massG: this.trialMassG(plane), angleDeg: 0 });
    await this.run('trial');
  }

  private async settle(): Promise<void> {
    const { step } = await this.sheet();
    if (step.step !== 'settle trial') throw new Error(`${this.plan.tag} waits at ${step.step}`);
    const { weightId } = step;
    await this.step((actor) =>
      settleTrial(actor, {
        jobId: this.jobId,
        weightId,
        stays: this.plan.trials,
        standingStill: 'on',
        namedPerson: actor.name,
      }),
    );
  }

  /** Accepts the answer shown, fits it to whole grams and degrees, and runs. */
  private async correct(): Promise<void> {
    const { answer, answerFailure } = await this.sheet();
    if (!answer) throw new Error(`${this.plan.tag} has no answer: ${answerFailure ?? ''}`);
    const { fingerprint, planes } = answer;
    await this.step((actor) => acceptAnswer(actor, { jobId: this.jobId, fingerprint }));
    for (const { planeId, massG, angleDeg } of planes) {
      const fitted = { massG: Math.max(1, Math.round(massG)), angleDeg: Math.round(angleDeg) };
      await this.fit('correction', this.machine.planeIds.indexOf(planeId), fitted);
    }
    await this.run('check');
  }

  private async isMissed(): Promise<boolean> {
    const { check } = await this.sheet();
    return check?.points.some(({ now }) => now > this.plan.targetOneX) ?? true;
  }

  private async sign(): Promise<void> {
    const { weights } = await this.sheet();
    const input = {
      jobId: this.jobId,
      statement: 'Done as recorded. Weights counted, guards back, handed over.',
      permanentWeightIds: weights.filter(({ endedAt }) => endedAt === null).map(({ id }) => id),
      handBack: 'on' as const,
      areaOwner: this.plan.areaOwner,
      reason: 'The remainder is within what repeated runs scatter.',
    };
    await this.step((actor) => signJob(actor, input));
  }

  private async run(purpose: 'base' | 'trial' | 'check'): Promise<void> {
    const { model, spec } = this.machine;
    const { random, calendar } = this.means;
    const at = this.now();
    const speedRpm = Math.round(spec.speedRpm * (1 + 0.002 * (random() - 0.5)));
    const weights = weightsOn(await ledgerOf(this.em.fork(FRESH), this.machine), at);
    const shaken = vibrationAt(model, { day: calendar.dayOf(at), speedRpm }, weights);
    const vectors = this.points().map(({ id, index }) => {
      const vibration = shaken[index];
      if (!vibration) throw new Error(`${spec.tag} has no model of a point`);
      const { oneXMmS, lagDeg, overallMmS } = measure(vibration, SCATTER, random);
      return { pointId: id, amplitude: oneXMmS, phaseDeg: lagDeg, overall: overallMmS };
    });
    await this.step((actor) =>
      recordRun(actor, {
        jobId: this.jobId,
        purpose,
        speedRpm,
        unit: 'mm/s rms',
        vectors,
        clearOfRotor: 'on',
        namedPerson: actor.name,
      }),
    );
  }

  private async fit(
    purpose: 'trial' | 'correction',
    plane: number,
    weight: { massG: number; angleDeg: number },
  ): Promise<void> {
    await this.step((actor) =>
      fitWeight(actor, {
        jobId: this.jobId,
        purpose,
        planeId: this.machine.planeIds[plane],
        ...weight,
        massSource: 'scale',
        radiusMm: this.machine.spec.planes[plane]?.radiusMm ?? 0,
        angleSense: 'against',
        arcMm: '',
        fixing: FIXING,
        fixingKind: purpose === 'trial' ? 'temporary' : 'bolt',
        secured: 'on',
        noPhoto: 'no camera allowed here',
        standingStill: 'on',
        fixingHolds: 'on',
        namedPerson: actor.name,
      }),
    );
  }

  /** A mass that changes the reading beside its plane by some 60 %. */
  private trialMassG(plane: number): number {
    const { model, spec } = this.machine;
    const moment = { day: this.plan.day, speedRpm: spec.speedRpm };
    const found = oneXVectors(model, moment, []);
    const [near] = this.points()
      .map(({ index }) => ({ index, point: model.points[index] }))
      .flatMap(({ index, point }) =>
        point ? [{ answer: size(influenceOf(point, plane, spec.speedRpm)), index }] : [],
      )
      .sort((one, other) => other.answer - one.answer);
    if (!near) throw new Error(`${spec.tag} is read nowhere`);
    const changeMmS = 0.6 * Math.max(1.5, size(found[near.index] ?? { re: 0, im: 0 }));
    return Math.max(2, Math.round(changeMmS / near.answer / (spec.planes[plane]?.radiusMm ?? 1)));
  }

  private points(): { id: number; index: number }[] {
    return this.machine.model.points.flatMap(({ name }, index) => {
      const id = this.machine.pointIds[index];
      return READ_AT.includes(name) && id !== undefined ? [{ id, index }] : [];
    });
  }

  private now(): Date {
    return this.means.calendar.at(this.plan.day, START_HOUR, this.minutes);
  }

  private async sheet(): Promise<BalanceJobDto> {
    const sheet = await balanceJob(this.means.actor, this.jobId);
    if (!sheet) throw new Error(`The job of ${this.plan.tag} is gone`);
    return sheet;
  }

  private async step<Value>(work: (actor: Actor) => Promise<Result<Value>>): Promise<Value> {
    const result = await atTime(this.now(), () => work(this.means.actor));
    this.minutes += STEP_MIN;
    if (result.ok) return result.value;
    throw new Error(`${this.plan.tag}: ${result.failure.code}, ${result.failure.message}`);
  }
}

const FRESH = { clear: true, keepTransactionContext: true } as const;
