import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fromPolar } from '@/lib/domain/complex';
import { alertLevel } from '@/lib/domain/severity/alert-level';
import { significantChange, significantVectorChange } from '@/lib/domain/severity/change-rule';

describe('significantChange', () => {
  it('counts a fall as much as a rise', () => {
    const { change, significant } = significantChange(1.1, 1.85, 2.8);
    expect(change).toBeCloseTo(-0.75, 12);
    expect(significant).toBe(true);
  });

  it('does not count a change equal to the limit, whatever its rounding', () => {
    expect(2.1 - 1.4).toBeGreaterThan(0.7);
    expect(significantChange(2.1, 1.4, 2.8).significant).toBe(false);
    expect(significantChange(2.11, 1.4, 2.8).significant).toBe(true);
  });

  it('is the same seen from either side', () => {
    const value = fc.double({ min: 0, max: 20, noNaN: true });
    fc.assert(
      fc.property(value, value, (one, other) => {
        expect(significantChange(one, other, 2.8).significant).toBe(
          significantChange(other, one, 2.8).significant,
        );
      }),
    );
  });
});

describe('significantVectorChange', () => {
  it('sees a swing of the lag at constant size', () => {
    const { change, significant } = significantVectorChange(fromPolar(2, 60), fromPolar(2, 0), 2.8);
    expect(change).toBeCloseTo(2, 12);
    expect(significant).toBe(true);
  });

  it('never counts less than the change of the size', () => {
    const amplitude = fc.double({ min: 0, max: 20, noNaN: true });
    const lag = fc.double({ min: 0, max: 360, noNaN: true });
    fc.assert(
      fc.property(amplitude, lag, amplitude, lag, (a, p, b, q) => {
        const swing = significantVectorChange(fromPolar(a, p), fromPolar(b, q), 2.8).change;
        expect(swing).toBeGreaterThanOrEqual(Math.abs(a - b) - 1e-9);
      }),
    );
  });
});

describe('alertLevel', () => {
  it('never lies above 1.25 times B/C', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 50, noNaN: true }), (baseline) => {
        expect(alertLevel(baseline, { bc: 2.8 })).toBeLessThanOrEqual(3.5);
      }),
    );
  });
});
