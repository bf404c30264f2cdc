import 'server-only';
import { centrifugalForceN } from '@/lib/domain/balancing/centrifugal-force';
import {
  angleOfPosition,
  parseAngle,
  rotorDegFromWithRotation,
} from '@/lib/domain/balancing/convert-angle';
import { splitOntoPositions } from '@/lib/domain/balancing/split-onto-positions';
import { ok } from '@/lib/domain/result';
import type { SolvedSplit } from '@/lib/schemas/workbench';
import { splitInput } from '@/lib/schemas/workbench-input';
import { computation } from '../computation';

/** A weight carried by equally spaced positions: the two on either side of it, or one. */
export const split = computation({ permission: 'workbench:use', input: splitInput }, (given) => {
  const typed = parseAngle(given.angleDeg, 'angleDeg');
  if (!typed.ok) return typed;
  const first = parseAngle(given.firstDeg, 'firstDeg');
  if (!first.ok) return first;
  const inSense = (deg: number) =>
    given.angleSense === 'with' ? rotorDegFromWithRotation(deg) : deg;
  const ring = {
    count: given.positions,
    firstDeg: inSense(first.value),
    numbered: given.numbered,
  };
  const positions = Array.from({ length: given.positions }, (_, index) => {
    const angle = angleOfPosition(index + 1, ring);
    return { label: String(index + 1), angleDeg: angle.ok ? angle.value : NaN, maxG: given.maxG };
  });
  const mass = { massG: given.massG, angleDeg: inSense(typed.value) };
  const shares = splitOntoPositions(mass, positions);
  if (!shares.ok) return shares;
  const sum = shares.value.reduce((total, { massG }) => total + massG, 0);
  return ok<SolvedSplit>({
    shares: shares.value.map((share) => ({ ...share, forceN: forceOf(share.massG, given) })),
    angleSense: given.angleSense,
    ...mass,
    sumOverWhole: sum / mass.massG,
    radiusMm: given.radiusMm,
    rotationFromDriveEnd: given.rotationFromDriveEnd,
    positions: positions.map(({ label, angleDeg }) => ({ label, angleDeg })),
  });
});

function forceOf(
  massG: number,
  { radiusMm, speedRpm }: { radiusMm: number; speedRpm: number | null },
): number | null {
  return speedRpm === null ? null : centrifugalForceN(massG * radiusMm, speedRpm);
}
