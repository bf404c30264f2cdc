import type { LimitsByValue } from '@/entities/measured-record';

/** The zone of a value by limits; a value equal to a boundary belongs to the lower zone. */
export function zoneOf(value: number, { bAb, bBc, bCd }: LimitsByValue): 'A' | 'B' | 'C' | 'D' {
  if (value <= bAb) return 'A';
  if (value <= bBc) return 'B';
  return value <= bCd ? 'C' : 'D';
}
