import { describe, expect, it } from 'vitest';
import { readingNoise } from '@/lib/domain/balancing/reading-noise';
import { repeatTest } from '@/lib/domain/balancing/repeat-test';
import { speedEquality } from '@/lib/domain/balancing/speed-equality';
import { runBlocks } from '@/lib/domain/balancing/weight-steps';
import type { JobInput } from '@/lib/domain/balancing/job-input';
import { fromPolar } from '@/lib/domain/complex';
import { job, run, weight } from './job-builder';
import { near } from './near';

const readings = (...list: [number, number][]) => list.map(([amp, deg]) => fromPolar(amp, deg));

describe('repeatTest', () => {
  it('3.88, 3.85 and 3.89 mm/s at 219°: mean 3.873, scatter 0.023, good', () => {
    const test = repeatTest(readings([3.88, 219], [3.85, 219], [3.89, 219]), 0.1)!;
    near(test.meanAmplitude, 3.873, 0.0005);
    near(test.scatter, 0.023, 0.0005);
    near(test.lagSpreadDeg, 0, 1e-9);
    expect(test).toMatchObject({ count: 3, good: true });
  });

  it('is not good above 5 % and above the floor, or above 5° of lag', () => {
    expect(repeatTest(readings([4, 10], [5, 10]), 0.1)!.good).toBe(false);
    expect(repeatTest(readings([4, 10], [5, 10]), 0.6)!.good).toBe(true);
    expect(repeatTest(readings([4, 357], [4, 2.9]), 1)!.good).toBe(false);
    expect(repeatTest(readings([4, 357], [4, 1.9]), 1)!.good).toBe(true);
  });

  it('measures the lag spread the short way round', () => {
    near(repeatTest(readings([4, 358], [4, 2], [4, 0]), 0.1)!.lagSpreadDeg, 4, 1e-9);
  });

  it('needs two readings', () => {
    expect(repeatTest(readings([4, 10]), 0.1)).toBeNull();
    expect(repeatTest([], 0.1)).toBeNull();
  });
});

describe('readingNoise', () => {
  const noiseOf = (input: JobInput) => readingNoise(input, runBlocks(input.runs, input.points));
  const trial = run(9, 'trial', [{ amp: 2, deg: 0 }], [weight(1, 10, 300, 0)]);
  const base = (...sizes: number[]) =>
    sizes.map((amp, i) => run(i + 1, 'base', [{ amp, deg: 50 }]));

  it('pools all blocks that repeat a state', () => {
    const again = { ...trial, id: 10, vectors: [{ pointId: 1, amplitude: 2.4, lagDeg: 0 }] };
    const [noise] = noiseOf(job([300], 1, [...base(3.9, 4.1), trial, again]));
    // Squares 2·0.1² and 2·0.2² over one degree of freedom each.
    near(noise!.deviation!, Math.sqrt((0.02 + 0.08) / 2), 1e-12);
    expect(noise).toMatchObject({ pointId: 1, from: 'repeats' });
    near(noise!.base!.scatter, 0.1, 1e-12);
    near(noise!.scatter!, 0.1, 1e-12);
  });

  it('never claims less than half a per cent of the base reading', () => {
    const [same] = noiseOf(job([300], 1, [...base(4, 4, 4), trial]));
    near(same!.deviation!, 0.02, 1e-12);
    expect(same!.base!.scatter).toBeLessThan(1e-12);
  });

  it('takes the scatter given where nothing was repeated', () => {
    const [given] = noiseOf(job([300], 1, [...base(4), trial], { scatter: 0.08 }));
    expect(given).toEqual({
      pointId: 1,
      deviation: 0.08,
      scatter: 0.08,
      from: 'given',
      base: null,
    });
  });

  it('knows nothing where nothing was repeated or given', () => {
    const [unknown] = noiseOf(job([300], 1, [...base(4), trial]));
    expect(unknown).toMatchObject({ deviation: null, scatter: null, from: 'unknown' });
  });

  it('lets displacement scatter as much as 0.1 mm/s would', () => {
    // 0.1 mm/s rms at 1480 r/min is 1.825 µm p-p.
    const good = (spread: number) =>
      noiseOf(job([300], 1, base(20 - spread, 20 + spread), { unit: 'µm p-p' }))[0]!.base!.good;
    expect([1.8, 1.85].map(good)).toEqual([true, false]);
  });
});

describe('speedEquality', () => {
  const speeds = (...list: number[]) => list.map((speedRpm, i) => ({ id: i + 1, speedRpm }));

  it('1482 then 1441 r/min is 2.77 % off: hold', () => {
    const equality = speedEquality(speeds(1482, 1441));
    near(equality.worstPct, 2.77, 0.005);
    expect(equality).toMatchObject({ verdict: 'hold', worstRunId: 2, meanRpm: 1461.5 });
  });

  it('warns above 0.5 % and holds above 1 %', () => {
    const verdicts = [1000, 1005, 1005.1, 1010, 1010.1].map(
      (speed) => speedEquality(speeds(1000, speed)).verdict,
    );
    expect(verdicts).toEqual(['good', 'good', 'warn', 'warn', 'hold']);
  });

  it('compares with the mean of the runs before, not of all', () => {
    near(speedEquality(speeds(1000, 1008, 1018)).worstPct, 100 * (14 / 1004), 1e-9);
  });

  it('a run that an engineer kept does not hold the job but is still named', () => {
    const [first, second] = speeds(1482, 1441);
    const kept = speedEquality([first!, { ...second!, speedAccepted: true }]);
    expect(kept).toMatchObject({ verdict: 'warn', worstRunId: 2 });
  });

  it('one run is equal to itself', () => {
    expect(speedEquality(speeds(1482))).toEqual({
      meanRpm: 1482,
      worstPct: 0,
      worstRunId: null,
      verdict: 'good',
    });
  });
});
