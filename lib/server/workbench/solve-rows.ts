import 'server-only';
import type { z } from 'zod';
import { conditionOf } from '@/lib/domain/balancing/condition';
import { parseAngle } from '@/lib/domain/balancing/convert-angle';
import { residualAfter, solveCorrection } from '@/lib/domain/balancing/solve-correction';
import { solveLimited, weightedRms } from '@/lib/domain/balancing/solve-limited';
import { angleDeg, fromPolar, scale, size, ZERO, type Complex } from '@/lib/domain/complex';
import { ok, type Result } from '@/lib/domain/result';
import type { SolvedRows } from '@/lib/schemas/workbench-weights';
import { solveRowsInput } from '@/lib/schemas/workbench-weights-input';
import { computation } from '../computation';

type Input = z.output<typeof solveRowsInput>;

/** Any number of planes, points and speeds by weighted least squares, within limits where they are given. */
export const solveRows = computation(
  { permission: 'workbench:use', input: solveRowsInput },
  (given) => {
    const vectors = vectorsOf(given);
    if (!vectors.ok) return vectors;
    const { planes, rows } = given;
    const pointWeights = rows.map(({ weight }) => weight);
    const task = { ...vectors.value, pointWeights };
    const free = solveCorrection(task);
    if (!free.ok) return free;
    const limited = solveLimited({ ...task, limitsGmm: planes.map(({ limitGmm }) => limitGmm) });
    if (!limited.ok) return limited;
    const { unbalance, atLimit, rms, rmsAtLeast } = limited.value;
    const held = atLimit.some(Boolean);
    const after = residualAfter(task, unbalance);
    const weighted = task.coefficients.map((row, p) =>
      row.map((h) => scale(h, pointWeights[p] ?? 1)),
    );
    return ok<SolvedRows>({
      planes: named(given, unbalance).map((plane, i) => ({
        ...plane,
        atLimit: atLimit[i] ?? false,
      })),
      rows: rows.map(({ label, now }, p) => ({
        label,
        before: now.size,
        after: size(after[p] ?? ZERO),
      })),
      rmsBefore: weightedRms(
        task,
        planes.map(() => ZERO),
      ),
      rmsAfter: rms,
      rmsAtLeast,
      condition: conditionOf(weighted),
      unlimited: held ? named(given, free.value) : null,
    });
  },
);

function named({ planes }: Input, unbalance: readonly Complex[]) {
  return planes.map(({ name }, i) => ({
    name,
    unbalanceGmm: size(unbalance[i] ?? ZERO),
    angleDeg: angleDeg(unbalance[i] ?? ZERO),
  }));
}

/** Readings and coefficients per g·mm as vectors, in lag. */
function vectorsOf({
  rows,
  phaseSense,
}: Input): Result<{ now: Complex[]; coefficients: Complex[][] }> {
  const inLag = (deg: number) => (phaseSense === 'lead' ? -deg : deg);
  for (const [index, { now }] of rows.entries()) {
    const phase = parseAngle(now.phaseDeg, `rows.${index}.now.phaseDeg`);
    if (!phase.ok) return phase;
  }
  return ok({
    now: rows.map(({ now }) => fromPolar(now.size, inLag(now.phaseDeg))),
    coefficients: rows.map(({ coefficients }) =>
      coefficients.map(({ perKgMm, turnDeg }) => fromPolar(perKgMm / 1000, inLag(turnDeg))),
    ),
  });
}
