/** A number held between 0 and 1. Example: `clamp(1.4)` is 1. */
export function clamp(value: number): number {
  return Math.min(1, Math.max(0, value));
}
