import { fromPolar } from '@/lib/domain/complex';
import { betweenBearings, type RotorSketch } from '@/lib/domain/plant-model/between-bearings';
import type { Fault, ModelledMachine } from '@/lib/domain/plant-model/modelled-machine';

/** A fan between bearings below its support resonances, two planes, nothing else wrong with it. */
export const SKETCH: RotorSketch = {
  nominalSpeedRpm: 1485,
  rotorMassKg: 300,
  naturalSpeedHRpm: 2300,
  naturalSpeedVRpm: 3100,
  dampingRatio: 0.05,
  horizontalFromTachoDeg: 35,
  broadBandRmsMmS: 0.6,
  planes: [
    {
      name: 'plane 1',
      place: 0.25,
      startGmm: fromPolar(4000, 50),
      driftGmmPerDay: fromPolar(20, 120),
      steps: [],
    },
    {
      name: 'plane 2',
      place: 0.75,
      startGmm: fromPolar(3000, 200),
      driftGmmPerDay: fromPolar(0, 0),
      steps: [],
    },
  ],
  faults: [],
};

export function fanWith(
  faults: readonly Fault[],
  change: Partial<RotorSketch> = {},
): ModelledMachine {
  return betweenBearings({ ...SKETCH, ...change, faults });
}
