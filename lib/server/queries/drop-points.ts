import 'server-only';
import { Point } from '@/entities/bearing';
import type { DropPoint } from '@/lib/schemas/in-tray';
import { query } from '../query';

/** The points of the actor's sites that files may be dropped for. */
export const dropPoints = query(
  'measurement:upload',
  async ({ em, siteIds }, _args: undefined): Promise<DropPoint[]> => {
    const points = await em.find(
      Point,
      { machine: { site: { $in: siteIds }, state: 'active' } },
      { populate: ['machine'], orderBy: { machine: { tag: 'asc' }, order: 'asc' } },
    );
    return points.map(({ id, label, machine }) => {
      const { tag, name, site } = machine.$;
      return { id, label: `${tag} ${label}`, machine: name, siteId: site.id };
    });
  },
);
