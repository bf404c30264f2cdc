import {
  normalFrom,
  randomSource,
  type RandomSource,
} from '@/lib/domain/plant-model/random-source';
import { STANDARD_GRAVITY_M_S2 } from '@/lib/domain/units';
import {
  naturalFrequencies,
  velocityAt,
  type RigidRotor,
  type Sensor,
  type SupportPair,
  type Unbalance,
} from './rigid-rotor';
import { slipFor, type Slip } from './slips';

/** A correction plane: place along the axis from support A, m, and radius, mm. */
export type SimPlane = { readonly placeM: number; readonly radiusMm: number };

/** A machine that needs balancing, and the person who will do it. */
export type SimJob = {
  readonly seed: number;
  readonly rotor: RigidRotor;
  readonly speedRpm: number;
  readonly planes: readonly SimPlane[];
  readonly planesTooClose: boolean;
  readonly sensors: readonly Sensor[];
  readonly asFound: readonly Unbalance[];
  /** Scatter of a reading: share of its size, and degrees. */
  readonly noise: { readonly share: number; readonly deg: number };
  readonly slip: Slip;
  /** Where the trial goes if the mark cannot be used or nobody asks for it, degrees. */
  readonly trialDeg: number;
  readonly markReachable: boolean;
  /** Share of the force cap (10 % of the static load) that the chosen trial weight has. */
  readonly trialShare: number;
};

/** 1x velocity that every read point must come down to, mm/s rms. */
export const TARGET_MM_S = 1.4;

const NEAR_RESONANCE = 0.1;
/** Unbalance that pulls harder than this share of the rotor's weight is damage to repair first. */
const FORCE_SHARE = 0.3;

type Machine = Pick<
  SimJob,
  'rotor' | 'speedRpm' | 'planes' | 'planesTooClose' | 'sensors' | 'asFound'
>;

/** One random job: the same seed gives the same job. Ranges are listed in docs/simulated-jobs.md. */
export function drawJob(seed: number, slips: 'as stated' | 'none' | 'always'): SimJob {
  const random = randomSource(seed);
  let machine = drawMachine(random);
  while (pullShare(machine) > FORCE_SHARE) machine = drawMachine(random);
  const { planes } = machine;
  return {
    seed,
    ...machine,
    noise: { share: between(random, 0.01, 0.03), deg: 2 },
    slip: slipFor(random, planes.length, slips),
    trialDeg: Math.floor(between(random, 0, 360)),
    markReachable: random() < 0.8,
    trialShare: between(random, 0.4, 1),
  };
}

function drawMachine(random: RandomSource): Machine {
  const speedRpm = between(random, 600, 3600);
  const rotor = awayFromResonance(random, speedRpm);
  const { planes, planesTooClose } = drawPlanes(random, rotor.spanM);
  const sensors = drawSensors(random, planes, rotor);
  const drawn = drawUnbalance(random, rotor, planes);
  const loudest = Math.max(
    ...sensors.map((sensor) => velocityAt(rotor, speedRpm, drawn, sensor).rmsMmS),
  );
  const wanted = between(random, 3.5, 14);
  const asFound = drawn.map((u) => ({ ...u, kgM: (u.kgM * wanted) / loudest }));
  return { rotor, speedRpm, planes, planesTooClose, sensors, asFound };
}

/** Pull of all unbalance together, were it at one angle, as a share of the rotor's weight. */
function pullShare({ rotor, speedRpm, asFound }: Machine): number {
  const kgM = asFound.reduce((sum, u) => sum + u.kgM, 0);
  return (kgM * ((speedRpm * 2 * Math.PI) / 60) ** 2) / (rotor.massKg * STANDARD_GRAVITY_M_S2);
}

/** A number from `low` to `high`, every one as likely. */
export function between(random: RandomSource, low: number, high: number): number {
  return low + (high - low) * random();
}

function awayFromResonance(random: RandomSource, speedRpm: number): RigidRotor {
  const omega = (speedRpm * 2 * Math.PI) / 60;
  for (;;) {
    const rotor = drawRotor(random, omega);
    const naturals = [rotor.x, rotor.y].flatMap((pair) => naturalFrequencies(rotor, pair));
    if (naturals.every((one) => Math.abs(omega / one - 1) > NEAR_RESONANCE)) return rotor;
  }
}

function drawRotor(random: RandomSource, omega: number): RigidRotor {
  const massKg = Math.exp(between(random, Math.log(30), Math.log(3000)));
  const spanM = between(random, 0.5, 2.5);
  const ratio = random() < 0.6 ? between(random, 0.25, 0.85) : between(random, 1.2, 3);
  const stiffness = massKg * (omega / ratio) ** 2;
  const dampingRatio = between(random, 0.02, 0.1);
  const shareA = between(random, 0.4, 0.6);
  const pair = (softer: number): SupportPair => {
    const k = stiffness * softer;
    const c = 2 * dampingRatio * Math.sqrt(k * massKg);
    return {
      stiffnessNM: [k * shareA, k * (1 - shareA)],
      dampingNsM: [c * shareA, c * (1 - shareA)],
    };
  };
  return {
    massKg,
    tiltInertiaKgM2: massKg * (spanM * between(random, 0.25, 0.45)) ** 2,
    centreM: spanM * between(random, 0.35, 0.65),
    spanM,
    x: pair(1),
    y: pair(between(random, 0.6, 1)),
    turning: random() < 0.5 ? 1 : -1,
  };
}

function drawPlanes(random: RandomSource, spanM: number) {
  const radiusMm = Math.round(between(random, 100, 600));
  const at = (share: number): SimPlane => ({ placeM: share * spanM, radiusMm });
  if (random() < 0.5) return { planes: [at(between(random, 0.3, 0.7))], planesTooClose: false };
  const planesTooClose = random() < 0.1;
  const first = between(random, 0.05, 0.4);
  const second = planesTooClose ? first + between(random, 0.01, 0.06) : between(random, 0.6, 0.95);
  return { planes: [at(first), at(second)], planesTooClose };
}

function drawSensors(random: RandomSource, planes: readonly SimPlane[], rotor: RigidRotor) {
  const sensor = (support: 0 | 1): Sensor => ({ support, deg: between(random, 0, 90) });
  const [first] = planes;
  if (planes.length === 1 && first && random() < 0.5)
    return [sensor(first.placeM < rotor.spanM / 2 ? 0 : 1)];
  return [sensor(0), sensor(1)];
}

/** One plane: nearly all of it there, and 3 % as couple over the span. Two planes: anywhere. */
function drawUnbalance(
  random: RandomSource,
  { spanM }: RigidRotor,
  planes: readonly SimPlane[],
): Unbalance[] {
  const turn = () => between(random, 0, 360);
  const [only] = planes;
  if (planes.length === 1 && only) {
    const deg = turn();
    return [
      { placeM: only.placeM, kgM: 1, deg: turn() },
      { placeM: 0, kgM: 0.03, deg },
      { placeM: spanM, kgM: 0.03, deg: deg + 180 },
    ];
  }
  const piece = (share: number): Unbalance => ({
    placeM: share * spanM,
    kgM: Math.abs(1 + 0.5 * normalFrom(random)),
    deg: turn(),
  });
  return [piece(between(random, 0.1, 0.45)), piece(between(random, 0.55, 0.9))];
}
