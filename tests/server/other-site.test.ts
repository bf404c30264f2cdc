import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openPlant } from '@/tests/support/open-plant';
import type { OtherSiteCase } from '@/tests/support/other-site';
import type { SmallPlant } from '@/tests/support/plant';

const files = import.meta.glob<{ cases: OtherSiteCase[] }>('./other-site/*.cases.ts', {
  eager: true,
});

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

for (const [file, { cases }] of Object.entries(files)) {
  describe(`an actor of another site, ${file}`, () => {
    for (const { name, expects, run } of cases) {
      it(`${name}: ${expects}`, async () => {
        const found = await run(plant.foreigner, plant, em.fork());
        if (expects === 'null') expect(found).toBeNull();
        else if (expects === 'empty') expect(isEmpty(found), JSON.stringify(found)).toBe(true);
        else expect(found).toMatchObject({ ok: false, failure: { code: 'not-found' } });
      });
    }
  });
}

/** Whether nothing of the home site is in it: an empty list, a zero count, or such a thing inside. */
function isEmpty(found: unknown): boolean {
  if (Array.isArray(found)) return found.length === 0;
  if (typeof found === 'number') return found === 0;
  if (typeof found === 'object' && found !== null) return Object.values(found).every(isEmpty);
  return found === null || found === undefined;
}
