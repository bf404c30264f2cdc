import fc from 'fast-check';
import { expect, it } from 'vitest';
import { leftWithinDisc } from '@/lib/domain/drawing/within-disc';

const disc = { x: 160, y: 190, radius: 90 };

it('moves words that would leave the disc, and no others', () => {
  expect(leftWithinDisc({ left: 170, width: 100, y: 190 }, disc)).toBe(150);
  expect(leftWithinDisc({ left: 60, width: 50, y: 190 }, disc)).toBe(70);
  expect(leftWithinDisc({ left: 120, width: 50, y: 190 }, disc)).toBe(120);
});

it('centres words that are wider than the disc at their height', () => {
  expect(leftWithinDisc({ left: 170, width: 60, y: 279 }, disc)).toBe(130);
  expect(leftWithinDisc({ left: 170, width: 60, y: 400 }, disc)).toBe(130);
});

it('keeps words on the disc wherever there is room', () => {
  fc.assert(
    fc.property(
      fc.double({ min: -500, max: 500, noNaN: true }),
      fc.double({ min: 1, max: 100, noNaN: true }),
      fc.double({ min: 140, max: 240, noNaN: true }),
      (left, width, y) => {
        const half = Math.sqrt(disc.radius ** 2 - (y - disc.y) ** 2);
        const begins = leftWithinDisc({ left, width, y }, disc);
        expect(begins).toBeGreaterThanOrEqual(disc.x - half - 1e-9);
        expect(begins + width).toBeLessThanOrEqual(disc.x + half + 1e-9);
      },
    ),
  );
});
