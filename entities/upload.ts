import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { Person } from './person';
import { Point } from './bearing';
import { Site } from './site';

/** How the columns of a kind of file are read. A change makes a new version. */
export const ColumnLayout = defineEntity({
  name: 'ColumnLayout',
  tableName: 'column_layout',
  uniques: [
    { name: 'column_layout_site_name_version_unique', properties: ['site', 'name', 'version'] },
  ],
  properties: {
    id: p.integer().primary(),
    site: () => p.manyToOne(Site).ref(),
    name: p.string().length(80),
    version: p.integer(),
    /** Fingerprint of the file's shape, by which a later file finds its layout. */
    shapeKey: p.string().length(400),
    layout: p.json<unknown>(),
    person: () => p.manyToOne(Person).ref(),
    createdAt: p.datetime(),
  },
});
export type ColumnLayout = InferEntity<typeof ColumnLayout>;

/** A file as it came in. The bytes stand under the data folder, named by their SHA-256. */
export const Upload = defineEntity({
  name: 'Upload',
  tableName: 'upload',
  uniques: [{ name: 'upload_site_sha256_unique', properties: ['site', 'sha256'] }],
  checks: [{ name: 'upload_size_check', expression: 'size_bytes > 0' }],
  properties: {
    id: p.integer().primary(),
    site: () => p.manyToOne(Site).ref(),
    fileName: p.string().length(200),
    sha256: p.string().length(64),
    sizeBytes: p.integer(),
    person: () => p.manyToOne(Person).ref(),
    at: p.datetime(),
    state: p.enum(['waiting', 'kept', 'held', 'withdrawn'] as const).default('waiting'),
    /** The point named when the file was dropped, if any. */
    point: () => p.manyToOne(Point).ref().nullable(),
    columnLayout: () => p.manyToOne(ColumnLayout).ref().nullable(),
    /** The layout proposed or confirmed, kept by value. */
    layout: p.json<unknown>().nullable(),
  },
});
export type Upload = InferEntity<typeof Upload>;
