import { LANES, type Lane } from '@/lib/domain/due/lane';

/** The lane that an address asks for; null for all of them, also where the address names none. */
export function laneFrom(asked: string | string[] | undefined): Lane | null {
  return LANES.find((lane) => lane === asked) ?? null;
}

/** The query of the board's address that shows one lane. */
export function laneQuery(lane: Lane): string {
  return `?lane=${encodeURIComponent(lane)}`;
}
