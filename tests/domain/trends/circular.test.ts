import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { circularMean } from '@/lib/domain/trends/circular';
import { inSimilarState, isSimilarSpeed } from '@/lib/domain/trends/similar-state';
import { shortTurnDeg } from '@/lib/domain/units';

describe('circularMean', () => {
  it('has no mean where angles cancel or are missing', () => {
    expect(circularMean([0, 180])).toBeNull();
    expect(circularMean([0, 120, 240])).toBeNull();
    expect(circularMean([])).toBeNull();
  });

  it('of one angle is that angle', () => {
    expect(circularMean([350])?.meanDeg).toBeCloseTo(350, 9);
    expect(circularMean([350])?.sdDeg).toBeCloseTo(0, 6);
  });

  it('turns with the angles and keeps its spread', () => {
    const angles = fc.array(fc.double({ min: 0, max: 80, noNaN: true }), { minLength: 1 });
    const turn = fc.double({ min: -720, max: 720, noNaN: true });
    fc.assert(
      fc.property(angles, turn, (list, by) => {
        const here = circularMean(list);
        const there = circularMean(list.map((deg) => deg + by));
        if (here === null || there === null) throw new Error('angles within 80° have a mean');
        expect(shortTurnDeg(here.meanDeg + by, there.meanDeg)).toBeCloseTo(0, 6);
        // Close to no spread the root blows rounding up to 1e-6 degrees.
        expect(there.sdDeg).toBeCloseTo(here.sdDeg, 4);
      }),
    );
  });
});

describe('isSimilarSpeed', () => {
  it.each([
    [1470, true],
    [1530, true],
    [1469, false],
    [1531, false],
    [null, true],
  ])('%s r/min beside 1500 r/min: %s', (speedRpm, similar) => {
    expect(isSimilarSpeed(speedRpm, 1500)).toBe(similar);
  });

  it('keeps the readings that compare, in their order', () => {
    const readings = [1500, 900, null, 1490].map((speedRpm) => ({ speedRpm }));
    expect(inSimilarState(readings, 1500).map(({ speedRpm }) => speedRpm)).toEqual([
      1500,
      null,
      1490,
    ]);
    expect(inSimilarState(readings, null)).toHaveLength(4);
  });
});
