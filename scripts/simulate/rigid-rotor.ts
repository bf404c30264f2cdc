import { add, divide, multiply, scale, subtract, type Complex } from '@/lib/domain/complex';

/** Stiffness and damping of the two supports in one direction, N/m and N·s/m. */
export type SupportPair = {
  readonly stiffnessNM: readonly [number, number];
  readonly dampingNsM: readonly [number, number];
};

/**
 * A rigid rotor on two damped supports. Places along the axis in m from support A. Two degrees of
 * freedom in each of two directions, x and y, which do not act on each other: the rotor shifts and
 * tilts; gyroscopic moments are left out.
 */
export type RigidRotor = {
  readonly massKg: number;
  /** About a cross axis through the centre of mass, kg·m². */
  readonly tiltInertiaKgM2: number;
  readonly centreM: number;
  readonly spanM: number;
  readonly x: SupportPair;
  readonly y: SupportPair;
  /** 1: x, then y, meet a point of the rotor in this order; −1: the other way round. */
  readonly turning: 1 | -1;
};

/** Unbalance at a place: kg·m, and degrees *against* rotation from the mark. */
export type Unbalance = { readonly placeM: number; readonly kgM: number; readonly deg: number };

/** A velocity sensor at a support, its axis turned by `deg` from x towards y. */
export type Sensor = { readonly support: 0 | 1; readonly deg: number };

/** Movement of the rotor in one direction at one speed, as phasors of e^{+jΩt}: shift m, tilt rad. */
type Movement = { readonly shift: Complex; readonly tilt: Complex };

/**
 * What a sensor shows: velocity, mm/s rms, and lag in degrees. Unlike the product, this works with forces
 * in fixed directions: a weight at α against rotation pulls along x with cos(Ωt − α) and along y with
 * ±sin(Ωt − α); M·q̈ + C·q̇ + K·q = F is solved for both; the lag is read from the phasor.
 * Source: equations of a rigid rotor on springs and dampers, S. S. Rao, Mechanical Vibrations, ch. 9
 * (from memory).
 */
export function velocityAt(
  rotor: RigidRotor,
  speedRpm: number,
  unbalances: readonly Unbalance[],
  sensor: Sensor,
): { readonly rmsMmS: number; readonly lagDeg: number } {
  const omega = (speedRpm * 2 * Math.PI) / 60;
  const alongX = movement(rotor, rotor.x, { omega, unbalances, advanceDeg: 0 });
  const alongY = movement(rotor, rotor.y, {
    omega,
    unbalances,
    advanceDeg: rotor.turning === 1 ? -90 : 90,
  });
  const leverM = (sensor.support === 0 ? 0 : rotor.spanM) - rotor.centreM;
  const shown = add(
    scale(displacement(alongX, leverM), Math.cos(radians(sensor.deg))),
    scale(displacement(alongY, leverM), Math.sin(radians(sensor.deg))),
  );
  const velocity = multiply({ re: 0, im: omega }, shown);
  const lag = (-Math.atan2(velocity.im, velocity.re) * 180) / Math.PI;
  return {
    rmsMmS: (1000 * Math.hypot(velocity.re, velocity.im)) / Math.SQRT2,
    lagDeg: (lag + 360) % 360,
  };
}

/** The two natural frequencies without damping in one direction, rad/s, lower first. */
export function naturalFrequencies(
  rotor: RigidRotor,
  supports: SupportPair,
): readonly [number, number] {
  const [k11, k12, k22] = entries(rotor, supports.stiffnessNM);
  const a = k11 / rotor.massKg;
  const d = k22 / rotor.tiltInertiaKgM2;
  const middle = (a + d) / 2;
  const apart = Math.sqrt(((a - d) / 2) ** 2 + k12 ** 2 / (rotor.massKg * rotor.tiltInertiaKgM2));
  return [Math.sqrt(Math.max(0, middle - apart)), Math.sqrt(middle + apart)];
}

function movement(
  rotor: RigidRotor,
  supports: SupportPair,
  drive: {
    readonly omega: number;
    readonly unbalances: readonly Unbalance[];
    readonly advanceDeg: number;
  },
): Movement {
  const { omega } = drive;
  const k = entries(rotor, supports.stiffnessNM);
  const c = entries(rotor, supports.dampingNsM);
  const z11 = { re: k[0] - rotor.massKg * omega ** 2, im: omega * c[0] };
  const z12 = { re: k[1], im: omega * c[1] };
  const z22 = { re: k[2] - rotor.tiltInertiaKgM2 * omega ** 2, im: omega * c[2] };
  let force: Complex = { re: 0, im: 0 };
  let moment: Complex = { re: 0, im: 0 };
  for (const { placeM, kgM, deg } of drive.unbalances) {
    const angle = radians(drive.advanceDeg - deg);
    const size = kgM * omega ** 2;
    const one = { re: size * Math.cos(angle), im: size * Math.sin(angle) };
    force = add(force, one);
    moment = add(moment, scale(one, placeM - rotor.centreM));
  }
  const det = subtract(multiply(z11, z22), multiply(z12, z12));
  return {
    shift: divide(subtract(multiply(force, z22), multiply(z12, moment)), det),
    tilt: divide(subtract(multiply(z11, moment), multiply(z12, force)), det),
  };
}

/** Entries 11, 12 and 22 of the stiffness or damping matrix for shift and tilt. */
function entries(rotor: RigidRotor, [a, b]: readonly [number, number]): [number, number, number] {
  const leverA = -rotor.centreM;
  const leverB = rotor.spanM - rotor.centreM;
  return [a + b, a * leverA + b * leverB, a * leverA ** 2 + b * leverB ** 2];
}

function displacement({ shift, tilt }: Movement, leverM: number): Complex {
  return add(shift, scale(tilt, leverM));
}

function radians(deg: number): number {
  return (deg * Math.PI) / 180;
}
