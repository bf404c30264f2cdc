import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { allows, type Permission } from '@/lib/domain/access/permissions';
import type { Actor } from '@/lib/schemas/actor';
import { clockNow } from './clock';
import { getEntityManager } from './db';

export type QueryContext = {
  readonly actor: Actor;
  readonly em: EntityManager;
  /** Ids of the sites the actor may see: every statement filters by it. */
  readonly siteIds: number[];
  readonly now: Date;
};

export type Query<Args, Dto> = ((actor: Actor, args: Args) => Promise<Dto>) & {
  readonly kind: 'query';
  readonly permission: Permission;
};

/** Raised when a role lacks a permission; pages and handlers answer it with 403. */
export class NotPermitted extends Error {
  constructor(readonly permission: Permission) {
    super(`This needs the permission ${permission}`);
  }
}

/**
 * A read: checks the permission, opens an entity manager, hands back plain data. What belongs to a
 * site the actor may not see does not exist for it: the query returns null or leaves it out.
 */
export function query<Args, Dto>(
  permission: Permission,
  read: (context: QueryContext, args: Args) => Promise<Dto>,
): Query<Args, Dto> {
  const run = async (actor: Actor, args: Args) => {
    if (!allows(actor.role, permission)) throw new NotPermitted(permission);
    const em = await getEntityManager();
    return read({ actor, em, siteIds: openSiteIds(actor), now: clockNow() }, args);
  };
  return Object.assign(run, { kind: 'query' as const, permission });
}

/** Ids of the sites open to an actor; never empty, since SQL has no empty list: 0 is no site's id. */
export function openSiteIds(actor: Actor): number[] {
  return actor.sites.length > 0 ? actor.sites.map((site) => site.id) : [0];
}
