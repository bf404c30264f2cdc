import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  centrifugalForceN,
  unbalanceOfForceGmm,
  weightN,
} from '@/lib/domain/balancing/centrifugal-force';
import {
  combineMasses,
  massAtRadiusG,
  slidingPair,
  splitMass,
} from '@/lib/domain/balancing/move-weight';
import {
  ledgerSum,
  polarUnbalance,
  unbalanceByPlane,
  unbalanceOf,
} from '@/lib/domain/balancing/weights-ledger';
import { codeOf, valueOf, weight } from './job-builder';
import { near, nearDeg } from './near';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe('combineMasses', () => {
  it('12 g at 40° and 9 g at 155° are 11.56 g at 84.9°', () => {
    const joined = combineMasses([
      { massG: 12, angleDeg: 40 },
      { massG: 9, angleDeg: 155 },
    ]);
    near(joined.massG, 11.56, 0.005);
    nearDeg(joined.angleDeg, 84.9, 0.05);
  });

  it('nothing comes to nothing', () => {
    expect(combineMasses([])).toEqual({ massG: 0, angleDeg: 0 });
  });
});

describe('splitMass', () => {
  it('30 g at 100° onto 80° and 140° is 22.27 and 11.85 g', () => {
    const shares = valueOf(splitMass({ massG: 30, angleDeg: 100 }, [80, 140]));
    expect(shares.map(({ massG }) => massG.toFixed(2))).toEqual(['22.27', '11.85']);
  });

  it('joined again is what was split, in either order, across the mark too', () => {
    const places = fc.tuple(number(0, 360), number(5, 170), number(0, 1));
    fc.assert(
      fc.property(number(1, 500), places, fc.boolean(), (massG, [first, apart, share], swap) => {
        const second = (first + apart) % 360;
        const angleDeg = (first + share * apart) % 360;
        const onto: [number, number] = swap ? [second, first] : [first, second];
        const shares = valueOf(splitMass({ massG, angleDeg }, onto));
        const joined = combineMasses(shares);
        near(joined.massG, massG, 1e-8 * massG);
        nearDeg(joined.angleDeg, angleDeg, 1e-6);
        shares.forEach((part) => expect(part.massG).toBeGreaterThanOrEqual(0));
      }),
    );
  });

  it('at one of the positions all of it goes there', () => {
    const shares = valueOf(splitMass({ massG: 30, angleDeg: 80 }, [80, 140]));
    expect(shares[0].massG).toBeCloseTo(30, 9);
    expect(shares[1].massG).toBe(0);
  });

  it('refuses a place outside, one position twice, and opposite ones', () => {
    const mass = { massG: 30, angleDeg: 200 };
    expect(codeOf(splitMass(mass, [80, 140]))).toBe('outside');
    expect(codeOf(splitMass(mass, [80, 80]))).toBe('in-line');
    expect(codeOf(splitMass(mass, [80, 260]))).toBe('in-line');
  });
});

describe('massAtRadiusG', () => {
  it('30 g at 400 mm is 34.09 g at 352 mm', () => {
    near(massAtRadiusG(30, 400, 352), 34.09, 0.005);
  });
});

describe('slidingPair', () => {
  const each = { massG: 10, radiusMm: 400 };

  it('both at 90° make 8000 g·mm at 90°, opposite ones make nothing', () => {
    expect(slidingPair({ unbalanceGmm: 8000, angleDeg: 90 }, each)).toEqual({
      ok: true,
      value: [90, 90],
    });
    const [first, second] = valueOf(slidingPair({ unbalanceGmm: 0, angleDeg: 30 }, each));
    nearDeg(first, 300, 1e-9);
    nearDeg(second, 120, 1e-9);
  });

  it('makes what is wanted', () => {
    fc.assert(
      fc.property(number(10, 8000), number(0, 360), (unbalanceGmm, angleDeg) => {
        const places = valueOf(slidingPair({ unbalanceGmm, angleDeg }, each));
        const made = combineMasses(places.map((deg) => ({ massG: 10, angleDeg: deg })));
        near(made.massG * 400, unbalanceGmm, 1e-6 * 8000);
        nearDeg(made.angleDeg, angleDeg, 1e-4);
      }),
    );
  });

  it('refuses more than the pair can make, and a pair of nothing', () => {
    const wanted = { unbalanceGmm: 8001, angleDeg: 90 };
    const refused = slidingPair(wanted, each);
    expect(codeOf(refused)).toBe('too-light');
    expect(refused.ok ? '' : refused.failure.message).toContain('8000 g·mm at most');
    expect(codeOf(slidingPair({ ...wanted, unbalanceGmm: 0 }, { ...each, massG: 0 }))).toBe(
      'too-light',
    );
  });
});

describe('the ledger of a plane', () => {
  it('26 g at 35° and 3 g at 295° on 400 mm are 10 260 g·mm at 28.4°', () => {
    const sum = ledgerSum([weight(1, 26, 400, 35), weight(1, 3, 400, 295)], 400);
    near(sum.unbalanceGmm, 10_260, 1);
    nearDeg(sum.angleDeg, 28.4, 0.05);
    near(sum.equivalentMassG, 25.65, 0.01);
    expect(sum).toMatchObject({ pieces: 2, sizesGmm: 11_600, cleanUp: false });
  });

  it('suggests a clean-up where much hangs and little acts', () => {
    const fighting = [weight(1, 20, 400, 0), weight(1, 18, 400, 180)];
    expect(ledgerSum(fighting, 400).cleanUp).toBe(true);
    expect(ledgerSum([weight(1, 20, 400, 0)], 400).cleanUp).toBe(false);
    expect(ledgerSum([], 400)).toMatchObject({ pieces: 0, unbalanceGmm: 0, cleanUp: false });
  });

  it('15 g at 400 mm, 0° is 6000 g·mm along the real axis', () => {
    expect(unbalanceOf({ massG: 15, radiusMm: 400, angleDeg: 0 })).toEqual({ re: 6000, im: 0 });
    expect(polarUnbalance({ re: 0, im: 5 })).toEqual({ unbalanceGmm: 5, angleDeg: 90 });
  });

  it('keeps planes apart and in the order asked for', () => {
    const weights = [weight(7, 10, 100, 0), weight(3, 5, 100, 0), weight(7, 1, 100, 0)];
    const sums = unbalanceByPlane(weights, [3, 7, 9]);
    expect(sums.map(({ re }) => re)).toEqual([500, 1100, 0]);
  });
});

describe('centrifugal force', () => {
  it('30 g at 400 mm and 1480 r/min is 288.2 N, and back', () => {
    near(centrifugalForceN(12_000, 1480), 288.2, 0.1);
    near(unbalanceOfForceGmm(288.2, 1480), 12_000, 5);
  });

  it('210 kg weigh 2059.4 N', () => {
    near(weightN(210), 2059.4, 0.05);
  });
});
