import { formatMass, formatRotorAngle } from '@/lib/format';
import type { LedgerWeightDto } from '@/lib/schemas/balance-job';

/** What the photo of a weight shows, in words. */
export function pictured(weight: LedgerWeightDto): string {
  const place = weight.positionLabel === null ? '' : `, position ${weight.positionLabel}`;
  return `Photo of ${formatMass(weight.massG)} in plane ${weight.planeName} at ${formatRotorAngle(weight.angleDeg)}${place}`;
}
