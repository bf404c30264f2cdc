import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  clockHours,
  opposite,
  otherEnd,
  polarPlace,
  screenDeg,
  senseSeenFrom,
  type Sense,
} from '@/lib/domain/drawing/face-view';
import { formatClock } from '@/lib/format';

const origin = { x: 0, y: 0 };
const anySense = fc.constantFrom<Sense>('cw', 'ccw');
const anyDeg = fc.double({ min: 0, max: 359.999, noNaN: true });

describe('where a rotor angle stands on the drawing', () => {
  it('runs counter-clockwise from the drive end of a rotor that turns clockwise', () => {
    const seen = senseSeenFrom('cw', 'drive-end');
    const at90 = polarPlace(origin, 10, screenDeg(90, seen));
    expect(at90.x).toBeCloseTo(-10);
    expect(at90.y).toBeCloseTo(0);
  });

  it('is mirrored from the other end', () => {
    const seen = senseSeenFrom('cw', 'other-end');
    expect(seen).toBe('ccw');
    expect(polarPlace(origin, 10, screenDeg(90, seen)).x).toBeCloseTo(10);
  });

  it('runs clockwise from the drive end of a rotor that turns counter-clockwise', () => {
    expect(screenDeg(90, senseSeenFrom('ccw', 'drive-end'))).toBe(90);
  });

  it('has the mark on top from either end', () => {
    expect(screenDeg(0, 'cw')).toBe(0);
    expect(screenDeg(0, 'ccw')).toBe(0);
    expect(polarPlace(origin, 10, 0)).toEqual({ x: 0, y: -10 });
  });

  it('mirrors about the vertical for every angle and sense, and twice is back', () => {
    fc.assert(
      fc.property(anyDeg, anySense, (deg, rotation) => {
        const near = polarPlace(origin, 1, screenDeg(deg, senseSeenFrom(rotation, 'drive-end')));
        const far = polarPlace(origin, 1, screenDeg(deg, senseSeenFrom(rotation, 'other-end')));
        expect(far.x).toBeCloseTo(-near.x, 9);
        expect(far.y).toBeCloseTo(near.y, 9);
        expect(opposite(opposite(rotation))).toBe(rotation);
      }),
    );
    expect(otherEnd(otherEnd('drive-end'))).toBe('drive-end');
  });

  it('meets a fixed finger in order as the rotor turns', () => {
    // Turning the drawn rotor by d in its own sense brings the angle d under a finger at the top.
    fc.assert(
      fc.property(anyDeg, anySense, (deg, seen) => {
        const turned = screenDeg(deg, seen) + (seen === 'cw' ? deg : -deg);
        expect(Math.cos((turned * Math.PI) / 180)).toBeCloseTo(1, 9);
      }),
    );
  });
});

describe('the clock with the mark parked on top', () => {
  it('says 10:48 for 36.1° where the rotor is seen turning clockwise', () => {
    expect(formatClock(clockHours(36.1, 'cw'))).toBe('10:48');
    expect(formatClock(clockHours(36.1, 'ccw'))).toBe('1:12');
  });

  it('says 7:52 for 124°', () => {
    expect(formatClock(clockHours(124, 'cw'))).toBe('7:52');
  });

  it('adds up to twelve hours over the two ends', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 359.9, noNaN: true }), (deg) => {
        expect(clockHours(deg, 'cw') + clockHours(deg, 'ccw')).toBeCloseTo(12, 9);
      }),
    );
  });
});
