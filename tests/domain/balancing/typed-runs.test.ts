import { describe, expect, it } from 'vitest';
import { solveJob } from '@/lib/domain/balancing/solve-job';
import { jobFromTypedRuns, type TypedRuns } from '@/lib/domain/balancing/typed-runs';
import { solveWithoutPhase, type PhaselessRuns } from '@/lib/domain/balancing/without-phase';
import { codeOf, valueOf } from './job-builder';
import { near, nearDeg } from './near';

const typed: TypedRuns = {
  unit: 'mm/s rms',
  phaseSense: 'lag',
  angleSense: 'against',
  speedRpm: 1480,
  planes: [{ name: 'W', radiusMm: 400 }],
  points: ['DE H'],
  base: [[{ amplitude: 3.873, phaseDeg: 219 }]],
  trials: [
    {
      massG: 15,
      radiusMm: 400,
      angleDeg: 0,
      stays: false,
      readings: [{ amplitude: 2.46, phaseDeg: 251 }],
    },
  ],
};
const [trial] = typed.trials;

describe('jobFromTypedRuns', () => {
  it('makes two runs of a base and a trial that came off, with nothing on now', () => {
    const input = valueOf(jobFromTypedRuns(typed));
    expect(input.runs.map(({ purpose }) => purpose)).toEqual(['base', 'trial']);
    expect(input.weightsNow).toEqual([]);
    const [plane] = valueOf(solveJob(input)).answer!.add;
    near(plane!.massG, 26.27, 0.01);
    nearDeg(plane!.angleDeg, 36.1, 0.05);
  });

  it('keeps a trial that stays on the runs after it', () => {
    const two = {
      ...typed,
      planes: [...typed.planes, { name: 'E', radiusMm: 350 }],
      points: ['DE H', 'NDE H'],
      base: [[...typed.base[0]!, { amplitude: 2, phaseDeg: 10 }]],
      trials: [true, false].map((stays) => ({
        ...trial!,
        stays,
        readings: [...trial!.readings, { amplitude: 2.4, phaseDeg: 40 }],
      })),
    };
    const { runs, weightsNow, planes, points } = valueOf(jobFromTypedRuns(two));
    expect(runs.map(({ weights }) => weights.map(({ planeId }) => planeId))).toEqual([
      [],
      [1],
      [1, 2],
    ]);
    expect(weightsNow!.map(({ planeId }) => planeId)).toEqual([1]);
    expect(planes.map(({ id, name }) => [id, name])).toEqual([
      [1, 'W'],
      [2, 'E'],
    ]);
    expect(points.map(({ id, label }) => [id, label])).toEqual([
      [1, 'DE H'],
      [2, 'NDE H'],
    ]);
  });

  it('converts senses once: lead becomes lag, with rotation becomes against', () => {
    const other = {
      ...typed,
      phaseSense: 'lead',
      angleSense: 'with',
      trials: [{ ...trial!, angleDeg: 75 }],
    } as const;
    const { runs } = valueOf(jobFromTypedRuns(other));
    expect(runs[0]!.vectors[0]!.lagDeg).toBe(141);
    expect(runs[1]!.weights[0]!.angleDeg).toBe(285);
  });

  it('numbers repeats of the base run as runs of their own', () => {
    const { runs } = valueOf(jobFromTypedRuns({ ...typed, base: [...typed.base, ...typed.base] }));
    expect(runs.map(({ id, label }) => [id, label])).toEqual([
      [1, 'run 1'],
      [2, 'run 2'],
      [3, 'run 3'],
    ]);
  });

  it.each([
    [{ base: [[{ amplitude: 3, phaseDeg: 361 }]] }, 'base.0.0.phaseDeg'],
    [{ trials: [{ ...trial!, angleDeg: -1 }] }, 'trials.0.angleDeg'],
    [
      { trials: [{ ...trial!, readings: [{ amplitude: 3, phaseDeg: NaN }] }] },
      'trials.0.readings.0.phaseDeg',
    ],
  ])('refuses an angle outside 0 to 360 at its field', (over, field) => {
    expect(jobFromTypedRuns({ ...typed, ...over })).toMatchObject({
      ok: false,
      failure: { code: 'angle-range', field },
    });
  });
});

describe('solveWithoutPhase', () => {
  /** Sizes of a rotor that shows `v0` at 0° and whose mass of 10 g does `effect` at lag `deg`. */
  const sizes = (v0: number, effect: number, deg: number, places: readonly number[]) => ({
    baseAmplitude: v0,
    trialMassG: 10,
    runs: places.map((angleDeg) => {
      const turn = ((deg - angleDeg) * Math.PI) / 180;
      return {
        angleDeg,
        amplitude: Math.sqrt(v0 ** 2 + effect ** 2 + 2 * v0 * effect * Math.cos(turn)),
      };
    }),
  });

  it.each([
    { places: [0, 120, 240] },
    { places: [10, 100, 200] },
    { places: [0, 90, 180, 270] },
    { places: [0, 0, 45, 300, 200] },
  ])('finds the opposite of the effect from positions $places', ({ places }) => {
    const answer = valueOf(solveWithoutPhase(sizes(4, 1.6, 77, places)));
    near(answer.massG, 25, 1e-9);
    nearDeg(answer.angleDeg, 257, 1e-9);
    near(answer.consistency, 1, 1e-9);
    expect(answer).toMatchObject({ trusted: true });
  });

  it('does not trust sizes that do not fit together', () => {
    const good = sizes(4, 1.6, 77, [0, 120, 240]);
    const [first, ...rest] = good.runs;
    const bent = { ...good, runs: [{ ...first!, amplitude: first!.amplitude + 1.5 }, ...rest] };
    const answer = valueOf(solveWithoutPhase(bent));
    expect(answer.consistency).toBeLessThan(0.85);
    expect(answer.trusted).toBe(false);
  });

  const base = sizes(4, 1.6, 77, [0, 120, 240]);
  it.each<[string, PhaselessRuns, string]>([
    ['two positions', sizes(4, 1.6, 77, [0, 180]), 'too-few-positions'],
    ['one position three times', sizes(4, 1.6, 77, [0, 120, 120, 480]), 'too-few-positions'],
    ['a base of zero', { ...base, baseAmplitude: 0 }, 'weight-zero'],
    ['no trial mass', { ...base, trialMassG: 0 }, 'weight-zero'],
    [
      'runs smaller than base on average',
      { ...base, runs: base.runs.map((r) => ({ ...r, amplitude: 3 })) },
      'impossible-sizes',
    ],
  ])('refuses %s', (_, runs, code) => {
    expect(codeOf(solveWithoutPhase(runs))).toBe(code);
  });
});
