import type { EntityManager } from '@mikro-orm/postgresql';
import type { Actor } from '@/lib/schemas/actor';
import type { SmallPlant } from './plant';

/**
 * One query or command run by an actor of another site against a record of the home site.
 * `null`: the query finds nothing; `empty`: its list holds nothing of the home site;
 * `not-found`: the command fails with that code.
 */
export type OtherSiteCase = {
  /** Name of the exported query or command. */
  name: string;
  expects: 'null' | 'empty' | 'not-found';
  run: (foreigner: Actor, plant: SmallPlant, em: EntityManager) => Promise<unknown>;
};
