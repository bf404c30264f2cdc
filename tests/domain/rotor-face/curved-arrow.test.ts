import { describe, expect, it } from 'vitest';
import { arcPath, curvedArrow } from '@/lib/domain/drawing/curved-arrow';

const circle = { centre: { x: 0, y: 0 }, radius: 10 };
const head = { length: 4, width: 6 };

function corners(points: string): { x: number; y: number }[] {
  const numbers = points.split(' ').map(Number);
  return [0, 1, 2].map((i) => ({ x: numbers[2 * i]!, y: numbers[2 * i + 1]! }));
}

describe('arcs and arrows', () => {
  it('draws a quarter from the top clockwise', () => {
    expect(arcPath(circle, 0, 90)).toBe('M 0 -10 A 10 10 0 0 1 10 0');
  });

  it('draws a quarter from the top counter-clockwise', () => {
    expect(arcPath(circle, 0, -90)).toBe('M 0 -10 A 10 10 0 0 0 -10 0');
  });

  it('takes the long way for more than half a turn', () => {
    expect(arcPath(circle, 0, 270)).toBe('M 0 -10 A 10 10 0 1 1 -10 0');
  });

  it('points a clockwise arrow from the top over the right side downwards', () => {
    const arrow = curvedArrow(circle, { sense: 'cw', startDeg: 0, lengthDeg: 90 }, head);
    const [outer, tip, inner] = corners(arrow.head);
    expect(outer).toEqual({ x: 13, y: 0 });
    expect(inner).toEqual({ x: 7, y: 0 });
    expect(tip!.y).toBeGreaterThan(3);
    expect(tip!.x).toBeGreaterThan(0);
  });

  it('points a counter-clockwise arrow over the left side downwards: the mirror image', () => {
    const run = { startDeg: 20, lengthDeg: 80 };
    const clockwise = corners(curvedArrow(circle, { ...run, sense: 'cw' }, head).head);
    const counter = corners(curvedArrow(circle, { ...run, sense: 'ccw' }, head).head);
    counter.forEach((corner, i) => {
      expect(corner.x).toBeCloseTo(-clockwise[i]!.x, 6);
      expect(corner.y).toBeCloseTo(clockwise[i]!.y, 6);
    });
  });
});
