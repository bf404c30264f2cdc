import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { Site } from './site';

/** Someone who signs in. Names stay on signed records after the account is closed. */
export const Person = defineEntity({
  name: 'Person',
  tableName: 'person',
  uniques: [{ name: 'person_email_unique', properties: ['email'] }],
  checks: [{ name: 'person_email_lower_check', expression: 'email = lower(email)' }],
  properties: {
    id: p.integer().primary(),
    name: p.string().length(120),
    email: p.string().length(200),
    passwordHash: p.string().length(100).hidden(),
    role: p.enum(['reader', 'technician', 'engineer', 'planner', 'administrator'] as const),
    state: p.enum(['active', 'closed'] as const).default('active'),
    createdAt: p.datetime(),
  },
});
export type Person = InferEntity<typeof Person>;

/** That a person may enter a site. */
export const SiteAccess = defineEntity({
  name: 'SiteAccess',
  tableName: 'site_access',
  uniques: [{ name: 'site_access_person_site_unique', properties: ['person', 'site'] }],
  properties: {
    id: p.integer().primary(),
    person: () => p.manyToOne(Person).ref(),
    site: () => p.manyToOne(Site).ref(),
  },
});
export type SiteAccess = InferEntity<typeof SiteAccess>;

/** A signed-in session. The cookie holds only its key, so that ending it here ends it everywhere. */
export const Session = defineEntity({
  name: 'Session',
  tableName: 'session',
  uniques: [{ name: 'session_key_hash_unique', properties: ['keyHash'] }],
  properties: {
    id: p.integer().primary(),
    keyHash: p.string().length(64).hidden(),
    person: () => p.manyToOne(Person).ref(),
    createdAt: p.datetime(),
    expiresAt: p.datetime(),
    endedAt: p.datetime().nullable(),
  },
});
export type Session = InferEntity<typeof Session>;

/** Counts failed sign-ins, so that guessing is slowed in every process alike. */
export const SignInAttempt = defineEntity({
  name: 'SignInAttempt',
  tableName: 'sign_in_attempt',
  indexes: [{ name: 'sign_in_attempt_key_at_index', properties: ['key', 'at'] }],
  properties: {
    id: p.integer().primary(),
    key: p.string().length(250),
    at: p.datetime(),
  },
});
export type SignInAttempt = InferEntity<typeof SignInAttempt>;
