import { add, angleDeg, fromPolar, multiply, size, sum, type Complex } from '../complex';
import { lagDeg, type LagDeg } from '../units';
import { influenceOf } from './influence';
import type { Fault, ModelledMachine, ModelledPoint } from './modelled-machine';
import { unbalanceAt, unbalanceOfWeights, type ModelledWeight } from './unbalance-at';

/** When and at what speed a machine is looked at; `day` counts from the model's day 0. */
export type Moment = { readonly day: number; readonly speedRpm: number };

/** One order of the shaft speed as velocity. */
export type OrderPart = {
  readonly order: number;
  readonly rmsMmS: number;
  readonly lagDeg: LagDeg;
};

/** Knocks of a bearing defect as a sensor feels them. */
export type KnockPart = {
  readonly passOrder: number;
  readonly peakMS2: number;
  readonly velocityRmsMmS: number;
};

/** All that shakes one point. */
export type PointVibration = {
  readonly point: string;
  readonly orders: readonly OrderPart[];
  readonly broadBandRmsMmS: number;
  readonly knocks: KnockPart | null;
};

/** How much of a soft foot's sideways motion shows vertically, in the same instant. */
const SOFT_FOOT_VERTICAL_SHARE = 0.15;
const MISALIGNMENT_LAG_DEG = 75;

/**
 * 1x velocity at every point, mm/s rms, angle as lag, in the order of the points:
 * `V = Σ H·(U_plane + U_weights) + what other faults add`. Linear in the weights.
 *
 * Example: with a weight opposite to the only unbalance, of its size, every vector is zero.
 */
export function oneXVectors(
  machine: ModelledMachine,
  moment: Moment,
  weights: readonly ModelledWeight[],
): Complex[] {
  return machine.points.map((point) => {
    const byUnbalance = machine.planes.map((plane, i) =>
      multiply(
        influenceOf(point, i, moment.speedRpm),
        add(unbalanceAt(plane, moment.day), unbalanceOfWeights(weights, i)),
      ),
    );
    const byFaults = machine.faults.map((fault) => faultOneX(fault, point, moment.day));
    return sum([...byUnbalance, ...byFaults]);
  });
}

/** All parts of the vibration of every point: what readings and waveforms are made of. */
export function vibrationAt(
  machine: ModelledMachine,
  moment: Moment,
  weights: readonly ModelledWeight[],
): PointVibration[] {
  const vectors = oneXVectors(machine, moment, weights);
  return machine.points.map((point, i) => {
    const oneX = vectors[i] ?? { re: 0, im: 0 };
    return {
      point: point.name,
      orders: [
        { order: 1, rmsMmS: size(oneX), lagDeg: lagDeg(angleDeg(oneX)) },
        ...machine.faults.flatMap((fault) => twiceX(fault, point, moment.day)),
      ],
      broadBandRmsMmS: point.broadBandRmsMmS,
      knocks:
        machine.faults.map((fault) => knocksOf(fault, point, moment.day)).find(Boolean) ?? null,
    };
  });
}

/**
 * Overall velocity of parts that do not move together, mm/s rms: the root of the sum of squares.
 * Example: 1x 3, 2x 4 and nothing else make 5.
 */
export function overallFrom({ orders, broadBandRmsMmS, knocks }: PointVibration): number {
  return Math.hypot(
    ...orders.map(({ rmsMmS }) => rmsMmS),
    broadBandRmsMmS,
    knocks?.velocityRmsMmS ?? 0,
  );
}

function grown({ fromDay, growsOverDays }: Fault, day: number): number {
  if (day < fromDay) return 0;
  return growsOverDays <= 0 ? 1 : Math.min(1, (day - fromDay) / growsOverDays);
}

function faultOneX(fault: Fault, { direction }: ModelledPoint, day: number): Complex {
  if (fault.kind === 'soft foot' && direction !== 'A') {
    const share = direction === 'H' ? 1 : SOFT_FOOT_VERTICAL_SHARE;
    return fromPolar(grown(fault, day) * share * fault.horizontalRmsMmS, fault.lagDeg);
  }
  if (fault.kind === 'misalignment' && direction === 'A')
    return fromPolar(grown(fault, day) * fault.axialRmsMmS, MISALIGNMENT_LAG_DEG);
  return { re: 0, im: 0 };
}

function twiceX(fault: Fault, { direction }: ModelledPoint, day: number): OrderPart[] {
  if (fault.kind !== 'misalignment') return [];
  const share = direction === 'A' ? 0.5 : 1;
  return [
    {
      order: 2,
      rmsMmS: grown(fault, day) * share * fault.twiceRmsMmS,
      lagDeg: lagDeg(2 * MISALIGNMENT_LAG_DEG),
    },
  ];
}

function knocksOf(fault: Fault, { name }: ModelledPoint, day: number): KnockPart | null {
  if (fault.kind !== 'bearing defect' || fault.point !== name) return null;
  const share = grown(fault, day);
  if (share === 0) return null;
  return {
    passOrder: fault.passOrder,
    peakMS2: share * fault.knockPeakMS2,
    velocityRmsMmS: share * fault.velocityRmsMmS,
  };
}
