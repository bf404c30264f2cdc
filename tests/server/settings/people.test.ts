import { compare } from 'bcryptjs';
import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditEvent } from '@/entities/audit-event';
import { Person, Session, SiteAccess } from '@/entities/person';
import type { Role } from '@/lib/domain/access/permissions';
import type { Actor } from '@/lib/schemas/actor';
import { actorOf, actorOfKey } from '@/lib/server/actor';
import {
  closePerson,
  createPerson,
  editPerson,
  reopenPerson,
  setPassword,
} from '@/lib/server/commands/people';
import { people } from '@/lib/server/queries/people';
import { signIn } from '@/lib/server/sign-in';
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

const administrator = () => plant.at('administrator');
const PASSWORD = 'three plain words';

function newPerson(over: Record<string, unknown> = {}) {
  made += 1;
  return {
    name: `Person ${made}`,
    email: `person.${made}@example.test`,
    role: 'technician' as Role,
    siteIds: [plant.home.siteId],
    password: PASSWORD,
    ...over,
  };
}

async function enter(over: Record<string, unknown> = {}): Promise<number> {
  const result = await createPerson(administrator(), newPerson(over));
  if (!result.ok) throw new Error(result.failure.message);
  return result.value.personId;
}

/** Gives a person a further site, as an administrator of that site would. */
async function giveSite(personId: number, siteId: number): Promise<void> {
  em.create(SiteAccess, { person: personId, site: siteId });
  await em.flush();
}

async function actorFor(personId: number): Promise<Actor> {
  const fresh = em.fork();
  return actorOf(fresh, await fresh.findOneOrFail(Person, personId));
}

const openSessions = (personId: number) =>
  em.fork().count(Session, { person: personId, endedAt: null });

describe('a person entered', () => {
  it('signs in with the address in lower case and the password; neither stands in the audit', async () => {
    const personId = await enter({ email: 'Mixed.Case@Example.test' });
    expect(await signIn('mixed.case@example.test', PASSWORD)).toMatchObject({ ok: true });
    const person = await em.fork().findOneOrFail(Person, personId);
    expect(await compare(PASSWORD, person.passwordHash)).toBe(true);
    const audits = await em.fork().find(AuditEvent, { entity: 'Person', entityId: personId });
    expect(audits).toHaveLength(1);
    const written = JSON.stringify(audits);
    expect(written).not.toContain(PASSWORD);
    expect(written).not.toContain('$2');
  });

  it.each([
    [{ email: 'no address' }, 'email', 'e-mail address'],
    [{ password: 'short' }, 'password', 'at least 12 characters'],
    [{ password: 'ü'.repeat(37) }, 'password', 'at most 72 bytes'],
    [{ siteIds: [] }, 'siteIds', 'at least one site'],
    [{ role: 'king' }, 'role', 'Choose a role'],
    [{ name: ' ' }, 'name', 'Write the name'],
  ])('is refused in words: %o', async (over, field, words) => {
    const result = await createPerson(administrator(), newPerson(over));
    expect(result).toMatchObject({ ok: false, failure: { field } });
    expect(result.ok ? '' : result.failure.message).toContain(words);
  });

  it('is told which address is none, and one with spaces around it is read', async () => {
    const wrong = await createPerson(administrator(), newPerson({ email: 'ann at plant' }));
    expect(wrong).toMatchObject({ failure: { field: 'email' } });
    expect(wrong.ok ? '' : wrong.failure.message).toContain('“ann at plant”');
    await enter({ email: '  Spaced@example.test ' });
    expect(await signIn('spaced@example.test', PASSWORD)).toMatchObject({ ok: true });
  });

  it('cannot have an address twice', async () => {
    await enter({ email: 'twice@example.test' });
    expect(
      await createPerson(administrator(), newPerson({ email: 'TWICE@example.test' })),
    ).toMatchObject({ failure: { field: 'email', code: 'taken' } });
  });

  it.each(['reader', 'technician', 'engineer', 'planner'] as const)(
    'is not entered by a %s',
    async (role) => {
      expect(await createPerson(plant.at(role), newPerson())).toMatchObject({
        failure: { code: 'forbidden' },
      });
    },
  );

  it('is given no site that the administrator has not', async () => {
    const siteIds = [plant.home.siteId, plant.away.siteId];
    expect(await createPerson(administrator(), newPerson({ siteIds }))).toMatchObject({
      failure: { code: 'not-found' },
    });
  });
});

