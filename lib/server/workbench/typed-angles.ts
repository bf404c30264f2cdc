import 'server-only';
import { parseAngle, rotorDegFromWithRotation } from '@/lib/domain/balancing/convert-angle';
import { ok, type Result } from '@/lib/domain/result';

/** Typed degrees as rotor angles, against rotation, in the same order; or the first that is no angle. */
export function typedAngles(
  typed: readonly { readonly deg: number; readonly field: string }[],
  sense: 'against' | 'with',
): Result<number[]> {
  const angles: number[] = [];
  for (const { deg, field } of typed) {
    const parsed = parseAngle(deg, field);
    if (!parsed.ok) return parsed;
    angles.push(sense === 'with' ? rotorDegFromWithRotation(parsed.value) : parsed.value);
  }
  return ok(angles);
}
