import { describe, expect, it } from 'vitest';
import { outerCircle } from '@/lib/domain/drawing/outer-circle';

// Practice (no published source): a round number just outside the largest vector.
describe('the outer circle of a polar plot', () => {
  it.each([
    [0, 1],
    [0.071, 0.1],
    [1, 1],
    [2.4, 3],
    [4.39, 5],
    [61, 100],
  ])('for %d it is %d', (largest, outer) => {
    expect(outerCircle(largest)).toBeCloseTo(outer, 12);
  });
});
