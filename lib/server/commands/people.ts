import 'server-only';
import { Person, Session, SiteAccess } from '@/entities/person';
import { fail, ok, type Failure } from '@/lib/domain/result';
import {
  closePersonInput,
  createPersonInput,
  editPersonInput,
  reopenPersonInput,
  setPasswordInput,
} from '@/lib/schemas/settings-input';
import { command, type CommandContext } from '../command';
import { siteWithoutAdministrator } from '../people/administrators';
import { hashPassword } from '../people/hash-password';
import { notFound, visiblePerson } from '../scope';

/** Enters somebody with a role, sites and a first password. */
export const createPerson = command(
  { name: 'createPerson', permission: 'person:edit', input: createPersonInput },
  async (context, { siteIds, password, email, name, role }) => {
    const { em, audit, now } = context;
    if (missingFrom(context.siteIds, siteIds).length > 0) return notFound('site');
    const person = em.create(Person, {
      name,
      role,
      email,
      passwordHash: await hashPassword(password),
      createdAt: now,
    });
    for (const site of new Set(siteIds)) em.create(SiteAccess, { person, site });
    await em.flush();
    audit({
      ...aboutPerson(person.id, siteIds),
      after: { name, role, email, siteIds },
    });
    return ok({ personId: person.id });
  },
);

/** Changes name, role and sites. Sites that the administrator cannot see stay as they are. */
export const editPerson = command(
  { name: 'editPerson', permission: 'person:edit', input: editPersonInput },
  async (context, { personId, name, role, siteIds }) => {
    const { em, audit } = context;
    const person = await visiblePerson(context, personId);
    if (!person) return notFound('person');
    if (missingFrom(context.siteIds, siteIds).length > 0) return notFound('site');
    const refused = await refusedIdentity(context, person, { name, role });
    if (refused) return { ok: false, failure: refused };
    const access = await em.find(SiteAccess, { person: personId });
    const seen = access.filter(({ site }) => context.siteIds.includes(site.id));
    const before = { name: person.name, role: person.role, siteIds: idsOf(seen) };
    const dropped = seen.filter(({ site }) => !siteIds.includes(site.id));
    const unruled = role === 'administrator' ? dropped : access;
    const lost = await lastAdministrator(context, person, idsOf(unruled));
    if (lost) return { ok: false, failure: lost };
    em.assign(person, { name, role });
    em.remove(dropped);
    for (const site of missingFrom(before.siteIds, siteIds))
      em.create(SiteAccess, { person: personId, site });
    audit({ ...aboutPerson(personId, siteIds), before, after: { name, role, siteIds } });
    return ok({ personId });
  },
);

/** Gives a new password; every session of the person ends. */
export const setPassword = command(
  { name: 'setPassword', permission: 'person:edit', input: setPasswordInput },
  async (context, { personId, password }) => {
    const person = await visiblePerson(context, personId);
    if (!person) return notFound('person');
    const elsewhere = await worksElsewhere(context, person);
    if (elsewhere) return { ok: false, failure: elsewhere };
    person.passwordHash = await hashPassword(password);
    const sessionsEnded = await endSessions(context, personId);
    const shared = await sharedSites(context, personId);
    context.audit({ ...aboutPerson(personId, shared), after: { sessionsEnded } });
    return ok({ personId });
  },
);

/** Closes an account: no sign-in any more, every session ends; the name stays on what was signed. */
export const closePerson = command(
  { name: 'closePerson', permission: 'person:edit', input: closePersonInput },
  async (context, { personId, reason }) => {
    const person = await visiblePerson(context, personId);
    if (!person) return notFound('person');
    if (personId === context.actor.personId)
      return fail('own-account', 'You cannot close your own account: ask another administrator.');
    if (person.state === 'closed') return fail('already', 'This account is closed already.');
    const elsewhere = await worksElsewhere(context, person);
    if (elsewhere) return { ok: false, failure: elsewhere };
    const access = await context.em.find(SiteAccess, { person: personId });
    const lost = await lastAdministrator(context, person, idsOf(access));
    if (lost) return { ok: false, failure: lost };
    person.state = 'closed';
    const sessionsEnded = await endSessions(context, personId);
    context.audit({
      ...aboutPerson(personId, await sharedSites(context, personId)),
      before: { state: 'active' },
      after: { state: 'closed', sessionsEnded },
      reason,
    });
    return ok({ personId });
  },
);

/** Opens a closed account again, with the role, sites and password it had. */
export const reopenPerson = command(
  { name: 'reopenPerson', permission: 'person:edit', input: reopenPersonInput },
  async (context, { personId, reason }) => {
    const person = await visiblePerson(context, personId);
    if (!person) return notFound('person');
    if (person.state === 'active') return fail('already', 'This account is open.');
    const elsewhere = await worksElsewhere(context, person);
    if (elsewhere) return { ok: false, failure: elsewhere };
    person.state = 'active';
    context.audit({
      ...aboutPerson(personId, await sharedSites(context, personId)),
      before: { state: 'closed' },
      after: { state: 'active' },
      reason,
    });
    return ok({ personId });
  },
);

/** Why name and role cannot become these, if they cannot. */
async function refusedIdentity(
  context: CommandContext,
  person: Person,
  { name, role }: Pick<Person, 'name' | 'role'>,
): Promise<Failure | null> {
  if (name === person.name && role === person.role) return null;
  if (person.id === context.actor.personId && role !== person.role) {
    const message = 'You cannot change your own role: ask another administrator.';
    return { code: 'own-account', message, field: 'role' };
  }
  return worksElsewhere(context, person);
}

/** The failure where the person has sites that the administrator does not: the account is not theirs alone. */
async function worksElsewhere(
  { em, siteIds }: CommandContext,
  person: Person,
): Promise<Failure | null> {
  const elsewhere = await em.count(SiteAccess, { person: person.id, site: { $nin: siteIds } });
  if (elsewhere === 0) return null;
  const message = `${person.name} also works at sites that you do not administer: an administrator of all of them has to do this.`;
  return { code: 'other-sites', message };
}

function aboutPerson(personId: number, siteIds: readonly number[]) {
  return { siteId: siteIds[0] ?? null, entity: 'Person', entityId: personId };
}

/** The sites of the person that the administrator sees: an audit row stands under the first. */
async function sharedSites({ em, siteIds }: CommandContext, personId: number): Promise<number[]> {
  const where = { person: personId, site: { $in: siteIds } };
  return idsOf(await em.find(SiteAccess, where, { orderBy: { site: 'asc' } }));
}

function missingFrom(have: readonly number[], want: readonly number[]): number[] {
  return [...new Set(want)].filter((one) => !have.includes(one));
}

function idsOf(access: readonly SiteAccess[]): number[] {
  return access.map(({ site }) => site.id);
}

function endSessions({ em, now }: CommandContext, personId: number): Promise<number> {
  return em.nativeUpdate(Session, { person: personId, endedAt: null }, { endedAt: now });
}

/** The failure where a site would be left without an active administrator. */
async function lastAdministrator(
  { em }: CommandContext,
  person: Person,
  siteIds: readonly number[],
): Promise<Failure | null> {
  if (person.role !== 'administrator' || person.state !== 'active') return null;
  const site = await siteWithoutAdministrator(em, siteIds, person.id);
  if (site === null) return null;
  const message = `${person.name} is the last administrator of ${site}: make somebody else one first.`;
  return { code: 'last-administrator', message, field: 'role' };
}
