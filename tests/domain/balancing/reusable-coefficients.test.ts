import { describe, expect, it } from 'vitest';
import { knownResponse } from '@/lib/domain/balancing/known-response';
import {
  reusableCoefficients,
  type BookEstimate,
} from '@/lib/domain/balancing/reusable-coefficients';
import { trialsAgainstBook } from '@/lib/domain/balancing/trials-against-book';
import { fromPolar } from '@/lib/domain/complex';
import { job, run, weight } from './job-builder';

const estimate = (jobId: number, over: Partial<BookEstimate> = {}): BookEstimate => ({
  jobId,
  planeId: 1,
  pointId: 1,
  speedRpm: 1485,
  rePerGmm: 1e-4,
  imPerGmm: 0,
  source: 'trial',
  ...over,
});

const of = {
  planes: [{ id: 1, name: '1' }],
  points: [{ id: 1, name: 'A-H' }],
  speedRpm: 1485,
};

describe('reusableCoefficients', () => {
  it('takes one estimate a job: the fit over all its runs instead of its trial', () => {
    const book = reusableCoefficients(
      [
        estimate(1, { source: 'fit over all runs', rePerGmm: 1.1e-4 }),
        estimate(1),
        estimate(2, { rePerGmm: 1.1e-4 }),
      ],
      of,
    );
    expect(book).toMatchObject({ ok: true, value: { grade: 'good', speedRpm: 1485 } });
    const [line] = book.ok ? book.value.coefficients : [];
    expect(line?.rePerGmm).toBeCloseTo(1.1e-4, 12);
    expect(line?.spreadPct).toBeCloseTo(0, 9);
    expect(line).toMatchObject({ count: 2, jobIds: [1, 2] });
  });

  it('grades a single estimate with care', () => {
    expect(reusableCoefficients([estimate(1)], of)).toMatchObject({
      value: { grade: 'with care', coefficients: [{ spreadPct: null }] },
    });
  });

  it.each([
    ['book-empty', []],
    ['speed-differs', [estimate(1, { speedRpm: 1500.1 })]],
    ['coefficient-missing', [estimate(1, { planeId: 2 })]],
    ['estimates-disagree', [estimate(1), estimate(2, { rePerGmm: -1e-4 })]],
  ])('refuses in words: %s', (code, estimates) => {
    expect(reusableCoefficients(estimates, of)).toMatchObject({ ok: false, failure: { code } });
  });
});

describe('knownResponse', () => {
  it('names where a weight lowers the reading of the point that hears it best', () => {
    const h = fromPolar(0.163e-3, 24.9);
    const book = [
      { planeId: 1, pointId: 1, rePerGmm: h.re, imPerGmm: h.im },
      { planeId: 1, pointId: 2, rePerGmm: h.re / 2, imPerGmm: 0 },
    ];
    const now = [{ pointId: 1, amplitude: 4.39, lagDeg: 107 }];
    const known = knownResponse(1, book, now);
    expect(known?.loweringDeg).toBeCloseTo(262.1, 1);
    expect(known?.perGmm).toBeCloseTo(0.163e-3, 9);
    expect(knownResponse(2, book, now)).toBeNull();
  });
});

describe('trialsAgainstBook', () => {
  it('agrees where the rotor answers as before, and leaves out what the book does not know', () => {
    const h = fromPolar(2e-4, 30);
    const trial = weight(1, 10, 400, 0);
    const effect = fromPolar(2e-4 * 4000, 30);
    const input = job(
      [400],
      1,
      [
        run(1, 'base', [{ amp: 1, deg: 0 }]),
        run(
          2,
          'trial',
          [
            {
              amp: Math.hypot(1 + effect.re, effect.im),
              deg: (Math.atan2(effect.im, 1 + effect.re) * 180) / Math.PI,
            },
          ],
          [trial],
        ),
      ],
      { weightsNow: [] },
    );
    const book = [{ planeId: 1, pointId: 1, rePerGmm: h.re, imPerGmm: h.im }];
    const [compared] = trialsAgainstBook(input, book);
    expect(compared?.ratio).toBeCloseTo(1, 9);
    expect(compared).toMatchObject({ runId: 2, agrees: true, sensesSuspect: false });
    expect(trialsAgainstBook(input, [])).toEqual([]);
  });
});
