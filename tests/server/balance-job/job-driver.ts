import type { z } from 'zod';
import { planesOf, type JobKind } from '@/lib/domain/balance-job/job-kinds';
import type { Actor } from '@/lib/schemas/actor';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { openBalanceJobInput } from '@/lib/schemas/balance-job-input';
import type { Result } from '@/lib/domain/result';
import { acceptAnswer } from '@/lib/server/commands/accept-answer';
import { acceptBase } from '@/lib/server/commands/accept-base';
import { fitWeight } from '@/lib/server/commands/fit-weight';
import { openBalanceJob } from '@/lib/server/commands/open-balance-job';
import { recordRun } from '@/lib/server/commands/record-run';
import { settleTrial } from '@/lib/server/commands/settle-weight';
import { signJob } from '@/lib/server/commands/sign-job';
import { balanceJob } from '@/lib/server/queries/balance-job';
import type { SeededMachine } from '@/tests/support/plant';

type Polar = { amp: number; deg: number };
type Hung = {
  g: number;
  radius_mm: number;
  deg: number;
  sense?: 'against' | 'with';
  positionId?: number | undefined;
};
type OpenInput = z.input<typeof openBalanceJobInput>;

/** The value of a success; throws the sentence of a failure. */
export function valueOf<Value>(result: Result<Value>): Value {
  if (!result.ok) throw new Error(`${result.failure.code}: ${result.failure.message}`);
  return result.value;
}

/** Carries a job through the commands that the screens call, with text where a person types. */
export class JobDriver {
  private constructor(
    readonly actor: Actor,
    readonly machine: SeededMachine,
    readonly jobId: number,
    private readonly speedRpm: number,
  ) {}

  static async open(
    actor: Actor,
    machine: SeededMachine,
    options: { kind: JobKind; speedRpm: number } & Partial<OpenInput>,
  ): Promise<JobDriver> {
    const { kind, speedRpm, ...over } = options;
    const opened = await openBalanceJob(actor, {
      machineId: machine.machineId,
      kind,
      planeIds: [...machine.planeIds].slice(0, planesOf(kind).most ?? 2),
      pointIds: kind === 'one-plane' ? [machine.pointIds[0]] : [...machine.pointIds],
      unit: 'mm/s rms',
      phaseSense: 'lag',
      angleSense: 'against',
      reason: '1x has grown into zone C',
      targetOneX: '',
      startsAllowed: '',
      gradeTarget: 'on',
      cleaned: 'yes',
      nothingLoose: 'on',
      readingSteady: 'on',
      stateAgreed: 'on',
      setupConfirmed: 'on',
      standingSentence: 'on',
      ...over,
    });
    return new JobDriver(actor, machine, valueOf(opened).jobId, speedRpm);
  }

  /** The same job in another person's hands. */
  as(actor: Actor): JobDriver {
    return new JobDriver(actor, this.machine, this.jobId, this.speedRpm);
  }

  async run(purpose: 'base' | 'trial' | 'check', readings: Polar[], speedRpm = this.speedRpm) {
    return recordRun(this.actor, {
      jobId: this.jobId,
      purpose,
      speedRpm: String(speedRpm),
      unit: 'mm/s rms',
      vectors: readings.map((reading, index) => ({
        pointId: this.machine.pointIds[index],
        amplitude: String(reading.amp),
        phaseDeg: String(reading.deg),
        overall: '',
      })),
      clearOfRotor: 'on',
      namedPerson: 'Ida Berg',
    });
  }

  async acceptBase(reason = '') {
    valueOf(await acceptBase(this.actor, { jobId: this.jobId, reason }));
  }

  async fit(purpose: 'trial' | 'correction', plane: number, weight: Hung) {
    return fitWeight(this.actor, {
      jobId: this.jobId,
      purpose,
      planeId: this.machine.planeIds[plane],
      positionId: weight.positionId ?? '',
      massG: String(weight.g),
      massSource: 'scale',
      radiusMm: String(weight.radius_mm),
      angleDeg: String(weight.deg),
      angleSense: weight.sense ?? 'against',
      arcMm: '',
      fixing: 'clamp with locked screw',
      fixingKind: 'temporary',
      noPhoto: 'later',
      standingStill: 'on',
      fixingHolds: 'on',
      namedPerson: 'Ida Berg',
    });
  }

  async settle(stays: 'taken off' | 'stays on') {
    const { step } = await this.sheet();
    if (step.step !== 'settle trial') throw new Error(`step is ${step.step}`);
    valueOf(
      await settleTrial(this.actor, {
        jobId: this.jobId,
        weightId: step.weightId,
        stays,
        standingStill: 'on',
        namedPerson: 'Ida Berg',
      }),
    );
  }

  /** Trial weight, its run, and what becomes of it. */
  async trial(
    plane: number,
    weight: { g: number; radius_mm: number; deg: number; sense?: 'against' | 'with' },
    then: { readings: Polar[]; stays: 'taken off' | 'stays on'; speedRpm?: number },
  ) {
    valueOf(await this.fit('trial', plane, weight));
    valueOf(await this.run('trial', then.readings, then.speedRpm));
    await this.settle(then.stays);
  }

  async accept() {
    const { answer, answerFailure } = await this.sheet();
    if (!answer) throw new Error(answerFailure ?? 'no answer');
    valueOf(await acceptAnswer(this.actor, { jobId: this.jobId, fingerprint: answer.fingerprint }));
    return answer;
  }

  /** Signs with everything on the rotor made permanent. */
  async sign(reason = 'As it is.') {
    const { weights } = await this.sheet();
    return signJob(this.actor, {
      jobId: this.jobId,
      statement: 'Balanced and handed back.',
      permanentWeightIds: weights.filter(({ endedAt }) => endedAt === null).map(({ id }) => id),
      handBack: 'on',
      areaOwner: 'Marta Lind',
      reason,
    });
  }

  async sheet(): Promise<BalanceJobDto> {
    const sheet = await balanceJob(this.actor, this.jobId);
    if (!sheet) throw new Error('no such job');
    return sheet;
  }
}