describe('a person edited', () => {
  it('keeps the sites that the administrator cannot see', async () => {
    const personId = await enter({ name: 'Visitor' });
    await giveSite(personId, plant.away.siteId);
    const siteIds = [plant.home.siteId];
    const edited = { personId, name: 'Visitor', role: 'technician' as const, siteIds };
    expect(await editPerson(administrator(), edited)).toMatchObject({ ok: true });
    const actor = await actorFor(personId);
    expect(actor.sites.map(({ id }) => id).sort()).toEqual(
      [plant.home.siteId, plant.away.siteId].sort(),
    );
    const row = (await people(administrator(), undefined)).people.find(({ id }) => id === personId);
    expect(row).toMatchObject({ sites: [{ id: plant.home.siteId }], otherSites: 1 });
  });

  it('who also works at sites of others is theirs to change, close and give a password', async () => {
    const personId = await enter({ name: 'Visitor' });
    await giveSite(personId, plant.away.siteId);
    const siteIds = [plant.home.siteId];
    const reason = 'Left';
    const tries = [
      await editPerson(administrator(), { personId, name: 'Visitor', role: 'reader', siteIds }),
      await editPerson(administrator(), { personId, name: 'Other', role: 'technician', siteIds }),
      await setPassword(administrator(), { personId, password: PASSWORD }),
      await closePerson(administrator(), { personId, reason }),
    ];
    for (const tried of tries) expect(tried).toMatchObject({ failure: { code: 'other-sites' } });
    const both = { ...administrator(), sites: (await actorFor(personId)).sites };
    expect(await closePerson(both, { personId, reason })).toMatchObject({ ok: true });
    expect(await reopenPerson(administrator(), { personId, reason })).toMatchObject({
      failure: { code: 'other-sites' },
    });
  });

  it('does not change the administrator’s own role', async () => {
    const { personId, name } = administrator();
    const siteIds = [plant.home.siteId];
    expect(
      await editPerson(administrator(), { personId, name, role: 'reader', siteIds }),
    ).toMatchObject({ failure: { code: 'own-account', field: 'role' } });
  });
});

describe('a new password', () => {
  it('ends every session and replaces the old one', async () => {
    const personId = await enter({ email: 'forgot@example.test' });
    const signedIn = await signIn('forgot@example.test', PASSWORD);
    const key = signedIn.ok ? signedIn.value.key : '';
    expect(await actorOfKey(key)).toMatchObject({ personId });
    expect(await openSessions(personId)).toBe(1);
    const password = 'another three words';
    expect(await setPassword(administrator(), { personId, password })).toMatchObject({ ok: true });
    expect(await openSessions(personId)).toBe(0);
    expect(await actorOfKey(key)).toBeNull();
    const audits = await em.fork().find(AuditEvent, { entity: 'Person', entityId: personId });
    expect(audits.map(({ action }) => action)).toEqual(['createPerson', 'setPassword']);
    expect(audits[1]).toMatchObject({ after: { sessionsEnded: 1 } });
    expect(JSON.stringify(audits)).not.toContain(password);
    expect(JSON.stringify(audits)).not.toContain('$2');
    expect(await signIn('forgot@example.test', PASSWORD)).toMatchObject({ ok: false });
    expect(await signIn('forgot@example.test', password)).toMatchObject({ ok: true });
  });
});

describe('an account closed', () => {
  it('ends its sessions, signs in no more, and opens again', async () => {
    const personId = await enter({ email: 'leaver@example.test' });
    expect(await signIn('leaver@example.test', PASSWORD)).toMatchObject({ ok: true });
    const closed = await closePerson(administrator(), { personId, reason: 'Left the plant' });
    expect(closed).toMatchObject({ ok: true });
    expect(await openSessions(personId)).toBe(0);
    expect(await signIn('leaver@example.test', PASSWORD)).toMatchObject({
      failure: { code: 'wrong' },
    });
    expect(
      await closePerson(administrator(), { personId, reason: 'Left the plant' }),
    ).toMatchObject({ failure: { code: 'already' } });
    const reopened = await reopenPerson(administrator(), { personId, reason: 'Came back' });
    expect(reopened).toMatchObject({ ok: true });
    expect(await signIn('leaver@example.test', PASSWORD)).toMatchObject({ ok: true });
    const audits = await em.fork().find(AuditEvent, { entity: 'Person', entityId: personId });
    expect(audits.map(({ action, reason }) => [action, reason ?? null])).toEqual([
      ['createPerson', null],
      ['closePerson', 'Left the plant'],
      ['reopenPerson', 'Came back'],
    ]);
  });

  it('is never one’s own, nor the last administrator’s', async () => {
    const { personId } = administrator();
    expect(await closePerson(administrator(), { personId, reason: 'x' })).toMatchObject({
      failure: { code: 'own-account' },
    });
    const visitor = await enter({ role: 'administrator' });
    const others = await em.fork().find(Person, { role: 'administrator', id: { $ne: visitor } });
    for (const other of others)
      await em.nativeUpdate(Person, { id: other.id }, { state: 'closed' });
    expect(await closePerson(administrator(), { personId: visitor, reason: 'x' })).toMatchObject({
      failure: { code: 'last-administrator' },
    });
    for (const other of others)
      await em.nativeUpdate(Person, { id: other.id }, { state: 'active' });
  });
});
