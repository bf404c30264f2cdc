import 'server-only';
import { UniqueConstraintViolationException } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import type { z } from 'zod';
import { AuditEvent } from '@/entities/audit-event';
import { Person } from '@/entities/person';
import { Site } from '@/entities/site';
import { allows, type Permission } from '@/lib/domain/access/permissions';
import { fail, type Failure, type Result } from '@/lib/domain/result';
import type { Actor } from '@/lib/schemas/actor';
import { clockNow } from './clock';
import { constraintFailure } from './constraint-failures';
import { getEntityManager } from './db';
import { firstIssue } from './first-issue';
import { openSiteIds } from './query';

export type AuditEntry = {
  readonly siteId: number | null;
  readonly entity: string;
  readonly entityId: number | null;
  readonly before?: unknown;
  readonly after?: unknown;
  readonly reason?: string | null;
};

export type CommandContext = {
  readonly actor: Actor;
  readonly em: EntityManager;
  readonly siteIds: number[];
  readonly now: Date;
  /** Writes the audit row of this change into the same transaction. */
  readonly audit: (entry: AuditEntry) => void;
};

export type Command<Schema extends z.ZodType, Value> = ((
  actor: Actor,
  input: z.input<Schema>,
) => Promise<Result<Value>>) & {
  readonly kind: 'command';
  readonly name: string;
  readonly permission: Permission;
  readonly schema: Schema;
};

/** Leaves a transaction without committing it. */
class RolledBack extends Error {
  constructor(readonly failure: Failure) {
    super(failure.message);
  }
}

/**
 * A write: permission → input → one transaction holding the change and its audit row. A command that
 * changes something without saying so to `audit` is a bug and is rolled back. A failure handed back by
 * `change` rolls everything back too.
 */
export function command<Schema extends z.ZodType, Value>(
  definition: { name: string; permission: Permission; input: Schema },
  change: (context: CommandContext, input: z.output<Schema>) => Promise<Result<Value>>,
): Command<Schema, Value> {
  const { name, permission, input: schema } = definition;
  const run = async (actor: Actor, input: z.input<Schema>): Promise<Result<Value>> => {
    if (!allows(actor.role, permission)) return fail('forbidden', forbiddenMessage(actor));
    const parsed = schema.safeParse(input);
    if (!parsed.success) return { ok: false, failure: firstIssue(parsed.error) };
    return inTransaction(actor, name, (context) => change(context, parsed.data));
  };
  Object.defineProperty(run, 'name', { value: name });
  return Object.assign(run, { kind: 'command' as const, permission, schema });
}

async function inTransaction<Value>(
  actor: Actor,
  name: string,
  change: (context: CommandContext) => Promise<Result<Value>>,
): Promise<Result<Value>> {
  const forked = await getEntityManager();
  try {
    return await forked.transactional(async (em) => {
      let audited = 0;
      const now = clockNow();
      const audit = (entry: AuditEntry) => {
        audited += 1;
        em.persist(auditRow(em, { actor, name, now }, entry));
      };
      const siteIds = openSiteIds(actor);
      const result = await change({ actor, em, siteIds, now, audit });
      if (!result.ok) throw new RolledBack(result.failure);
      if (audited === 0) throw new Error(`${name} wrote no audit row`);
      return result;
    });
  } catch (error) {
    if (error instanceof RolledBack) return { ok: false, failure: error.failure };
    if (error instanceof UniqueConstraintViolationException) {
      const failure = constraintFailure(error);
      if (failure) return { ok: false, failure };
    }
    throw error;
  }
}

function auditRow(
  em: EntityManager,
  by: { actor: Actor; name: string; now: Date },
  entry: AuditEntry,
) {
  return em.create(AuditEvent, {
    at: by.now,
    person: em.getReference(Person, by.actor.personId, { wrapped: true }),
    site: entry.siteId === null ? null : em.getReference(Site, entry.siteId, { wrapped: true }),
    action: by.name,
    entity: entry.entity,
    entityId: entry.entityId,
    before: entry.before ?? null,
    after: entry.after ?? null,
    reason: entry.reason ?? null,
  });
}

function forbiddenMessage(actor: Actor): string {
  return `Your role (${actor.role}) does not allow this. Ask an administrator of the site.`;
}
