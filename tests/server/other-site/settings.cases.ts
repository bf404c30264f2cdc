import { hash } from 'bcryptjs';
import { Person } from '@/entities/person';
import { LimitSet } from '@/entities/limit-set';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { Actor } from '@/lib/schemas/actor';
import { changePassword } from '@/lib/server/commands/change-password';
import { createLimitSet, retireLimitSet } from '@/lib/server/commands/limit-sets';
import {
  closePerson,
  createPerson,
  editPerson,
  reopenPerson,
  setPassword,
} from '@/lib/server/commands/people';
import { limitSets } from '@/lib/server/queries/limit-sets';
import { people } from '@/lib/server/queries/people';
import type { OtherSiteCase } from '@/tests/support/other-site';
import type { SmallPlant } from '@/tests/support/plant';

/** Somebody of the other site who would have the permission. */
const ruler = (foreigner: Actor): Actor => ({ ...foreigner, role: 'administrator' });

const atHome = (plant: SmallPlant) => plant.at('technician').personId;

async function homeSet(plant: SmallPlant, em: EntityManager): Promise<number> {
  const set = em.create(LimitSet, {
    site: plant.home.siteId,
    title: `House limits ${String(Math.random())}`,
    edition: '2026',
    bAb: 1,
    bBc: 2,
    bCd: 3,
    citation: 'Test data',
    enteredAt: new Date(),
  });
  await em.flush();
  return set.id;
}

export const cases: OtherSiteCase[] = [
  {
    name: 'createPerson',
    expects: 'not-found',
    run: (foreigner, plant) =>
      createPerson(ruler(foreigner), {
        name: 'Somebody',
        email: 'somebody@example.test',
        role: 'reader',
        siteIds: [plant.home.siteId],
        password: 'three plain words',
      }),
  },
  {
    name: 'editPerson',
    expects: 'not-found',
    run: (foreigner, plant) =>
      editPerson(ruler(foreigner), {
        personId: atHome(plant),
        name: 'Renamed',
        role: 'reader',
        siteIds: [plant.away.siteId],
      }),
  },
  {
    name: 'setPassword',
    expects: 'not-found',
    run: (foreigner, plant) =>
      setPassword(ruler(foreigner), { personId: atHome(plant), password: 'three plain words' }),
  },
  {
    name: 'closePerson',
    expects: 'not-found',
    run: (foreigner, plant) =>
      closePerson(ruler(foreigner), { personId: atHome(plant), reason: 'x' }),
  },
  {
    name: 'reopenPerson',
    expects: 'not-found',
    run: (foreigner, plant) =>
      reopenPerson(ruler(foreigner), { personId: atHome(plant), reason: 'x' }),
  },
  {
    name: 'people',
    expects: 'empty',
    run: async (foreigner, plant, em) => {
      const seen = await people(ruler(foreigner), undefined);
      const home = await em.find(Person, { email: { $like: '%.home@example.test' } });
      if (home.length === 0 || seen.people.length === 0) throw new Error('nobody to hide or see');
      const ids = home.map(({ id }) => id);
      return [
        ...seen.people.filter(({ id }) => ids.includes(id)),
        ...seen.sites.filter(({ id }) => id === plant.home.siteId),
      ];
    },
  },
  {
    name: 'createLimitSet',
    expects: 'not-found',
    run: (foreigner, plant) =>
      createLimitSet(foreigner, {
        siteId: plant.home.siteId,
        title: 'House limits',
        edition: '2026',
        citation: 'Test data',
        bandLowHz: 10,
        bandHighHz: 1000,
        bAb: 1,
        bBc: 2,
        bCd: 3,
        support: 'any',
      }),
  },
  {
    name: 'retireLimitSet',
    expects: 'not-found',
    run: async (foreigner, plant, em) =>
      retireLimitSet(foreigner, { limitSetId: await homeSet(plant, em), reason: 'x' }),
  },
  {
    name: 'limitSets',
    expects: 'empty',
    run: async (foreigner, plant, em) => {
      const homeId = await homeSet(plant, em);
      const { sets } = await limitSets(foreigner, undefined);
      if (!sets.some(({ id }) => id === plant.limitSetId)) throw new Error('no shipped set seen');
      return sets.filter(({ id }) => id === homeId);
    },
  },
  {
    name: 'changePassword',
    expects: 'empty',
    run: async (foreigner, plant, em) => {
      const passwordHash = await hash('the password of now', 4);
      await em.nativeUpdate(Person, { id: foreigner.personId }, { passwordHash });
      const before = await em.fork().find(Person, { email: { $like: '%.home@example.test' } });
      const input = { currentPassword: 'the password of now', password: 'three plain words' };
      const changed = await changePassword(foreigner, input);
      if (!changed.ok) throw new Error(changed.failure.message);
      const after = await em.fork().find(Person, { email: { $like: '%.home@example.test' } });
      return after.filter(
        ({ id, passwordHash: now }) => before.find((one) => one.id === id)?.passwordHash !== now,
      );
    },
  },
];
