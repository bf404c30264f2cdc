import { fromPolar, ZERO, type Complex } from '../complex';
import { ok, type Result } from '../result';
import { uncertainties, type AnswerTask } from './build-answer';
import { moveToTolerancePlanes, residualInPlanes } from './residual-unbalance';
import { permissibleUnbalance, shareByLever, type LeverGeometry } from './permissible-unbalance';
import { coefficientMatrix } from './response-model';
import { polarUnbalance, type PolarUnbalance } from './weights-ledger';

/** Residual unbalance of one plane against what is allowed there, g·mm. */
export type ToleranceLine = PolarUnbalance & {
  readonly name: string;
  readonly allowedGmm: number;
  readonly uncertaintyGmm: number | null;
  /** `met`: U + dU ≤ allowed; `not met`: U − dU above it; `not certain`: between. */
  readonly verdict: 'met' | 'not met' | 'not certain';
};

/** Residual unbalance as it is now: an estimate in place, from the rotor's answer to weights. */
export type ToleranceEstimate = {
  readonly gradeMmS: number;
  readonly specificUm: number;
  readonly totalGmm: number;
  /** Residual in the correction planes, before anything is moved. */
  readonly correctionPlanes: readonly (PolarUnbalance & {
    readonly planeId: number;
    readonly uncertaintyGmm: number | null;
  })[];
  /** Where the allowance is stated: the bearings where the geometry is known, else correction planes. */
  readonly statedAt: 'tolerance planes' | 'correction planes';
  readonly lines: readonly ToleranceLine[];
  readonly verdict: ToleranceLine['verdict'];
};

/**
 * Residual unbalance estimated in place, `U = H⁺·V_now`, moved to the tolerance planes as vectors where
 * the geometry is known, and compared with ISO 21940-11's permissible residual unbalance and with its own
 * uncertainty. Null where no grade is asked for. Vibration limits are a separate verdict.
 * Source: ISO 21940-11 (grade, lever rule); ISO 21940-14 (uncertainty, from memory).
 * Example: S02 → 2013 and 4666 g·mm in the planes, 1916 and 3732 at the bearings, 19 446 allowed each.
 */
export function toleranceEstimate(task: AnswerTask): Result<ToleranceEstimate | null> {
  const { input, basis, meanRpm } = task;
  const grade = input.rotor?.balanceGrade ?? null;
  if (!input.rotor || grade === null) return ok(null);
  const speedRpm = input.rotor.serviceSpeedRpm ?? meanRpm;
  const allowed = permissibleUnbalance(grade, input.rotor.massKg, speedRpm);
  if (!allowed.ok) return allowed;
  const now = input.points.map(({ id }) => {
    const vector = basis.now.find(({ pointId }) => pointId === id);
    return vector ? fromPolar(vector.amplitude, vector.lagDeg) : ZERO;
  });
  const residual = residualInPlanes(now, coefficientMatrix(basis.model, input));
  const spread = uncertainties(task, 'exact', residual);
  const lines = statedLines(task, { residual, spread, totalGmm: allowed.value.totalGmm });
  if (!lines.ok) return lines;
  return ok({
    gradeMmS: grade,
    ...allowed.value,
    correctionPlanes: input.planes.map((plane, i) => ({
      planeId: plane.id,
      ...polarUnbalance(residual[i] ?? ZERO),
      uncertaintyGmm: spread[i] ?? null,
    })),
    ...lines.value,
    verdict: worstOf(lines.value.lines.map(({ verdict }) => verdict)),
  });
}

type Estimated = {
  readonly residual: readonly Complex[];
  readonly spread: readonly (number | null)[];
  readonly totalGmm: number;
};

function statedLines(
  { input }: AnswerTask,
  { residual, spread, totalGmm }: Estimated,
): Result<Pick<ToleranceEstimate, 'statedAt' | 'lines'>> {
  const geometry = leverGeometry(input.rotor);
  const places = input.planes.map(({ fromAM }) => fromAM ?? NaN);
  if (!geometry || places.some(Number.isNaN)) {
    const each = totalGmm / input.planes.length;
    const lines = input.planes.map((plane, i) =>
      line({ name: plane.name, vector: residual[i] ?? ZERO, dU: spread[i] ?? null }, each),
    );
    return ok({ statedAt: 'correction planes', lines });
  }
  const shares = shareByLever(totalGmm, geometry);
  if (!shares.ok) return shares;
  const moved = moveToTolerancePlanes(residual, places, geometry.apartM);
  const dU = (share: (z: number) => number) =>
    rootOfSquares(places.map((z, i) => times(spread[i] ?? null, share(z / geometry.apartM))));
  return ok({
    statedAt: 'tolerance planes',
    lines: [
      line({ name: 'A', vector: moved.a, dU: dU((z) => 1 - z) }, shares.value.aGmm),
      line({ name: 'B', vector: moved.b, dU: dU((z) => z) }, shares.value.bGmm),
    ],
  });
}

function leverGeometry(rotor: AnswerTask['input']['rotor']): LeverGeometry | null {
  const apartM = rotor?.tolerancePlanesApartM ?? null;
  const massCentreFromAM = rotor?.massCentreFromAM ?? null;
  if (apartM === null || massCentreFromAM === null) return null;
  return { apartM, massCentreFromAM, arrangement: rotor?.arrangement ?? 'inboard' };
}

function line(
  { name, vector, dU }: { name: string; vector: Complex; dU: number | null },
  allowedGmm: number,
): ToleranceLine {
  const { unbalanceGmm, angleDeg: deg } = polarUnbalance(vector);
  const margin = dU ?? 0;
  const verdict =
    unbalanceGmm + margin <= allowedGmm
      ? 'met'
      : unbalanceGmm - margin > allowedGmm
        ? 'not met'
        : 'not certain';
  return { name, unbalanceGmm, angleDeg: deg, allowedGmm, uncertaintyGmm: dU, verdict };
}

function worstOf(verdicts: readonly ToleranceLine['verdict'][]): ToleranceLine['verdict'] {
  if (verdicts.includes('not met')) return 'not met';
  return verdicts.includes('not certain') ? 'not certain' : 'met';
}

function rootOfSquares(parts: readonly (number | null)[]): number | null {
  const known = parts.filter((part) => part !== null);
  return known.length === parts.length ? Math.hypot(...known) : null;
}

function times(value: number | null, factor: number): number | null {
  return value === null ? null : value * factor;
}
