import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { add, angleDeg, fromPolar, multiply, scale, size, subtract } from '@/lib/domain/complex';
import { influenceOf } from '@/lib/domain/plant-model/influence';
import { unbalanceAt, type ModelledWeight } from '@/lib/domain/plant-model/unbalance-at';
import { oneXVectors, overallFrom, vibrationAt } from '@/lib/domain/plant-model/vibration-at';
import { shortTurnDeg } from '@/lib/domain/units';
import { fanWith, SKETCH } from './demo-machine';

const fan = fanWith([]);
const today = { day: 100, speedRpm: 1485 };
const weight = (plane: number, massG: number, angleDeg: number): ModelledWeight => ({
  plane,
  massG,
  radiusMm: 450,
  angleDeg,
});
const pointNamed = (machine: ReturnType<typeof fanWith>, name: string, day = today.day) => {
  const found = vibrationAt(machine, { ...today, day }, []).find(({ point }) => point === name);
  if (found === undefined) throw new Error(`The machine has no point ${name}.`);
  return found;
};
const oneXAt = (machine: ReturnType<typeof fanWith>, name: string, day?: number) => {
  const first = pointNamed(machine, name, day).orders[0];
  if (first === undefined) throw new Error(`${name} has no 1x.`);
  return first;
};

describe('influenceOf', () => {
  const point = fan.points[0]!;

  // Forced response of one mode (textbook): far above resonance v_rms nears Ω·U/(√2·M).
  it('nears the mass line far above resonance', () => {
    const free = { ...point, mode: { ...point.mode, naturalSpeedRpm: 1, modalMassKg: 300 } };
    const whole = { ...free, leverage: [1] };
    expect(size(influenceOf(whole, 0, 1485)) * 1000).toBeCloseTo(0.3666, 3);
  });

  it('lags 90° less below and 90° more above resonance than at it', () => {
    const lagAt = (speedRpm: number) => angleDeg(influenceOf(point, 0, speedRpm));
    const atResonance = lagAt(SKETCH.naturalSpeedHRpm);
    expect(shortTurnDeg(atResonance, lagAt(10))).toBeCloseTo(-90, 0);
    expect(shortTurnDeg(atResonance, lagAt(100_000))).toBeCloseTo(90, 0);
    // At resonance force and velocity are in step: the lag is the place of the sensor.
    expect(atResonance).toBeCloseTo(SKETCH.horizontalFromTachoDeg, 9);
  });

  it('is largest near resonance and turns fast there', () => {
    const near = size(influenceOf(point, 0, SKETCH.naturalSpeedHRpm));
    expect(near).toBeGreaterThan(5 * size(influenceOf(point, 0, 1485)));
    const turnPerPercent = (speedRpm: number) =>
      shortTurnDeg(
        angleDeg(influenceOf(point, 0, speedRpm)),
        angleDeg(influenceOf(point, 0, 1.01 * speedRpm)),
      );
    expect(turnPerPercent(2280)).toBeGreaterThan(5);
    expect(turnPerPercent(1485)).toBeLessThan(1);
  });
});

describe('unbalanceAt', () => {
  const plane = {
    name: 'plane 1',
    startGmm: fromPolar(100, 0),
    driftGmmPerDay: fromPolar(1, 90),
    steps: [
      { day: 60, gmm: fromPolar(500, 180) },
      { day: 90, gmm: fromPolar(10, 0), resets: true },
      { day: 95, gmm: fromPolar(20, 0) },
    ],
  };
  const near = (day: number, re: number, im: number) =>
    expect(size(subtract(unbalanceAt(plane, day), { re, im }))).toBeLessThan(1e-9);

  it('drifts, steps and begins anew after a reset', () => {
    near(50, 100, 50);
    near(60, -400, 60);
    near(90, 10, 0);
    near(97, 30, 7);
  });
});

