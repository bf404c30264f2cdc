import 'server-only';
import { MikroORM } from '@mikro-orm/postgresql';
import type { EntityManager } from '@mikro-orm/postgresql';
import { entities } from '@/entities/all';
import config from '@/mikro-orm.config';
import { env } from './env';

type Orm = { em: EntityManager; close: () => Promise<void> };
type Slot = { key: string; orm: Promise<Orm> };
const holder = globalThis as typeof globalThis & { evenrunOrm?: Slot };

/** An entity manager of its own for one query or command; inside a transaction it joins that one. */
export async function getEntityManager(): Promise<EntityManager> {
  return (await getOrm()).em.fork({ keepTransactionContext: true });
}

/** Ends the pool; for scripts and tests. */
export async function closeDatabase(): Promise<void> {
  const slot = holder.evenrunOrm;
  delete holder.evenrunOrm;
  if (slot) await (await slot.orm).close();
}

async function getOrm(): Promise<Orm> {
  const key = `${env().DATABASE_URL} ${entityStamp()}`;
  const current = holder.evenrunOrm;
  if (current?.key === key) return current.orm;
  holder.evenrunOrm = { key, orm: MikroORM.init({ ...config, clientUrl: env().DATABASE_URL }) };
  if (current) await (await current.orm).close();
  return holder.evenrunOrm.orm;
}

/** In development each route bundle has its own entity objects: compare what they say instead. */
function entityStamp(): string {
  if (process.env.NODE_ENV === 'production') return '';
  const shapes = entities.map((entity) => [entity.meta.className, entity.meta.properties]);
  return JSON.stringify(shapes, (_key, value: unknown) =>
    typeof value === 'function' ? '' : value,
  );
}
