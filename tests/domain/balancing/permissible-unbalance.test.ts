import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { permissibleUnbalance, shareByLever } from '@/lib/domain/balancing/permissible-unbalance';
import { QUALITY_GRADES } from '@/lib/domain/balancing/quality-grades';
import {
  moveToTolerancePlanes,
  residualInPlanes,
  staticAndCouple,
  sumOverTotal,
} from '@/lib/domain/balancing/residual-unbalance';
import { add, angleDeg, fromPolar, scale, size, subtract } from '@/lib/domain/complex';
import { codeOf, valueOf } from './job-builder';
import { near, nearDeg } from './near';

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const vectors = fc.tuple(number(0, 9000), number(0, 360)).map(([amp, deg]) => fromPolar(amp, deg));

describe('permissibleUnbalance', () => {
  it('G 6.3, 210 kg, 1480 r/min allows 8536.3 g·mm', () => {
    near(valueOf(permissibleUnbalance(6.3, 210, 1480)).totalGmm, 8536.3, 0.05);
  });

  it.each([
    [0, 210, 1480, 'gradeMmS'],
    [6.3, -1, 1480, 'massKg'],
    [6.3, 210, 0, 'speedRpm'],
    [6.3, 210, NaN, 'speedRpm'],
    [Infinity, 210, 1480, 'gradeMmS'],
  ])('refuses G %s, %s kg, %s r/min at %s', (grade, mass, speed, field) => {
    expect(permissibleUnbalance(grade, mass, speed)).toMatchObject({
      ok: false,
      failure: { code: 'not-positive', field },
    });
  });
});

describe('shareByLever', () => {
  const inboard = { apartM: 1.9, massCentreFromAM: 0.8, arrangement: 'inboard' } as const;

  it('centre 0.80 m from A of 1.90 m: A 22 516, B 16 375 g·mm', () => {
    const { aGmm, bGmm } = valueOf(shareByLever(38_891.7, inboard));
    near(aGmm, 22_516, 1);
    near(bGmm, 16_375, 1);
  });

  it('keeps shares within 0.3–0.7 inboard and 0.3–1.3 overhung', () => {
    const near300 = { ...inboard, massCentreFromAM: 0.1 };
    expect(valueOf(shareByLever(1000, near300))).toEqual({ aGmm: 700, bGmm: 300 });
    const beyond = { ...inboard, massCentreFromAM: 2.85, arrangement: 'overhung' } as const;
    expect(valueOf(shareByLever(1000, beyond))).toEqual({ aGmm: 300, bGmm: 1300 });
    const slightly = { ...beyond, massCentreFromAM: 1.9 };
    expect(valueOf(shareByLever(1000, slightly))).toEqual({ aGmm: 300, bGmm: 1000 });
  });

  it('refuses planes with no distance between them', () => {
    expect(codeOf(shareByLever(1000, { ...inboard, apartM: 0 }))).toBe('not-positive');
  });
});

describe('residual unbalance', () => {
  it('0.15 mm/s with 0.369 mm/s per kg·mm is 407 g·mm', () => {
    const [residual] = residualInPlanes([{ re: 0.15, im: 0 }], [[{ re: 0.369e-3, im: 0 }]]);
    near(size(residual!), 407, 0.5);
  });

  it('a plane halfway gives half to A and half to B', () => {
    const { a, b } = moveToTolerancePlanes([{ re: 10, im: 4 }], [0.6], 1.2);
    expect([a, b]).toEqual([
      { re: 5, im: 2 },
      { re: 5, im: 2 },
    ]);
  });

  it('force and couple about A stay the same wherever the planes lie', () => {
    const places = number(-1, 3);
    fc.assert(
      fc.property(vectors, vectors, places, places, (one, two, z1, z2) => {
        const { a, b } = moveToTolerancePlanes([one, two], [z1, z2], 1.9);
        expect(size(subtract(add(a, b), add(one, two)))).toBeLessThan(1e-8);
        const couple = add(scale(one, z1), scale(two, z2));
        expect(size(subtract(scale(b, 1.9), couple))).toBeLessThan(1e-8);
      }),
    );
  });

  it('10 and 10 in line are static 10, couple 0; parts make up the whole', () => {
    const inLine = staticAndCouple({ re: 10, im: 0 }, { re: 10, im: 0 });
    expect(inLine).toEqual({ staticPart: { re: 10, im: 0 }, couplePart: { re: 0, im: 0 } });
    const { staticPart, couplePart } = staticAndCouple(fromPolar(5, 20), fromPolar(3, 250));
    const first = add(staticPart, couplePart);
    near(size(first), 5, 1e-12);
    nearDeg(angleDeg(first), 20, 1e-9);
    const second = subtract(staticPart, couplePart);
    near(size(second), 3, 1e-12);
    nearDeg(angleDeg(second), 250, 1e-9);
  });

  it('10 and −10 cancel wholly, one vector not at all', () => {
    expect(sumOverTotal([fromPolar(10, 0), { re: -10, im: 0 }])).toBe(0);
    expect(sumOverTotal([fromPolar(10, 77)])).toBe(1);
    expect(sumOverTotal([])).toBe(1);
  });
});

describe('QUALITY_GRADES', () => {
  // ISO 21940-11:2016 table 1, from memory: grades step by a factor of about 2.5.
  it('falls from 4000 to 0.4 in steps of about 2.5', () => {
    const grades = QUALITY_GRADES.map(({ gradeMmS }) => gradeMmS);
    expect(grades).toEqual([4000, 1600, 630, 250, 100, 40, 16, 6.3, 2.5, 1, 0.4]);
    grades.slice(1).forEach((grade, i) => near(grades[i]! / grade, 2.52, 0.03));
  });
});
