import { expect } from 'vitest';
import { shortTurnDeg } from '@/lib/domain/units';

/** Expects two numbers to lie within `within` of each other. */
export function near(got: number, want: number, within: number): void {
  expect(Math.abs(got - want), `${got} instead of ${want}`).toBeLessThanOrEqual(within);
}

/** Expects two angles to lie within `within` degrees of each other, the short way round. */
export function nearDeg(got: number, want: number, within: number): void {
  expect(Math.abs(shortTurnDeg(want, got)), `${got}° instead of ${want}°`).toBeLessThanOrEqual(
    within,
  );
}
