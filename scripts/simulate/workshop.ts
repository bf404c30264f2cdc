import type { FittedWeight, JobRun, PointVector } from '@/lib/domain/balancing/job-input';
import {
  normalFrom,
  randomSource,
  type RandomSource,
} from '@/lib/domain/plant-model/random-source';
import { normaliseDeg } from '@/lib/domain/units';
import { between, type SimJob } from './draw-job';
import { MASS_TYPED } from './trial-choice';
import { velocityAt, type Unbalance } from './rigid-rotor';

type Hanging = { readonly entered: FittedWeight; readonly real: Unbalance };

const FITTED_SHARE = 0.1;

/**
 * The machine and the person beside it: fits weights with small errors and the slip of the job, starts the
 * machine and reads it. The ledger only ever hears what the person believes.
 */
export class Workshop {
  starts = 0;
  /** The worst point with what hangs there, without noise, at nominal speed: base, then each check run. */
  readonly worst: number[] = [];
  /** Turns that one reading is averaged over, against a usual reading. */
  averaging = 1;
  /** The instrument is taken to show lead: what it shows is entered with the sign turned. */
  entersLead = false;
  /** Somebody pointed out the way of counting, and from now on it is right. */
  countsRight: boolean;
  private hanging: Hanging[] = [];
  private slipOpen = true;
  private massSlipOpen = true;
  private readonly random: RandomSource;
  private readonly offRun: number;
  private runs = 0;

  constructor(readonly job: SimJob) {
    this.random = randomSource(job.seed ^ 0x5eed);
    this.countsRight = job.slip !== 'all counted with rotation';
    this.offRun = 1 + Math.floor(between(this.random, 0, job.planes.length + 1));
  }

  /** Starts the machine and reads every point `times` over. */
  start(purpose: JobRun['purpose'], times = 1): Omit<JobRun, 'id' | 'weights'>[] {
    this.starts += 1;
    if (purpose !== 'base') this.runs += 1;
    const isOff =
      purpose !== 'base' && this.job.slip === 'speed off 2–3 %' && this.runs === this.offRun;
    const off = isOff
      ? between(this.random, 0.02, 0.03) * (this.random() < 0.5 ? 1 : -1)
      : 0.001 * normalFrom(this.random);
    const speedRpm = this.job.speedRpm * (1 + off);
    if (purpose !== 'trial' && !(purpose === 'base' && this.worst.length > 0))
      this.worst.push(this.worstPoint());
    return Array.from({ length: times }, () => ({
      purpose,
      speedRpm: Math.round(speedRpm * 10) / 10,
      vectors: this.read(speedRpm),
    }));
  }

  /** Fits what the ledger says, give or take, and with the slip of the job where it applies. */
  fit(weight: FittedWeight, purpose: 'trial' | 'correction'): void {
    const slipped = this.slipOf(weight, purpose);
    const plane = this.job.planes[slipped.planeId - 1];
    if (!plane) throw new Error(`There is no plane ${slipped.planeId}.`);
    const counted = this.countsRight ? slipped.angleDeg : -slipped.angleDeg;
    const size = 1 + 0.01 * normalFrom(this.random) + 0.005 * normalFrom(this.random);
    const real = {
      placeM: plane.placeM,
      kgM: slipped.massG * slipped.radiusMm * 1e-6 * size,
      deg: counted + 2 * normalFrom(this.random),
    };
    this.hanging.push({ entered: weight, real });
  }

  /** All corrections are on: a slip of fitting happens once. */
  fitted(): void {
    this.slipOpen = false;
  }

  /** The weight as the scale shows it when somebody is asked to weigh it again. */
  weighedAgain(weight: FittedWeight): FittedWeight {
    const isTenth = this.job.slip === 'trial mass typed × 10' && weight.planeId === 1;
    if (!isTenth || !this.massSlipOpen) return weight;
    this.massSlipOpen = false;
    return { ...weight, massG: weight.massG / MASS_TYPED };
  }

  takeOff(weight: FittedWeight): void {
    if (this.job.slip === 'trial left on' && weight.planeId === 1) return;
    this.hanging = this.hanging.filter(({ entered }) => entered !== weight);
  }

  /** The worst point with what hangs there now. */
  worstPoint(): number {
    const { rotor, speedRpm, sensors } = this.job;
    return Math.max(
      ...sensors.map((one) => velocityAt(rotor, speedRpm, this.unbalances(), one).rmsMmS),
    );
  }

  private slipOf(weight: FittedWeight, purpose: 'trial' | 'correction'): FittedWeight {
    if (purpose === 'correction')
      return this.slipOpen ? slippedCorrection(this.job, weight) : weight;
    const { slip } = this.job;
    if (weight.planeId !== 1) return weight;
    if (slip === 'trial counted with rotation')
      return { ...weight, angleDeg: normaliseDeg(-weight.angleDeg) };
    if (slip === 'trial mass typed × 10' && this.massSlipOpen)
      return { ...weight, massG: weight.massG / MASS_TYPED };
    return weight;
  }

  private read(speedRpm: number): PointVector[] {
    const { rotor, sensors, noise } = this.job;
    return sensors.map((sensor, i) => {
      const { rmsMmS, lagDeg } = velocityAt(rotor, speedRpm, this.unbalances(), sensor);
      const size =
        rmsMmS * (1 + (noise.share * normalFrom(this.random)) / Math.sqrt(this.averaging));
      const shownDeg = lagDeg + (noise.deg * normalFrom(this.random)) / Math.sqrt(this.averaging);
      return {
        pointId: i + 1,
        amplitude: Math.max(0, Math.round(100 * size) / 100),
        lagDeg: normaliseDeg(Math.round(this.entersLead ? -shownDeg : shownDeg)),
      };
    });
  }

  private unbalances(): Unbalance[] {
    return [...this.job.asFound, ...this.hanging.map(({ real }) => real)];
  }
}

function slippedCorrection({ slip, planes }: SimJob, weight: FittedWeight): FittedWeight {
  if (slip === 'planes swapped') return { ...weight, planeId: planes.length + 1 - weight.planeId };
  if (slip === 'tenth of the correction fitted')
    return { ...weight, massG: weight.massG * FITTED_SHARE };
  if (slip === 'correction on the opposite side')
    return { ...weight, angleDeg: normaliseDeg(weight.angleDeg + 180) };
  return weight;
}
