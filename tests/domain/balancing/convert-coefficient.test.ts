import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { convertCoefficient, type SetUpPlaces } from '@/lib/domain/balancing/convert-coefficient';
import { lagAfterChange } from '@/lib/domain/balancing/convert-angle';
import { angleDeg, fromPolar, multiply, size } from '@/lib/domain/complex';
import { codeOf, valueOf } from './job-builder';
import { near, nearDeg } from './near';

const before: SetUpPlaces = {
  mark: 'Punch mark',
  tachoDeg: 0,
  tachoEdge: 'rising',
  rotationFromDriveEnd: 'clockwise',
  sensor: { place: 'A, horizontal', turnedOver: false },
};

describe('convertCoefficient', () => {
  it('turns by the way the tacho was moved, and by half a turn with the sensor', () => {
    const h = fromPolar(0.162, 26.4);
    const moved = valueOf(convertCoefficient(h, before, { ...before, tachoDeg: 30 }));
    expect(moved.converted).toBe(true);
    near(size(moved.coefficient), 0.162, 1e-12);
    nearDeg(angleDeg(moved.coefficient), 356.4, 1e-9);
    const sensor = { place: 'A, horizontal', turnedOver: true };
    const over = valueOf(convertCoefficient(h, before, { ...before, sensor }));
    nearDeg(angleDeg(over.coefficient), 206.4, 1e-9);
    expect(valueOf(convertCoefficient(h, before, before))).toEqual({
      coefficient: h,
      converted: false,
    });
  });

  it('says of a weight what the converted lag of its effect says, whatever the tacho', () => {
    const deg = fc.integer({ min: 0, max: 359 });
    fc.assert(
      fc.property(deg, deg, deg, deg, (lag, angle, from, to) => {
        const h = fromPolar(2e-4, lag);
        const u = fromPolar(8000, angle);
        const places = [from, to].map((tachoDeg) => ({ ...before, tachoDeg }));
        const { coefficient } = valueOf(convertCoefficient(h, places[0]!, places[1]!));
        const read = angleDeg(multiply(h, u));
        const moved = lagAfterChange(read, { kind: 'tacho moved with rotation', deg: to - from });
        nearDeg(angleDeg(multiply(coefficient, u)), moved, 1e-6);
      }),
    );
  });

  it.each([
    ['mark-moved', { mark: 'Keyway' }],
    ['mark-moved', { tachoEdge: 'falling' }],
    ['rotation-differs', { rotationFromDriveEnd: 'counter-clockwise' }],
    ['sensor-moved', { sensor: { place: 'A, vertical', turnedOver: false } }],
    ['sensor-moved', { sensor: null }],
  ] as const)('refuses in words: %s', (code, over) => {
    expect(codeOf(convertCoefficient(fromPolar(1, 0), before, { ...before, ...over }))).toBe(code);
  });
});
