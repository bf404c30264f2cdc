import 'server-only';
import { cookies } from 'next/headers';
import type { Actor } from '@/lib/schemas/actor';

const COOKIE = 'evenrun-site';

/** The site the actor has narrowed the lists to; null for all of theirs. */
export async function chosenSiteId(actor: Actor): Promise<number | null> {
  const kept = Number((await cookies()).get(COOKIE)?.value);
  return actor.sites.find((site) => site.id === kept)?.id ?? null;
}

/** Narrows the lists to a site of the actor's, or widens them again. */
export async function chooseSite(actor: Actor, siteId: number): Promise<void> {
  const jar = await cookies();
  const open = actor.sites.some((site) => site.id === siteId);
  if (open) jar.set(COOKIE, String(siteId), { httpOnly: true, sameSite: 'lax', path: '/' });
  else jar.delete(COOKIE);
}

/** The actor with only the chosen site, for lists that follow the site switch. */
export async function narrowed(actor: Actor): Promise<Actor> {
  const siteId = await chosenSiteId(actor);
  if (siteId === null) return actor;
  return { ...actor, sites: actor.sites.filter((site) => site.id === siteId) };
}
