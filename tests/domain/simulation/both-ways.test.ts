import { describe, expect, it } from 'vitest';
import { drawJob, TARGET_MM_S } from '@/scripts/simulate/draw-job';
import { productWay } from '@/scripts/simulate/product-way';
import { tallyOf } from '@/scripts/simulate/tally';
import { textbookWay } from '@/scripts/simulate/textbook-way';

const SEED = 4711;
const jobs = (count: number, slips: 'none' | 'always') =>
  Array.from({ length: count }, (_, i) => drawJob(SEED + 7919 * i, slips));

/** A simulation, no published source: what the rules are for must show in what jobs come to. */
describe('the textbook formula and the rules of the product', () => {
  it('on 60 jobs with a slip the rules win: more targets met, fewer machines left rougher', () => {
    const slipped = jobs(60, 'always').filter(({ slip }) => slip !== 'none');
    const a = tallyOf(slipped.map(textbookWay));
    const b = tallyOf(slipped.map(productWay));
    expect(b.endMetPct).toBeGreaterThan(a.endMetPct + 20);
    expect(b.leftRougherPct).toBeLessThan(a.leftRougherPct / 3);
  });

  it('on clean jobs with exact readings both end at rest, whatever is read first', () => {
    const exact = jobs(40, 'none')
      .filter(
        ({ planesTooClose, sensors, planes }) =>
          !planesTooClose && sensors.length === planes.length,
      )
      .map((job) => ({ ...job, noise: { share: 0.0005, deg: 0.05 }, trialShare: 1 }));
    expect(exact.length).toBeGreaterThan(20);
    for (const way of [textbookWay, productWay]) {
      const { endMetPct, rougherPct } = tallyOf(exact.map(way));
      expect(endMetPct).toBe(100);
      expect(rougherPct).toBe(0);
    }
  });

  it('on clean jobs with the usual noise both do about as well', () => {
    const clean = jobs(80, 'none').filter(({ planesTooClose }) => !planesTooClose);
    const a = tallyOf(clean.map(textbookWay));
    const b = tallyOf(clean.map(productWay));
    expect(b.endMetPct).toBeGreaterThanOrEqual(a.endMetPct - 2);
    expect(Math.abs(b.endMetPct - a.endMetPct)).toBeLessThan(10);
  });

  it('is the same for the same seed, and another job for another', () => {
    const [one, other] = jobs(2, 'always');
    expect(productWay(one!)).toEqual(productWay(one!));
    expect(drawJob(SEED, 'always')).toEqual(one);
    expect(other!.rotor.massKg).not.toBe(one!.rotor.massKg);
  });

  it('starts from readings above the target', () => {
    for (const job of jobs(60, 'none'))
      expect(textbookWay(job).worst[0]).toBeGreaterThan(2 * TARGET_MM_S);
  });
});
