import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { solveCorrection, solveCouplePair } from '@/lib/domain/balancing/solve-correction';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { solveLimited, weightedRms } from '@/lib/domain/balancing/solve-limited';
import { add, fromPolar, scale, size, subtract, type Complex } from '@/lib/domain/complex';
import { job, run, valueOf, weight } from './job-builder';

const vector = fc
  .record({ size: fc.double({ min: 0.1, max: 5, noNaN: true }), deg: fc.nat(359) })
  .map(({ size: length, deg }) => fromPolar(length, deg));
const rows = fc.array(fc.tuple(vector, vector, vector), { minLength: 3, maxLength: 5 });

describe('solveLimited, whatever the rotor', () => {
  it('is the free solution where the limits are wide, and never better than it', () => {
    fc.assert(
      fc.property(rows, fc.double({ min: 0.05, max: 1, noNaN: true }), (found, share) => {
        const now = found.map(([v]) => v);
        const coefficients = found.map(([, a, b]) => [a, b]);
        const free = solveCorrection({ now, coefficients });
        if (!free.ok) return;
        const sizes = free.value.map(size);
        if (sizes.some((length) => length > 1e3)) return;
        const wide = valueOf(
          solveLimited({ now, coefficients, limitsGmm: sizes.map((length) => 2 * length + 1) }),
        );
        wide.unbalance.forEach((u, i) =>
          expect(size(subtract(u, free.value[i]!))).toBeLessThan(1e-4 * (1 + sizes[i]!)),
        );
        const limitsGmm = sizes.map((length) => share * length);
        const tight = valueOf(solveLimited({ now, coefficients, limitsGmm }));
        tight.unbalance.forEach((u, i) =>
          expect(size(u)).toBeLessThanOrEqual(limitsGmm[i]! * (1 + 1e-9)),
        );
        expect(tight.rms).toBeGreaterThanOrEqual(wide.rms - 1e-9);
        expect(tight.rms - tight.rmsAtLeast).toBeLessThan(1e-3);
      }),
      { numRuns: 40 },
    );
  });

  it('is no worse than any other correction within the limits', () => {
    fc.assert(
      fc.property(rows, fc.array(fc.tuple(vector, vector), { minLength: 20 }), (found, tried) => {
        const now = found.map(([v]) => v);
        const coefficients = found.map(([, a, b]) => [a, b]);
        const task = { now, coefficients, limitsGmm: [0.4, null] };
        const limited = solveLimited(task);
        if (!limited.ok) return;
        for (const [one, other] of tried) {
          const inside = scale(one, 0.4 / Math.max(0.4, size(one)));
          expect(weightedRms(task, [inside, other])).toBeGreaterThanOrEqual(
            limited.value.rmsAtLeast - 1e-9,
          );
        }
      }),
      { numRuns: 25 },
    );
  });
});

describe('a part of the unbalance only', () => {
  const h: [Complex, Complex][] = [
    [fromPolar(2e-4, 40), fromPolar(0.7e-4, 70)],
    [fromPolar(0.6e-4, 20), fromPolar(1.9e-4, 300)],
  ];
  const base = [
    { amp: 3, deg: 100 },
    { amp: 2, deg: 260 },
  ];
  const trialRun = (plane: 0 | 1) =>
    base.map(({ amp, deg }, p) => {
      const v = add(fromPolar(amp, deg), scale(h[p]![plane], 20 * 400));
      return { amp: size(v), deg: (Math.atan2(v.im, v.re) * 180) / Math.PI };
    });
  const runs = [
    run(1, 'base', base),
    run(2, 'trial', trialRun(0), [weight(1, 20, 400, 0)]),
    run(3, 'trial', trialRun(1), [weight(2, 20, 400, 0)]),
  ];
  const input = (over: object) => ({ ...job([400, 400], 2, runs, { weightsNow: [] }), ...over });

  it('static only: one and the same weight in both planes', () => {
    const { answer, alternatives } = valueOf(solveJob(input({ only: 'static' })));
    const [first, second] = answer!.add;
    expect(answer!.kind).toBe('static pair');
    expect(first!.unbalanceGmm).toBeCloseTo(second!.unbalanceGmm, 9);
    expect(first!.angleDeg).toBeCloseTo(second!.angleDeg, 9);
    expect(alternatives.map(({ kind }) => kind)).toEqual(['exact']);
  });

  it('couple only: the same weight opposite, and the sum of both is nothing', () => {
    const { answer } = valueOf(solveJob(input({ only: 'couple' })));
    const [first, second] = answer!.add;
    expect(answer!.kind).toBe('couple pair');
    expect(first!.unbalanceGmm).toBeCloseTo(second!.unbalanceGmm, 9);
    expect(answer!.sumOverTotal).toBeLessThan(1e-9);
    expect(
      solveCouplePair({ now: [base].map(() => fromPolar(1, 0)), coefficients: [[h[0]![0]]] }),
    ).toMatchObject({ failure: { code: 'not-two-planes' } });
  });

  it('a plane without room is given what it may carry, and the notice says what is missed', () => {
    const planes = job([400, 400], 2, runs, {}).planes;
    const free = valueOf(solveJob(input({})));
    const roomG = free.answer!.add[0]!.massG / 2;
    const limited = valueOf(
      solveJob(
        input({ planes: planes.map((plane, i) => (i === 0 ? { ...plane, roomG } : plane)) }),
      ),
    );
    expect(limited.answer!.kind).toBe('within limits');
    expect(limited.answer!.add[0]!.massG).toBeCloseTo(roomG, 6);
    expect(limited.alternatives[0]!.kind).toBe('exact');
    expect(limited.notices.map(({ code }) => code)).toContain('plane-limit');
    const roomy = planes.map((plane) => ({ ...plane, roomG: 1e6 }));
    expect(valueOf(solveJob(input({ planes: roomy }))).answer!.kind).toBe('exact');
  });
});
