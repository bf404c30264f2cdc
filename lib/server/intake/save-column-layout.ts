import 'server-only';
import { Person } from '@/entities/person';
import { ColumnLayout, type Upload } from '@/entities/upload';
import { isDeepStrictEqual } from 'node:util';
import type { CommandContext } from '../command';
import type { ChosenLayout } from './chosen-layout';

/**
 * Saves a confirmed layout under a name: the same again changes nothing, another under a known name is
 * its next version. Returns its id, or the one the upload was read by where no name was given.
 */
export async function saveColumnLayout(
  { em, actor, now }: CommandContext,
  upload: Upload,
  { layout, shapeKey }: ChosenLayout,
  name: string,
): Promise<number | null> {
  if (name === '') return upload.columnLayout?.id ?? null;
  const newest = await em.findOne(
    ColumnLayout,
    { site: upload.site.id, name },
    { orderBy: { version: 'desc' } },
  );
  // A speed belongs to the file at hand and is never offered again.
  const kept = { ...layout, speedRpm: null };
  if (newest && newest.shapeKey === shapeKey && isDeepStrictEqual(newest.layout, kept))
    return newest.id;
  const made = em.create(ColumnLayout, {
    site: upload.site,
    name,
    version: (newest?.version ?? 0) + 1,
    shapeKey,
    layout: kept,
    person: em.getReference(Person, actor.personId, { wrapped: true }),
    createdAt: now,
  });
  await em.flush();
  return made.id;
}
