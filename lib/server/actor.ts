import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { redirect } from 'next/navigation';
import { cache } from 'react';
import { Session, SiteAccess, type Person } from '@/entities/person';
import type { Actor } from '@/lib/schemas/actor';
import { routes } from '@/lib/routes';
import { getEntityManager } from './db';
import { hashSessionKey, sessionCookie } from './session';

/** Who is signed in, or null. Asked of the database once per request. */
export const currentActor = cache(async (): Promise<Actor | null> => {
  const { key } = await sessionCookie();
  return key ? actorOfKey(key) : null;
});

/** Whom a session key opens the register for: nobody once the session or the account has ended. */
export async function actorOfKey(key: string, now = new Date()): Promise<Actor | null> {
  const em = await getEntityManager();
  const session = await em.findOne(
    Session,
    { keyHash: hashSessionKey(key), endedAt: null, expiresAt: { $gt: now } },
    { populate: ['person'] },
  );
  const person = session?.person.$;
  if (person?.state !== 'active') return null;
  return actorOf(em, person);
}

/** Who is signed in; sends everybody else to the sign-in page. */
export async function requireActor(): Promise<Actor> {
  const actor = await currentActor();
  if (!actor) redirect(routes.signIn());
  return actor;
}

/** The actor a person is: role and the sites open to them. */
export async function actorOf(em: EntityManager, person: Person): Promise<Actor> {
  const access = await em.find(
    SiteAccess,
    { person: person.id },
    { populate: ['site'], orderBy: { site: { name: 'asc' } } },
  );
  return {
    personId: person.id,
    name: person.name,
    email: person.email,
    role: person.role,
    sites: access.map(({ site }) => ({
      id: site.$.id,
      name: site.$.name,
      timeZone: site.$.timeZone,
      decimalMark: site.$.decimalMark,
      phaseShown: site.$.phaseShown,
    })),
  };
}
