import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { Person } from './person';
import { Site } from './site';

/** Who changed what, when, from what to what, and why. Append-only: the database refuses the rest. */
export const AuditEvent = defineEntity({
  name: 'AuditEvent',
  tableName: 'audit_event',
  indexes: [{ name: 'audit_event_entity_index', properties: ['entity', 'entityId'] }],
  properties: {
    id: p.integer().primary(),
    at: p.datetime(),
    person: () => p.manyToOne(Person).ref().nullable(),
    site: () => p.manyToOne(Site).ref().nullable(),
    action: p.string().length(80),
    entity: p.string().length(60),
    entityId: p.integer().nullable(),
    before: p.json<unknown>().nullable(),
    after: p.json<unknown>().nullable(),
    reason: p.string().length(1000).nullable(),
  },
});
export type AuditEvent = InferEntity<typeof AuditEvent>;
