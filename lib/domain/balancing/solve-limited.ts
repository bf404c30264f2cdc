import { add, scale, size, subtract, sum, ZERO, type Complex } from '../complex';
import { ok, type Result } from '../result';
import { apply, columnOf, norm } from './complex-matrix';
import { residualAfter, solveCorrection, type CorrectionTask } from './solve-correction';

/** A correction task with the most unbalance that each plane may be given, g·mm; null: no limit. */
export type LimitedTask = CorrectionTask & { readonly limitsGmm: readonly (number | null)[] };

/** The best correction within limits, and how far from the best it can be at most. */
export type LimitedSolution = {
  readonly unbalance: readonly Complex[];
  /** Planes whose limit holds the answer back. */
  readonly atLimit: readonly boolean[];
  /** Weighted rms residual, and the lowest that any correction within the limits can have. */
  readonly rms: number;
  readonly rmsAtLeast: number;
};

const ROUNDS = 50_000;
/** The search ends when nothing better than this share of the first sum of squares can exist. */
const GAP = 1e-13;
const AT_LIMIT = 1 - 1e-6;

/**
 * The unbalance to add per plane that minimises `‖W·(V_now + H·C)‖₂` with `|C_i|` at most a limit, g·mm. The
 * problem is convex: accelerated projected gradients, with the gap to the optimum bounded by linearising
 * at the result (Frank–Wolfe), so that `rms` and `rmsAtLeast` enclose it.
 *
 * @returns the best within limits, or the failure of the task without limits
 * Source: A. Beck, M. Teboulle, "A fast iterative shrinkage-thresholding algorithm" (2009); the bound is
 *   Frank and Wolfe's (1956). @example S16: three planes, four points, two speeds → 0.252 mm/s
 */
export function solveLimited(task: LimitedTask): Result<LimitedSolution> {
  const free = solveCorrection(task);
  if (!free.ok) return free;
  const weights = task.now.map((_, p) => task.pointWeights?.[p] ?? 1);
  const now = task.now.map((v, p) => scale(v, weights[p] ?? 1));
  const rows = task.coefficients.map((row, p) => row.map((h) => scale(h, weights[p] ?? 1)));
  const lengths = free.value.map((_, i) => norm(columnOf(rows, i)) || 1);
  const scaled = rows.map((row) => row.map((h, i) => scale(h, 1 / (lengths[i] ?? 1))));
  const largest = Math.max(...free.value.map(size), 1e-9);
  const limits = lengths.map((length, i) => length * (task.limitsGmm[i] ?? 10 * largest));
  const found = descend({ now, rows: scaled }, limits);
  const unbalance = found.x.map((u, i) => scale(u, 1 / (lengths[i] ?? 1)));
  const total = weights.reduce((all, w) => all + w ** 2, 0) || 1;
  return ok({
    unbalance,
    atLimit: unbalance.map((u, i) => {
      const limit = task.limitsGmm[i] ?? null;
      return limit !== null && size(u) >= AT_LIMIT * limit;
    }),
    rms: Math.sqrt(found.squares / total),
    rmsAtLeast: Math.sqrt(Math.max(0, found.squares - found.gap) / total),
  });
}

/** The correction alone, for an answer. Source: see `solveLimited`. */
export function solveWithinLimits(task: CorrectionTask): Result<Complex[]> {
  const limited = solveLimited({ ...task, limitsGmm: task.limitsGmm ?? [] });
  return limited.ok ? ok([...limited.value.unbalance]) : limited;
}

/**
 * Weighted rms of what the points show after unbalance `added`, g·mm per plane, with the squares of the
 * weights as shares. Example: points of 3 and 4 with weight 1 each have √12.5.
 */
export function weightedRms(task: CorrectionTask, added: readonly Complex[]): number {
  const weights = task.now.map((_, p) => task.pointWeights?.[p] ?? 1);
  const residual = residualAfter(task, added);
  const squares = residual.reduce((all, v, p) => all + ((weights[p] ?? 1) * size(v)) ** 2, 0);
  return Math.sqrt(squares / (weights.reduce((all, w) => all + w ** 2, 0) || 1));
}

type Rows = { readonly now: readonly Complex[]; readonly rows: readonly (readonly Complex[])[] };
type Found = { x: Complex[]; squares: number; gap: number };

/** Columns have length one, so that the largest eigenvalue of HᴴH is at most their number. */
function descend(of: Rows, limits: readonly number[]): Found {
  const step = 1 / (2 * limits.length);
  let x = limits.map(() => ZERO);
  let ahead = x;
  let momentum = 1;
  const first = norm(of.now) ** 2;
  for (let round = 0; round < ROUNDS; round++) {
    const slope = gradient(of, ahead);
    const next = ahead.map((u, i) =>
      within(subtract(u, scale(slope[i] ?? ZERO, step)), limits[i] ?? 0),
    );
    const grown = (1 + Math.sqrt(1 + 4 * momentum ** 2)) / 2;
    const push = (momentum - 1) / grown;
    // A step uphill starts the acceleration anew.
    const uphill = dotReal(subtractAll(ahead, next), subtractAll(next, x)) > 0;
    ahead = uphill ? next : next.map((u, i) => add(u, scale(subtract(u, x[i] ?? ZERO), push)));
    momentum = uphill ? 1 : grown;
    x = next;
    if (round % 20 === 0 && gapAt(of, x, limits) <= GAP * first) break;
  }
  return { x, squares: norm(residual(of, x)) ** 2, gap: gapAt(of, x, limits) };
}

/** No point within the limits has a sum of squares lower by more than this. */
function gapAt(of: Rows, x: readonly Complex[], limits: readonly number[]): number {
  const slope = gradient(of, x);
  const own = dotReal(slope, x);
  const lowest = slope.reduce((total, s, i) => total - (limits[i] ?? 0) * size(s), 0);
  return Math.max(0, own - lowest);
}

function residual({ now, rows }: Rows, x: readonly Complex[]): Complex[] {
  return apply(rows, x).map((effect, p) => add(now[p] ?? ZERO, effect));
}

/** Twice Hᴴ·(V + H·x). */
function gradient(of: Rows, x: readonly Complex[]): Complex[] {
  const left = residual(of, x);
  return x.map((_, i) =>
    scale(sum(left.map((v, p) => timesConjugate(v, of.rows[p]?.[i] ?? ZERO))), 2),
  );
}

function within(u: Complex, limit: number): Complex {
  const length = size(u);
  return length <= limit ? u : scale(u, limit / length);
}

function timesConjugate(v: Complex, h: Complex): Complex {
  return { re: v.re * h.re + v.im * h.im, im: v.im * h.re - v.re * h.im };
}

function subtractAll(a: readonly Complex[], b: readonly Complex[]): Complex[] {
  return a.map((u, i) => subtract(u, b[i] ?? ZERO));
}

function dotReal(a: readonly Complex[], b: readonly Complex[]): number {
  return a.reduce((total, u, i) => total + u.re * (b[i]?.re ?? 0) + u.im * (b[i]?.im ?? 0), 0);
}
