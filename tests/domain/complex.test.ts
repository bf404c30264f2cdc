import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  add,
  angleDeg,
  divide,
  fromPolar,
  multiply,
  scale,
  size,
  subtract,
  sum,
  ZERO,
} from '@/lib/domain/complex';
import { near, nearDeg } from './balancing/near';

const sizes = fc.double({ min: 1e-3, max: 1e4, noNaN: true });
const turns = fc.double({ min: -720, max: 720, noNaN: true });
const vectors = fc.tuple(sizes, turns).map(([amp, deg]) => fromPolar(amp, deg));
const expectSame = (got: ReturnType<typeof add>, want: ReturnType<typeof add>) =>
  expect(size(subtract(got, want))).toBeLessThanOrEqual(1e-9 * Math.max(1, size(want)));

describe('plane vectors', () => {
  it('2 at 90° is 2j, and 3 + 4j is 5 at 53.13°', () => {
    near(fromPolar(2, 90).im, 2, 1e-12);
    near(fromPolar(2, 90).re, 0, 1e-12);
    expect(size({ re: 3, im: 4 })).toBe(5);
    near(angleDeg({ re: 3, im: 4 }), 53.13, 0.001);
  });

  it('come back from size and angle, any number of turns on', () => {
    fc.assert(
      fc.property(sizes, turns, (amp, deg) => {
        const vector = fromPolar(amp, deg);
        near(size(vector), amp, 1e-9 * amp);
        nearDeg(angleDeg(vector), deg, 1e-9);
      }),
    );
  });

  it('have an angle from 0 up to but not with 360, and 0 for nothing', () => {
    fc.assert(
      fc.property(vectors, (vector) => {
        const deg = angleDeg(vector);
        expect(deg >= 0 && deg < 360).toBe(true);
      }),
    );
    expect(angleDeg({ re: 1, im: -1e-18 })).toBe(0);
    expect(angleDeg({ re: 1, im: -0 })).toBe(0);
    expect(angleDeg(ZERO)).toBe(0);
  });

  it('multiplied by one another turn by the other’s angle and grow by its size', () => {
    fc.assert(
      fc.property(vectors, vectors, (a, b) => {
        const product = multiply(a, b);
        near(size(product), size(a) * size(b), 1e-9 * size(a) * size(b));
        nearDeg(angleDeg(product), angleDeg(a) + angleDeg(b), 1e-6);
        expectSame(divide(product, b), a);
      }),
    );
  });

  it('added and taken away are as before', () => {
    fc.assert(
      fc.property(vectors, vectors, (a, b) => {
        expectSame(subtract(add(a, b), b), a);
        expectSame(sum([a, b, scale(a, -1)]), b);
      }),
    );
    expect(sum([])).toEqual(ZERO);
  });
});
