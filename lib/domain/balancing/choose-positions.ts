import { add, angleDeg, fromPolar, scale, size, subtract, ZERO, type Complex } from '../complex';
import { fail, ok, type Result } from '../result';
import { stockMasses } from './stock-masses';
import type { PolarUnbalance } from './weights-ledger';

/** A fixed place of a plane; `roomG`: limit less what hangs there, null where no limit is stated. */
export type OpenPosition = {
  readonly id: number;
  readonly label: string;
  /** Degrees against rotation from the mark. */
  readonly angleDeg: number;
  readonly radiusMm: number;
  readonly roomG: number | null;
};

/** One plane with fixed positions and the pieces that can be hung there. */
export type PositionTask = {
  /** What the plane should be given, g·mm and degrees against rotation. */
  readonly wanted: Pick<PolarUnbalance, 'unbalanceGmm' | 'angleDeg'>;
  readonly positions: readonly OpenPosition[];
  /** Sizes of the pieces in the stock, g; as many of each as are needed. */
  readonly piecesG: readonly number[];
  /** Good enough: what may remain, g·mm. */
  readonly targetGmm: number;
  /** Most positions that may take a weight; 4 unless said. */
  readonly most?: number;
};

/** What to hang at one position. */
export type PositionWeight = {
  readonly positionId: number;
  readonly label: string;
  readonly massG: number;
};

/** The best choice with so many positions. */
export type PositionChoice = {
  readonly weights: readonly PositionWeight[];
  readonly totalG: number;
  /** What remains of the wanted unbalance, g·mm; and what was placed, for the prediction. */
  readonly residualGmm: number;
  readonly placed: PolarUnbalance;
  readonly meetsTarget: boolean;
  /** Every combination was tried, or could not be better; otherwise the search was stopped. */
  readonly proven: boolean;
};

/** The proposal and the best choice for every number of positions. */
export type PositionPlan = {
  readonly proposal: PositionChoice;
  readonly choices: readonly PositionChoice[];
};

const MOST = 4;
/** So many combinations are tried for one number of positions before the search stops. */
const BUDGET = 2_000_000;

/**
 * Pieces from a stock at fixed positions: for one, two, three … positions the choice with the least residual
 * (then the least mass), by trying every combination; the last position of each is solved for directly. The
 * proposal has the fewest positions that meet the target; where none does, the least residual.
 *
 * @returns the plan, or a failure where there is no piece, no room, or nothing wanted
 * Source: exhaustive search; the rule is practice (no published source).
 * @example S04: 90.8 g at 129° on seven blades with 5 g pieces → 10, 40 and 60 g on blades 2, 3 and 4
 */
export function choosePositions(task: PositionTask): Result<PositionPlan> {
  const refused = refusal(task);
  if (refused) return refused;
  const places = task.positions.flatMap((position) => placeOf(position, task));
  if (places.length === 0)
    return fail(
      'no-room',
      'No position has room for a piece of the stock. Take old weights off first, or use smaller pieces.',
    );
  const most = Math.min(task.most ?? MOST, places.length);
  const choices: PositionChoice[] = [];
  for (let count = 1; count <= most; count++) choices.push(bestWith(count, places, task));
  const proposal =
    choices.find(({ meetsTarget }) => meetsTarget) ??
    choices.reduce((best, next) => (next.residualGmm < best.residualGmm ? next : best));
  return ok({ proposal, choices });
}

type Place = {
  readonly position: OpenPosition;
  /** One gram there, g·mm. */
  readonly perG: Complex;
  /** What can be hung there, g, ascending. */
  readonly masses: readonly number[];
};

type Best = { residual: number; totalG: number; weights: readonly (readonly [Place, number])[] };

function placeOf(position: OpenPosition, { piecesG, wanted }: PositionTask): Place[] {
  // More than three times the wanted weight at one place is never part of a good choice.
  const useful = (3 * wanted.unbalanceGmm) / position.radiusMm + Math.max(...piecesG);
  const masses = stockMasses(piecesG, Math.min(position.roomG ?? useful, useful));
  const perG = fromPolar(position.radiusMm, position.angleDeg);
  return masses.length > 0 ? [{ position, perG, masses }] : [];
}

function bestWith(count: number, places: readonly Place[], task: PositionTask): PositionChoice {
  const wanted = fromPolar(task.wanted.unbalanceGmm, task.wanted.angleDeg);
  const search = { left: BUDGET, best: null as Best | null };
  const visit = (from: number, rest: Complex, hung: readonly (readonly [Place, number])[]) => {
    for (let at = from; at <= places.length - (count - hung.length); at++) {
      const place = places[at];
      if (!place || search.left <= 0) return;
      const last = hung.length === count - 1;
      for (const massG of last ? nearest(place, rest) : place.masses) {
        search.left -= 1;
        const now = subtract(rest, scale(place.perG, massG));
        const next = [...hung, [place, massG] as const];
        if (last) search.best = better(search.best, now, next);
        else visit(at + 1, now, next);
      }
    }
  };
  visit(0, wanted, []);
  return choiceOf(search.best, { wanted, target: task.targetGmm, proven: search.left > 0 });
}

/** The masses on either side of the one that leaves least: the residual is a parabola in the mass. */
function nearest({ perG, masses }: Place, rest: Complex): number[] {
  const ideal = (rest.re * perG.re + rest.im * perG.im) / (perG.re ** 2 + perG.im ** 2);
  const above = masses.findIndex((mass) => mass >= ideal);
  if (above < 0) return masses.slice(-1);
  return masses.slice(Math.max(0, above - 1), above + 1);
}

const SAME = 1e-9;

function better(best: Best | null, rest: Complex, weights: Best['weights']): Best {
  const residual = size(rest);
  const totalG = weights.reduce((total, [, massG]) => total + massG, 0);
  if (!best) return { residual, totalG, weights };
  const gain = best.residual - residual;
  const same = Math.abs(gain) <= SAME * Math.max(1, best.residual);
  if (same ? totalG < best.totalG : gain > 0) return { residual, totalG, weights };
  return best;
}

function choiceOf(
  best: Best | null,
  { wanted, target, proven }: { wanted: Complex; target: number; proven: boolean },
): PositionChoice {
  const weights = best?.weights ?? [];
  const placed = weights.reduce((sum, [{ perG }, massG]) => add(sum, scale(perG, massG)), ZERO);
  const residualGmm = best?.residual ?? size(wanted);
  return {
    weights: weights.map(([{ position }, massG]) => ({
      positionId: position.id,
      label: position.label,
      massG,
    })),
    totalG: best?.totalG ?? 0,
    residualGmm,
    placed: { unbalanceGmm: size(placed), angleDeg: angleDeg(placed) },
    meetsTarget: residualGmm <= target,
    proven,
  };
}

function refusal({ positions, piecesG, wanted, targetGmm }: PositionTask): Result<never> | null {
  if (positions.length === 0)
    return fail('no-positions', 'The plane has no positions. Record them on the machine page.');
  if (piecesG.length === 0 || piecesG.some((piece) => !(piece > 0)))
    return fail('no-pieces', 'Say which pieces there are: at least one size above 0 g.', 'piecesG');
  if (!(wanted.unbalanceGmm > 0))
    return fail('nothing-wanted', 'Nothing is to be added in this plane.');
  if (!(targetGmm >= 0))
    return fail('target', 'What may remain must be 0 g·mm or more.', 'targetGmm');
  const nameless = positions.find(({ label }) => label.trim() === '');
  if (!nameless) return null;
  return fail('no-label', 'A position has no name, so nobody could find it on the rotor.');
}
