import { angleDeg, scale, size, subtract, sum, type Complex } from '../complex';
import { lagDeg, type LagDeg } from '../units';
import { solveLinear } from './solve-linear';

/** Size and lag of one order of the shaft speed, in the unit of the record. */
export type OrderVector = {
  readonly order: number;
  readonly rms: number;
  readonly lagDeg: LagDeg;
  readonly scatterRms: number | null;
};

/** A record and the instants the mark passed, seconds from its first sample, rising. */
export type RecordWithMarks = {
  readonly samples: Float64Array;
  readonly sampleRateHz: number;
  readonly edgesS: Float64Array;
};

const BLOCKS_FOR_SCATTER = 8;

/**
 * Orders 1 … `highest` (default 3) by least squares over the whole turns between the first and the
 * last tacho edge: `x = mean + Σ √2·A_k·cos(kθ − φ_k)`, θ the rotor's turn since the mark, rising
 * evenly from edge to edge. A is rms in the record's unit, φ the lag in degrees of that order. The
 * frequency is the tacho's, not that of a spectrum line. `scatterRms` is the standard error of the
 * vector, from up to 8 blocks of whole turns; null with a single turn. Needs at least 2 edges and
 * more than `2·highest + 1` samples a turn. Convention of lag: ISO 13373-1.
 *
 * Example: 5·cos(2π25t − 40°) with a mark every 0.04 s has order 1: 5/√2 rms, lag 40°.
 */
export function orderVectors(record: RecordWithMarks, highest = 3): OrderVector[] {
  const turns = record.edgesS.length - 1;
  const vectors = fitOrders(record, highest);
  const blocks = Math.min(BLOCKS_FOR_SCATTER, turns);
  const parts = Array.from({ length: blocks }, (_, b) => {
    const from = Math.floor((b * turns) / blocks);
    const to = Math.floor(((b + 1) * turns) / blocks);
    return fitOrders({ ...record, edgesS: record.edgesS.slice(from, to + 1) }, highest);
  });
  return vectors.map((vector, i) => ({
    order: i + 1,
    rms: size(vector) / Math.SQRT2,
    lagDeg: lagDeg(angleDeg(vector)),
    scatterRms: standardError(parts.flatMap((part) => part[i] ?? [])),
  }));
}

function standardError(vectors: readonly Complex[]): number | null {
  const n = vectors.length;
  if (n < 2) return null;
  const mean = scale(sum(vectors), 1 / n);
  const squares = vectors.reduce((total, v) => total + size(subtract(v, mean)) ** 2, 0);
  const error = Math.sqrt(squares / (n * (n - 1)) / 2);
  return Number.isFinite(error) ? error : null;
}

// The peak-sized vector of each order, re = cosine part, im = sine part, so its angle is the lag.
function fitOrders(record: RecordWithMarks, highest: number): Complex[] {
  const unknowns = 2 * highest + 1;
  const normal = new Float64Array(unknowns * unknowns);
  const right = new Float64Array(unknowns);
  const row = new Float64Array(unknowns);
  row[0] = 1;
  forEachSampleInTurns(record, (value, theta) => {
    for (let k = 1; k <= highest; k++) {
      row[2 * k - 1] = Math.cos(k * theta);
      row[2 * k] = Math.sin(k * theta);
    }
    accumulate(normal, right, row, value);
  });
  const solution = solveLinear(normal, right);
  return Array.from({ length: highest }, (_, i) => ({
    re: solution[2 * i + 1] ?? 0,
    im: solution[2 * i + 2] ?? 0,
  }));
}

function forEachSampleInTurns(
  { samples, sampleRateHz, edgesS }: RecordWithMarks,
  visit: (value: number, theta: number) => void,
): void {
  for (let turn = 0; turn + 1 < edgesS.length; turn++) {
    const start = edgesS[turn] ?? 0;
    const end = edgesS[turn + 1] ?? 0;
    const perSecond = (2 * Math.PI) / (end - start);
    const last = Math.min(samples.length, firstSampleAt(end, sampleRateHz));
    for (let i = firstSampleAt(start, sampleRateHz); i < last; i++) {
      visit(samples[i] ?? 0, (i / sampleRateHz - start) * perSecond);
    }
  }
}

function firstSampleAt(timeS: number, sampleRateHz: number): number {
  // An edge on a sample belongs to the turn it starts, although the product carries a rounding error.
  return Math.max(0, Math.ceil(timeS * sampleRateHz - 1e-9));
}

function accumulate(
  normal: Float64Array,
  right: Float64Array,
  row: Float64Array,
  value: number,
): void {
  const n = row.length;
  for (let i = 0; i < n; i++) {
    const x = row[i] ?? 0;
    right[i] = (right[i] ?? 0) + x * value;
    for (let j = 0; j < n; j++) {
      normal[i * n + j] = (normal[i * n + j] ?? 0) + x * (row[j] ?? 0);
    }
  }
}
