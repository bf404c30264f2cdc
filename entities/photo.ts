import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { Person } from './person';
import { Site } from './site';
import { Weight } from './weight';

/**
 * A photo of a fitted weight. The picture as it is kept (turned upright, no metadata) and its thumbnail
 * stand under the data folder, named by their SHA-256.
 */
export const Photo = defineEntity({
  name: 'Photo',
  tableName: 'photo',
  indexes: [{ name: 'photo_weight_index', properties: ['weight'] }],
  uniques: [{ name: 'photo_weight_sha256_unique', properties: ['weight', 'sha256'] }],
  checks: [{ name: 'photo_size_check', expression: 'width_px > 0 and height_px > 0' }],
  properties: {
    id: p.integer().primary(),
    site: () => p.manyToOne(Site).ref(),
    weight: () => p.manyToOne(Weight).ref(),
    fileName: p.string().length(200),
    sha256: p.string().length(64),
    thumbnailSha256: p.string().length(64),
    widthPx: p.integer(),
    heightPx: p.integer(),
    person: () => p.manyToOne(Person).ref(),
    at: p.datetime(),
  },
});
export type Photo = InferEntity<typeof Photo>;

/** How a weight was fixed when it was fitted, and why there was no photo of it then. */
export const WeightFixing = defineEntity({
  name: 'WeightFixing',
  tableName: 'weight_fixing',
  uniques: [{ name: 'weight_fixing_weight_unique', properties: ['weight'] }],
  properties: {
    id: p.integer().primary(),
    weight: () => p.manyToOne(Weight).ref(),
    kind: p.enum(['temporary', 'weld', 'bolt', 'rivet', 'set screw', 'clip'] as const),
    /** Torqued and locked, or the weld looked at; null where it is temporary. */
    secured: p.boolean().nullable(),
    /** Null where a photo came with the weight. */
    noPhotoReason: p.string().length(200).nullable(),
  },
});
export type WeightFixing = InferEntity<typeof WeightFixing>;
