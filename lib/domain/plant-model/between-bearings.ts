import type {
  ModelledMachine,
  ModelledPlane,
  ModelledPoint,
  SupportMode,
} from './modelled-machine';

/** A rotor on bearings A and B in a few numbers. */
export type RotorSketch = {
  readonly nominalSpeedRpm: number;
  readonly rotorMassKg: number;
  readonly naturalSpeedHRpm: number;
  readonly naturalSpeedVRpm: number;
  readonly dampingRatio: number;
  /** Place of the horizontal sensors from the tacho in the direction of rotation, degrees. */
  readonly horizontalFromTachoDeg: number;
  readonly broadBandRmsMmS: number;
  /** Planes with their axial place: 0 at bearing A, 1 at bearing B, beyond for overhung. */
  readonly planes: readonly (ModelledPlane & { readonly place: number })[];
  readonly faults: ModelledMachine['faults'];
};

/** What of the housing moves with the rotor. */
const MOVED_TIMES = 1.6;

/**
 * A modelled machine with the points A-H, A-V, A-A, B-H and B-V. The force of a plane is shared
 * between the bearings by the lever rule; vertical sensors sit a quarter turn further in the direction
 * of rotation than horizontal ones; the axial point feels a tenth.
 *
 * Example: a plane half-way reaches both bearings with half its force.
 */
export function betweenBearings(sketch: RotorSketch): ModelledMachine {
  const points: ModelledPoint[] = (['A', 'B'] as const).flatMap((bearing) => [
    radialPoint(sketch, bearing, 'H'),
    radialPoint(sketch, bearing, 'V'),
  ]);
  return {
    nominalSpeedRpm: sketch.nominalSpeedRpm,
    planes: sketch.planes,
    points: [...points.slice(0, 2), axialPoint(sketch), ...points.slice(2)],
    faults: sketch.faults,
  };
}

function radialPoint(sketch: RotorSketch, bearing: 'A' | 'B', direction: 'H' | 'V'): ModelledPoint {
  const isHorizontal = direction === 'H';
  return {
    name: `${bearing}-${direction}`,
    direction,
    fromTachoDeg: sketch.horizontalFromTachoDeg + (isHorizontal ? 0 : 90),
    mode: modeAt(sketch, isHorizontal ? sketch.naturalSpeedHRpm : sketch.naturalSpeedVRpm),
    leverage: sketch.planes.map(({ place }) => (bearing === 'A' ? 1 - place : place)),
    broadBandRmsMmS: sketch.broadBandRmsMmS * (isHorizontal ? 1 : 0.8),
  };
}

function axialPoint(sketch: RotorSketch): ModelledPoint {
  const beside = radialPoint(sketch, 'A', 'H');
  return {
    ...beside,
    name: 'A-A',
    direction: 'A',
    leverage: beside.leverage.map((share) => 0.1 * share),
    broadBandRmsMmS: 0.6 * sketch.broadBandRmsMmS,
  };
}

// Each bearing carries half of what moves.
function modeAt(sketch: RotorSketch, naturalSpeedRpm: number): SupportMode {
  const { rotorMassKg, dampingRatio } = sketch;
  return { naturalSpeedRpm, dampingRatio, modalMassKg: (MOVED_TIMES * rotorMassKg) / 2 };
}
