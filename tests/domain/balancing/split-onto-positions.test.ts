import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { combineMasses } from '@/lib/domain/balancing/move-weight';
import { splitOntoPositions } from '@/lib/domain/balancing/split-onto-positions';
import { near, nearDeg } from './near';

const ring = (count: number, firstDeg = 0, maxG: number | null = null) =>
  Array.from({ length: count }, (_, index) => ({
    label: String(index + 1),
    angleDeg: (firstDeg + (index * 360) / count) % 360,
    maxG,
  }));

describe('splitOntoPositions', () => {
  // The law of sines, computed apart from this code: 23.5 g at 137° on nine blades.
  it('carries a weight on the blades either side of it', () => {
    const split = splitOntoPositions({ massG: 23.5, angleDeg: 137 }, ring(9));
    const shares = split.ok ? split.value : [];
    expect(shares.map(({ label }) => label)).toEqual(['4', '5']);
    near(shares[0]!.massG, 14.2849, 5e-5);
    near(shares[1]!.massG, 10.689, 5e-4);
  });

  it('goes past the mark where the weight lies between the last and the first', () => {
    const split = splitOntoPositions({ massG: 10, angleDeg: 350 }, ring(9));
    expect(split.ok && split.value.map(({ label }) => label)).toEqual(['9', '1']);
  });

  it('leaves it whole on a position within half a degree', () => {
    const split = splitOntoPositions({ massG: 10, angleDeg: 359.6 }, ring(9));
    expect(split).toEqual({ ok: true, value: [{ label: '1', massG: 10, angleDeg: 0 }] });
  });

  it('adds up to the weight again, whatever the ring', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 3, max: 60 }),
        fc.double({ min: 0, max: 359.9, noNaN: true }),
        fc.double({ min: 0, max: 359.9, noNaN: true }),
        fc.double({ min: 0.1, max: 5000, noNaN: true }),
        (count, firstDeg, angleDeg, massG) => {
          const split = splitOntoPositions({ massG, angleDeg }, ring(count, firstDeg));
          const shares = split.ok ? split.value : [];
          const whole = combineMasses(shares);
          near(whole.massG, massG, 1e-9 * massG);
          if (shares.length === 1)
            return Math.abs(nearDegOf(whole.angleDeg, angleDeg)) <= 0.5 + 1e-9;
          nearDeg(whole.angleDeg, angleDeg, 1e-6);
          return shares.every((share) => share.massG >= 0);
        },
      ),
    );
  });

  it('is refused where no two positions stand either side, less than half a turn apart', () => {
    const halves = ring(2);
    expect(splitOntoPositions({ massG: 10, angleDeg: 90 }, halves)).toMatchObject({
      failure: { code: 'no-pair' },
    });
    expect(splitOntoPositions({ massG: 10, angleDeg: 90 }, ring(1))).toMatchObject({
      failure: { code: 'no-pair' },
    });
    expect(splitOntoPositions({ massG: 10, angleDeg: 90 }, [])).toMatchObject({
      failure: { code: 'no-pair' },
    });
  });

  it('names the position that would carry more than it takes', () => {
    const split = splitOntoPositions({ massG: 23.5, angleDeg: 137 }, ring(9, 0, 12));
    expect(split).toMatchObject({ failure: { code: 'too-heavy', field: 'maxG' } });
    expect(split.ok ? '' : split.failure.message).toContain('Position 4 would carry 14.3 g');
  });
});

function nearDegOf(a: number, b: number): number {
  return ((a - b + 540) % 360) - 180;
}
