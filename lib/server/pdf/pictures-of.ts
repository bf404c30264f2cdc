import 'server-only';
import type { Actor } from '@/lib/schemas/actor';
import type { Report } from '@/lib/schemas/report';
import { weightPhoto } from '../queries/weight-photo';
import type { Pictures } from './report-pdf';

/** The photos of a report that the actor may see; one that the store has lost is left out. */
export async function picturesOf(actor: Actor, report: Report): Promise<Pictures> {
  const pictures = new Map<number, Buffer>();
  for (const block of report.sections.flatMap(({ blocks }) => blocks)) {
    if (block.kind !== 'photos') continue;
    for (const { id } of block.photos) {
      const bytes = await weightPhoto(actor, { photoId: id, size: 'full' }).catch(() => null);
      if (bytes) pictures.set(id, Buffer.from(bytes));
    }
  }
  return pictures;
}
