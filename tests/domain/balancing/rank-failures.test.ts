import { describe, expect, it } from 'vitest';
import { explainRank } from '@/lib/domain/balancing/explain-rank';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { codeOf, job, run, valueOf, weight, type Polar } from './job-builder';

const base: Polar[] = [
  { amp: 4.4, deg: 107 },
  { amp: 3.1, deg: 20 },
];
const after: Polar[] = [
  { amp: 3.2, deg: 140 },
  { amp: 2.6, deg: 31 },
];
const later: Polar[] = [
  { amp: 4.9, deg: 99 },
  { amp: 2.2, deg: 300 },
];
const on = (planeId: number, deg = 0) => weight(planeId, 20, 300, deg);
const twoPlanes = (...trials: { readings: Polar[]; weights: ReturnType<typeof weight>[] }[]) =>
  job(
    [300, 300],
    2,
    [
      run(1, 'base', base),
      ...trials.map(({ readings, weights }, i) => run(i + 2, 'trial', readings, weights)),
    ],
    { weightsNow: [] },
  );

function refusal(input: JobInput): { code: string; message: string; field?: string } {
  const result = solveJob(input);
  if (result.ok) throw new Error('The runs were solved.');
  return result.failure;
}

describe('runs that cannot be solved are refused in words', () => {
  it('no trial at all, naming both planes', () => {
    const { code, message } = refusal(twoPlanes());
    expect(code).toBe('no-trial');
    expect(message).toContain('planes P1 and P2');
  });

  it('no trial in one plane, naming it', () => {
    const { code, message } = refusal(twoPlanes({ readings: after, weights: [on(1)] }));
    expect(code).toBe('no-trial');
    expect(message).toContain('plane P2');
    expect(message).not.toContain('P1');
  });

  it('both planes only ever changed together', () => {
    const both = [on(1), on(2, 90)];
    const half = both.map((w) => ({ ...w, massG: w.massG / 2 }));
    const { code, message } = refusal(
      twoPlanes({ readings: after, weights: both }, { readings: later, weights: half }),
    );
    expect(code).toBe('planes-together');
    expect(message).toMatch(/P1 and P2.*only one of them/);
  });

  it('no base: a weight that is always there tells nothing', () => {
    const input = job([300], 1, [run(1, 'trial', [base[0]!], [on(1)])]);
    expect(refusal(input).code).toBe('no-trial');
    const same = job([300], 1, [
      run(1, 'base', [base[0]!], [on(1)]),
      run(2, 'trial', [after[0]!], [on(1)]),
    ]);
    expect(refusal(same).code).toBe('no-trial');
  });

  it('a trial weight of nothing, with its field', () => {
    const input = twoPlanes({ readings: after, weights: [{ ...on(1), massG: 0 }] });
    expect(refusal(input)).toMatchObject({
      code: 'weight-zero',
      field: 'runs.1.weights.0.massG',
    });
  });

  it('a trial that changed nothing anywhere', () => {
    const input = job([300], 2, [run(1, 'base', base), run(2, 'trial', base, [on(1)])], {
      weightsNow: [],
    });
    expect(refusal(input).code).toBe('no-response');
  });

  it.each([
    ['the second', after, base, 'plane P2'],
    ['the first', base, after, 'plane P1'],
  ])('%s trial of two changed nothing: no weight of tons, in words', (_, one, two, named) => {
    const { code, message } = refusal(
      twoPlanes({ readings: one, weights: [on(1)] }, { readings: two, weights: [on(2)] }),
    );
    expect(code).toBe('no-response');
    expect(message).toContain(named);
  });

  it('a second trial that changed nothing beside the first, which stayed on', () => {
    const { code, message } = refusal(
      twoPlanes(
        { readings: after, weights: [on(1)] },
        { readings: after, weights: [on(1), on(2)] },
      ),
    );
    expect(code).toBe('no-response');
    expect(message).toContain('plane P2');
  });

  it('no run at all', () => {
    expect(explainRank([], ['P1'])?.code).toBe('no-runs');
    expect(refusal(job([300], 1, [])).code).toBe('no-runs');
  });

  it('runs chosen for the coefficients that leave a plane out', () => {
    const input = twoPlanes(
      { readings: after, weights: [on(1)] },
      { readings: later, weights: [on(2)] },
    );
    expect(codeOf(solveJob(input))).toBe('ok');
    const chosen = { kind: 'chosen runs', runIds: [1, 2] } as const;
    expect(refusal({ ...input, coefficientsFrom: chosen }).code).toBe('no-trial');
  });
});

describe('planes that points cannot tell apart', () => {
  // Both planes change both points alike: the same trial effect twice.
  const same = twoPlanes(
    { readings: after, weights: [on(1)] },
    { readings: after, weights: [on(2)] },
  );

  it('give no exact answer, not even to accept; an equal pair is offered', () => {
    const { answer, withheld, condition } = valueOf(solveJob(same));
    expect(condition).toEqual({ number: 1e9, verdict: 'withhold' });
    expect(withheld!.failure.code).toBe('planes-indistinguishable');
    expect(withheld!.failure.message).toContain('P1 and P2');
    expect(withheld!.answer).toBeNull();
    expect(answer!.kind).toBe('static pair');
    const [one, two] = answer!.add;
    expect(one!.massG).toBe(two!.massG);
    expect(one!.angleDeg).toBe(two!.angleDeg);
  });
});
