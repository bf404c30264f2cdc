/**
 * Whether overall velocities reach into zone D: above the C/D boundary at any point. A value equal to the
 * boundary belongs to C.
 *
 * @param overalls mm/s rms; null where it was not read
 * @param bCd boundary between zones C and D, mm/s rms; null without a limit set
 * Source: ISO 20816-1 (zones). Example: 4.6 against 4.5 is in zone D.
 */
export function inZoneD(overalls: readonly (number | null)[], bCd: number | null): boolean {
  return bCd !== null && overalls.some((overall) => overall !== null && overall > bCd);
}
