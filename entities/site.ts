import { defineEntity, p, type InferEntity } from '@mikro-orm/core';

/** A plant. Everything below it is reached only by people with access to it. */
export const Site = defineEntity({
  name: 'Site',
  tableName: 'site',
  uniques: [{ name: 'site_name_unique', properties: ['name'] }],
  properties: {
    id: p.integer().primary(),
    name: p.string().length(80),
    timeZone: p.string().length(60),
    unitsShown: p.enum(['metric', 'inch'] as const).default('metric'),
    decimalMark: p.enum(['.', ','] as const).default('.'),
    phaseShown: p.enum(['lag', 'lead'] as const).default('lag'),
  },
});
export type Site = InferEntity<typeof Site>;

/** A part of a site: line, hall, floor. Areas nest. */
export const Area = defineEntity({
  name: 'Area',
  tableName: 'area',
  uniques: [{ name: 'area_site_parent_name_unique', properties: ['site', 'parent', 'name'] }],
  properties: {
    id: p.integer().primary(),
    site: () => p.manyToOne(Site).ref(),
    parent: () => p.manyToOne(Area).ref().nullable(),
    name: p.string().length(80),
  },
});
export type Area = InferEntity<typeof Area>;
