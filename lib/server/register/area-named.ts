import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Area } from '@/entities/site';

/** The area of that name at the top of a site; made where there is none. */
export async function areaNamed(em: EntityManager, siteId: number, name: string): Promise<Area> {
  const known = await em.findOne(Area, { site: siteId, parent: null, name });
  return known ?? em.create(Area, { site: siteId, name });
}
