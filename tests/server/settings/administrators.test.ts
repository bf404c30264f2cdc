import { setTimeout } from 'node:timers/promises';
import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditEvent } from '@/entities/audit-event';
import { Person, SiteAccess } from '@/entities/person';
import { Site } from '@/entities/site';
import type { Role } from '@/lib/domain/access/permissions';
import type { Actor } from '@/lib/schemas/actor';
import { actorOf } from '@/lib/server/actor';
import {
  closePerson,
  createPerson,
  editPerson,
  reopenPerson,
  setPassword,
} from '@/lib/server/commands/people';
import { openPlant } from '@/tests/support/open-plant';
import type { SmallPlant } from '@/tests/support/plant';

let em: EntityManager;
let plant: SmallPlant;
let close: () => Promise<void>;
let made = 0;

beforeAll(async () => {
  ({ em, plant, close } = await openPlant());
});

afterAll(() => close());

/** A site where nobody is yet. */
async function newSite(): Promise<number> {
  made += 1;
  const site = em.create(Site, { name: `Site ${made}`, timeZone: 'Europe/Berlin' });
  await em.flush();
  return site.id;
}

/** A person with these sites, put there without a command. */
async function person(role: Role, siteIds: readonly number[]): Promise<number> {
  made += 1;
  const one = em.create(Person, {
    name: `Person ${made}`,
    email: `person.${made}@example.test`,
    passwordHash: 'no password',
    role,
    createdAt: new Date('2026-01-01T08:00:00Z'),
  });
  for (const site of siteIds) em.create(SiteAccess, { person: one, site });
  await em.flush();
  return one.id;
}

async function actor(personId: number): Promise<Actor> {
  const fresh = em.fork();
  return actorOf(fresh, await fresh.findOneOrFail(Person, personId));
}

const name = 'Somebody';
const reason = 'Moved on';

describe('the last administrator of a site', () => {
  it('keeps the role, until somebody else has it', async () => {
    const siteId = await newSite();
    const personId = await person('administrator', [siteId]);
    const editor = { ...(await actor(personId)), personId: plant.at('administrator').personId };
    const demote = () => editPerson(editor, { personId, name, role: 'reader', siteIds: [siteId] });
    const refused = await demote();
    expect(refused).toMatchObject({ failure: { code: 'last-administrator', field: 'role' } });
    await person('administrator', [siteId]);
    expect(await demote()).toMatchObject({ ok: true });
  });

  it('keeps the site, while one of several may leave it', async () => {
    const [first, second] = [await newSite(), await newSite()];
    const personId = await person('administrator', [first, second]);
    const self = await actor(personId);
    const leave = () =>
      editPerson(self, { personId, name, role: 'administrator', siteIds: [second] });
    expect(await leave()).toMatchObject({ failure: { code: 'last-administrator' } });
    expect((await actor(personId)).sites.map(({ id }) => id)).toEqual([first, second]);
    await person('administrator', [first]);
    expect(await leave()).toMatchObject({ ok: true });
    expect((await actor(personId)).sites.map(({ id }) => id)).toEqual([second]);
  });

  it('is not another whose account is closed', async () => {
    const siteId = await newSite();
    const [one, closed] = [
      await person('administrator', [siteId]),
      await person('administrator', [siteId]),
    ];
    const self = await actor(one);
    const both = await actor(closed);
    expect(await closePerson(self, { personId: closed, reason })).toMatchObject({ ok: true });
    expect(await closePerson(both, { personId: one, reason })).toMatchObject({
      failure: { code: 'last-administrator' },
    });
    expect(await reopenPerson(self, { personId: closed, reason })).toMatchObject({ ok: true });
    expect(await closePerson(both, { personId: one, reason })).toMatchObject({ ok: true });
  });

  it('is one of two who close each other at the same moment', async () => {
    const siteId = await newSite();
    const [one, other] = [
      await person('administrator', [siteId]),
      await person('administrator', [siteId]),
    ];
    const asOther = await actor(other);
    // The first closing as the command does it, held open while the second begins.
    const first = em.fork();
    await first.begin();
    await first.execute('select id from site where id = ? for update', [siteId]);
    await first.nativeUpdate(Person, { id: other }, { state: 'closed' });
    const second = closePerson(asOther, { personId: one, reason });
    await setTimeout(400);
    await first.commit();
    expect(await second).toMatchObject({ failure: { code: 'last-administrator' } });
  });
});

describe('the audit of a person', () => {
  it('stands under a site of that person, not under another of the administrator', async () => {
    const [unrelated, shared] = [await newSite(), await newSite()];
    const ruler = await actor(await person('administrator', [unrelated, shared]));
    const created = await createPerson(ruler, {
      name,
      email: 'audited@example.test',
      role: 'reader',
      siteIds: [shared],
      password: 'three plain words',
    });
    const personId = created.ok ? created.value.personId : 0;
    await setPassword(ruler, { personId, password: 'three other words' });
    await closePerson(ruler, { personId, reason });
    await reopenPerson(ruler, { personId, reason });
    const audits = await em.fork().find(AuditEvent, { entity: 'Person', entityId: personId });
    expect(audits.map(({ action, site }) => [action, site?.id])).toEqual([
      ['createPerson', shared],
      ['setPassword', shared],
      ['closePerson', shared],
      ['reopenPerson', shared],
    ]);
  });

  it('stands under a site of the person, not under the first of the administrator', async () => {
    const [other, shared] = [await newSite(), await newSite()];
    const ruler = await actor(await person('administrator', [other, shared]));
    const personId = await person('reader', [shared]);
    expect(await closePerson(ruler, { personId, reason })).toMatchObject({ ok: true });
    const audit = await em
      .fork()
      .findOneOrFail(AuditEvent, { action: 'closePerson', entityId: personId });
    expect(audit.site?.id).toBe(shared);
  });
});
