import 'server-only';
import { choosePositions } from '@/lib/domain/balancing/choose-positions';
import { angleOfPosition } from '@/lib/domain/balancing/convert-angle';
import { ok } from '@/lib/domain/result';
import type { SolvedPieces } from '@/lib/schemas/workbench-weights';
import { piecesInput } from '@/lib/schemas/workbench-weights-input';
import { computation } from '../computation';
import { typedAngles } from './typed-angles';

/** A weight put together from pieces at equally spaced positions: the best choice for one to four of them. */
export const pieces = computation({ permission: 'workbench:use', input: piecesInput }, (given) => {
  const angles = typedAngles(
    [
      { deg: given.angleDeg, field: 'angleDeg' },
      { deg: given.firstDeg, field: 'firstDeg' },
    ],
    given.angleSense,
  );
  if (!angles.ok) return angles;
  const [angleDeg = 0, firstDeg = 0] = angles.value;
  const { massG, radiusMm, rotationFromDriveEnd, angleSense, numbered, maxG } = given;
  const positions = Array.from({ length: given.positions }, (_, index) => {
    const angle = angleOfPosition(index + 1, { count: given.positions, firstDeg, numbered });
    const label = String(index + 1);
    return { id: index + 1, label, angleDeg: angle.ok ? angle.value : 0, radiusMm, roomG: maxG };
  });
  const plan = choosePositions({
    wanted: { unbalanceGmm: massG * radiusMm, angleDeg },
    positions,
    piecesG: [given.pieceG],
    targetGmm: given.mayRemainGmm,
  });
  if (!plan.ok) return plan;
  const { choices, proposal } = plan.value;
  const placeOf = (id: number) => positions.find((position) => position.id === id)?.angleDeg ?? 0;
  return ok<SolvedPieces>({
    ...{ massG, angleDeg, radiusMm, rotationFromDriveEnd, angleSense },
    positions: positions.map(({ label, angleDeg: deg }) => ({ label, angleDeg: deg })),
    choices: choices.map((choice) => ({
      weights: choice.weights.map(({ positionId, label, massG: g }) => ({
        ...{ label, massG: g, angleDeg: placeOf(positionId) },
      })),
      totalG: choice.totalG,
      residualGmm: choice.residualGmm,
      meetsTarget: choice.meetsTarget,
      proven: choice.proven,
      proposed: choice === proposal,
    })),
  });
});
