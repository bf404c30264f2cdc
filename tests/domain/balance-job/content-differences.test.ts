import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { contentDifferences } from '@/lib/domain/balance-job/content-differences';

describe('differences of two records', () => {
  it('name the place, counting in lists from 1, and both sides', () => {
    expect(
      contentDifferences({ runs: [{ speedRpm: 990 }] }, { runs: [{ speedRpm: 991 }] }),
    ).toEqual([{ path: 'runs 1 › speedRpm', one: '990', other: '991' }]);
  });

  it('say “nothing” where one side has no such member', () => {
    expect(contentDifferences({ a: 1 }, {})).toEqual([{ path: 'a', one: '1', other: 'nothing' }]);
    expect(contentDifferences([1], [1, 2])).toEqual([{ path: '2', one: 'nothing', other: '2' }]);
  });

  it('tell a list from a record and null from nothing', () => {
    expect(contentDifferences({ a: [] }, { a: {} })).toHaveLength(1);
    expect(contentDifferences({ a: null }, {})).toHaveLength(1);
  });

  // A law: a thing differs nowhere from its copy, and two things differ somewhere where their JSON does.
  it('are none for a copy, and some for anything else', () => {
    fc.assert(
      fc.property(fc.jsonValue(), fc.jsonValue(), (one, other) => {
        const copy: unknown = JSON.parse(JSON.stringify(one));
        expect(contentDifferences(JSON.parse(JSON.stringify(one)), copy)).toEqual([]);
        if (JSON.stringify(one) !== JSON.stringify(other) && !sameApartFromOrder(one, other))
          expect(contentDifferences(one, other).length).toBeGreaterThan(0);
      }),
    );
  });
});

function sameApartFromOrder(one: unknown, other: unknown): boolean {
  try {
    expect(one).toEqual(other);
    return true;
  } catch {
    return false;
  }
}
