import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Photo, WeightFixing } from '@/entities/photo';
import type { LedgerWeightDto } from '@/lib/schemas/balance-job';

/** Adds fixing and photos to weights, in two statements for all of them. */
export async function withEvidence(
  em: EntityManager,
  weights: readonly LedgerWeightDto[],
): Promise<LedgerWeightDto[]> {
  const ids = weights.map(({ id }) => id);
  const fixings = await em.find(WeightFixing, { weight: { $in: ids } });
  const photos = await em.find(
    Photo,
    { weight: { $in: ids } },
    { orderBy: { id: 'asc' }, populate: ['person'] },
  );
  return weights.map((dto) => {
    const fixing = fixings.find(({ weight }) => weight.id === dto.id);
    return {
      ...dto,
      fixedBy: fixing
        ? {
            kind: fixing.kind,
            secured: fixing.secured ?? null,
            noPhotoReason: fixing.noPhotoReason ?? null,
          }
        : null,
      photos: photos
        .filter(({ weight }) => weight.id === dto.id)
        .map(({ id, sha256, widthPx, heightPx, person, at }) => ({
          id,
          sha256,
          widthPx,
          heightPx,
          person: person.$.name,
          at: at.toISOString(),
        })),
    };
  });
}
