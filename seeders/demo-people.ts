import { hashSync } from 'bcryptjs';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Person, SiteAccess } from '@/entities/person';
import type { Site } from '@/entities/site';
import { ROLES } from '@/lib/domain/access/permissions';
import type { Actor } from '@/lib/schemas/actor';
import signIns from './demo-sign-ins.json';

const COST = 10;

/** Makes the people of the demo plant; hands back each as an actor, by e-mail address. */
export async function seedPeople(
  em: EntityManager,
  sites: readonly Site[],
  createdAt: Date,
): Promise<Map<string, Actor>> {
  const hashes = new Map(signIns.map(({ password }) => password).map((password) => [password, '']));
  for (const password of hashes.keys()) hashes.set(password, hashSync(password, COST));
  const made = signIns.map((signIn) => {
    const role = ROLES.find((known) => known === signIn.role);
    if (!role) throw new Error(`${signIn.role} is no role`);
    const open = sites.filter(({ name }) => signIn.site.includes(name));
    const person = em.create(Person, {
      name: signIn.name,
      email: signIn.email,
      passwordHash: hashes.get(signIn.password) ?? '',
      role,
      createdAt,
    });
    for (const site of open) em.create(SiteAccess, { person, site });
    return { person, open };
  });
  await em.flush();
  return new Map(made.map(({ person, open }) => [person.email, actorFrom(person, open)]));
}

function actorFrom({ id, name, email, role }: Person, open: readonly Site[]): Actor {
  return {
    personId: id,
    name,
    email,
    role,
    sites: open.map((site) => ({
      id: site.id,
      name: site.name,
      timeZone: site.timeZone,
      decimalMark: site.decimalMark,
      phaseShown: site.phaseShown,
    })),
  };
}