describe('oneXVectors', () => {
  const anyWeight = fc
    .tuple(fc.constantFrom(0, 1), fc.integer({ min: 1, max: 60 }), fc.integer({ min: 0, max: 359 }))
    .map(([plane, massG, angle]) => weight(plane, massG, angle));

  it('is V = V₀ + H·U for any weights', () => {
    const bare = oneXVectors(fan, today, []);
    fc.assert(
      fc.property(fc.array(anyWeight, { maxLength: 4 }), (weights) => {
        oneXVectors(fan, today, weights).forEach((vector, i) => {
          const expected = weights.reduce((total, { plane, massG, radiusMm, angleDeg: at }) => {
            const coefficient = influenceOf(fan.points[i]!, plane, today.speedRpm);
            return add(total, multiply(coefficient, fromPolar(massG * radiusMm, at)));
          }, bare[i]!);
          expect(size(subtract(vector, expected))).toBeLessThan(1e-9);
        });
      }),
    );
  });

  it('lags 30° more when the only unbalance is moved 30° against rotation', () => {
    const clean = fanWith([], {
      planes: SKETCH.planes.map((plane) => ({
        ...plane,
        startGmm: fromPolar(0, 0),
        driftGmmPerDay: fromPolar(0, 0),
      })),
    });
    const at = (angle: number) => oneXVectors(clean, today, [weight(0, 20, angle)])[0]!;
    expect(shortTurnDeg(angleDeg(at(10)), angleDeg(at(40)))).toBeCloseTo(30, 9);
  });

  it('is gone everywhere with weights opposite to the unbalance', () => {
    const opposite = fan.planes.map((plane, i) => {
      const unbalance = unbalanceAt(plane, today.day);
      return weight(i, size(unbalance) / 450, angleDeg(scale(unbalance, -1)));
    });
    for (const vector of oneXVectors(fan, today, opposite)) expect(size(vector)).toBeLessThan(1e-9);
  });

  it('makes horizontal and vertical about a quarter turn apart', () => {
    const apart = shortTurnDeg(oneXAt(fan, 'A-H').lagDeg, oneXAt(fan, 'A-V').lagDeg);
    expect(Math.abs(apart - 90)).toBeLessThan(30);
  });
});

describe('faults', () => {
  it('a soft foot shakes sideways far more than vertically, in one line', () => {
    const fault = {
      kind: 'soft foot',
      fromDay: 50,
      growsOverDays: 0,
      horizontalRmsMmS: 6,
      lagDeg: 48,
    } as const;
    const loose = fanWith([fault], {
      planes: SKETCH.planes.map((plane) => ({ ...plane, startGmm: fromPolar(300, 0) })),
    });
    const [h, v] = [oneXAt(loose, 'A-H'), oneXAt(loose, 'A-V')];
    expect(h.rmsMmS / v.rmsMmS).toBeGreaterThan(5);
    expect(Math.abs(shortTurnDeg(v.lagDeg, h.lagDeg))).toBeLessThan(30);
    expect(oneXAt(loose, 'A-H', 49).rmsMmS).toBeLessThan(1);
  });

  it('misalignment shows at twice the speed and axially', () => {
    const fault = {
      kind: 'misalignment',
      fromDay: 0,
      growsOverDays: 0,
      twiceRmsMmS: 2,
      axialRmsMmS: 1.5,
    } as const;
    const skewed = fanWith([fault]);
    expect(pointNamed(skewed, 'B-H').orders[1]).toMatchObject({ order: 2, rmsMmS: 2 });
    expect(oneXAt(skewed, 'A-A').rmsMmS).toBeGreaterThan(10 * oneXAt(fan, 'A-A').rmsMmS);
    expect(oneXAt(skewed, 'A-H')).toEqual(oneXAt(fan, 'A-H'));
  });

  it('a bearing defect grows at its point and leaves 1x alone', () => {
    const fault = {
      kind: 'bearing defect',
      fromDay: 100,
      growsOverDays: 100,
      point: 'B-H',
      passOrder: 3.53,
      knockPeakMS2: 30,
      velocityRmsMmS: 3,
    } as const;
    const worn = fanWith([fault]);
    expect(pointNamed(worn, 'B-H', 100).knocks).toBeNull();
    expect(pointNamed(worn, 'B-H', 150).knocks).toMatchObject({ velocityRmsMmS: 1.5 });
    expect(pointNamed(worn, 'B-H', 400).knocks).toMatchObject({ peakMS2: 30 });
    expect(pointNamed(worn, 'A-H', 400).knocks).toBeNull();
    expect(oneXAt(worn, 'B-H')).toEqual(oneXAt(fan, 'B-H'));
  });

  it('parts that do not move together add by their squares', () => {
    const parts = {
      point: 'A-H',
      orders: [pointNamed(fan, 'A-H').orders[0]!].map((order) => ({ ...order, rmsMmS: 3 })),
      broadBandRmsMmS: 0,
      knocks: { passOrder: 3, peakMS2: 1, velocityRmsMmS: 4 },
    };
    expect(overallFrom(parts)).toBeCloseTo(5, 12);
  });
});
