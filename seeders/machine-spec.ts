import type { Machine } from '@/entities/machine';
import { fromPolar, scale, size, type Complex } from '@/lib/domain/complex';
import { betweenBearings, type RotorSketch } from '@/lib/domain/plant-model/between-bearings';
import { influenceOf } from '@/lib/domain/plant-model/influence';
import type { Fault, ModelledMachine } from '@/lib/domain/plant-model/modelled-machine';
import type { LimitSetWish } from '@/lib/domain/severity/choose-limit-sets';

/** A 1x size at the horizontal point that feels the plane most, mm/s rms, and an angle on the rotor. */
export type Shake = { readonly mmS: number; readonly deg: number };

/** A correction plane of an invented machine: 0 is bearing A, 1 is bearing B. */
export type PlaneSpec = {
  readonly name: string;
  readonly place: number;
  readonly radiusMm: number;
  readonly start: Shake;
  /** What 30 days of wear or build-up add. */
  readonly perMonth?: Shake;
  /** Days the wheel was cleaned: what is left, and drift begins anew. */
  readonly cleaned?: readonly (Shake & { readonly day: number })[];
};

/** What is invented about a machine of the demo plant; everything else follows from it. */
export type MachineSpec = {
  readonly tag: string;
  readonly name: string;
  readonly kind: string;
  readonly area: string;
  readonly powerKw: number;
  readonly speedRpm: number;
  readonly criticality: Machine['criticality'];
  readonly support?: 'rigid' | 'flexible';
  readonly drive?: Machine['drive'];
  readonly bladeCount?: number;
  readonly limits: LimitSetWish;
  readonly massKg: number;
  readonly spanM: number;
  /** Balance quality grade, 6.3 otherwise. */
  readonly grade?: number;
  readonly planes: readonly PlaneSpec[];
  readonly broadBandMmS: number;
  /** Natural speeds over the running speed, horizontal and vertical; those of the support otherwise. */
  readonly naturalOver?: readonly [number, number];
  readonly dampingRatio?: number;
  readonly faults?: readonly Fault[];
  /** Readings without a tacho have a 1x size and no lag. */
  readonly hasTacho: boolean;
  readonly ball?: BallGeometry;
  /** Records with samples: of the last round, or of the last rounds at the bearing that fails. */
  readonly waveforms?: 'last round' | 'last rounds';
  /** The last day anybody took a reading, for machines nobody got to lately. */
  readonly lastDay?: number;
};

type BallGeometry = {
  readonly type: string;
  readonly ballCount: number;
  readonly ballDiameterMm: number;
  readonly pitchDiameterMm: number;
  readonly contactDeg: number;
};

const NATURAL_OVER = { rigid: [1.55, 1.8], flexible: [0.45, 0.55] } as const;
const FROM_TACHO_DEG = 35;

/** The physical model of a machine: unbalance of the size that gives the shake asked for. */
export function modelOf(spec: MachineSpec): ModelledMachine {
  const bare = betweenBearings(sketchOf(spec, () => ({ re: 1, im: 0 })));
  const perMmS = spec.planes.map((_, plane) => {
    const answers = bare.points
      .filter(({ direction }) => direction === 'H')
      .map((point) => size(influenceOf(point, plane, spec.speedRpm)));
    return 1 / Math.max(...answers);
  });
  return betweenBearings(
    sketchOf(spec, (plane, { mmS, deg }) => fromPolar(mmS * (perMmS[plane] ?? 0), deg)),
  );
}

function sketchOf(spec: MachineSpec, gmmOf: (plane: number, shake: Shake) => Complex): RotorSketch {
  const [overH, overV] = spec.naturalOver ?? NATURAL_OVER[spec.support ?? 'rigid'];
  return {
    nominalSpeedRpm: spec.speedRpm,
    rotorMassKg: spec.massKg,
    naturalSpeedHRpm: overH * spec.speedRpm,
    naturalSpeedVRpm: overV * spec.speedRpm,
    dampingRatio: spec.dampingRatio ?? 0.05,
    horizontalFromTachoDeg: FROM_TACHO_DEG,
    broadBandRmsMmS: spec.broadBandMmS,
    planes: spec.planes.map(({ name, place, start, perMonth, cleaned = [] }, plane) => ({
      name,
      place,
      startGmm: gmmOf(plane, start),
      driftGmmPerDay: scale(gmmOf(plane, perMonth ?? { mmS: 0, deg: 0 }), 1 / 30),
      steps: cleaned.map(({ day, ...left }) => ({ day, gmm: gmmOf(plane, left), resets: true })),
    })),
    faults: spec.faults ?? [],
  };
}
