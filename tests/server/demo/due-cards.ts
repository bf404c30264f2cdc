import type { EntityManager } from '@mikro-orm/postgresql';
import { Person } from '@/entities/person';
import type { DueBoardCard } from '@/lib/schemas/due-board';
import { actorOf } from '@/lib/server/actor';
import { dueBoard } from '@/lib/server/queries/due-board';

/** The Due board's card of a machine, as somebody who sees every site reads it. */
export async function dueCardOf(em: EntityManager, tag: string): Promise<DueBoardCard> {
  const person = await em.findOneOrFail(Person, { role: 'administrator' });
  const { cards } = await dueBoard(await actorOf(em, person), undefined);
  const card = cards.find((one) => one.tag === tag);
  if (!card) throw new Error(`the board has no card of ${tag}`);
  return card;
}
