import 'server-only';
import { compare, hashSync } from 'bcryptjs';
import type { EntityManager } from '@mikro-orm/postgresql';
import { AuditEvent } from '@/entities/audit-event';
import { Person, Session, SignInAttempt } from '@/entities/person';
import { fail, ok, type Result } from '@/lib/domain/result';
import { getEntityManager } from './db';
import { hashSessionKey, newSessionKey, SESSION_HOURS } from './session';

const WINDOW_MS = 15 * 60_000;
const FREE_TRIES = 5;
const WRONG = 'The e-mail address or the password is wrong. Check both and try again.';

/** Compared against when nobody has the address, so that the answer takes as long either way. */
const NOBODY = hashSync('nobody has this password', 10);

/**
 * Opens a session for the person with this address and password. After five failures within a
 * quarter of an hour each further try for that address waits: 2, 4, 8 … seconds, at most 15 minutes.
 */
export async function signIn(
  email: string,
  password: string,
  now = new Date(),
): Promise<Result<{ key: string }>> {
  const em = await getEntityManager();
  const wait = await secondsToWait(em, email, now);
  if (wait > 0) return fail('slow-down', `Too many failed tries. Wait ${wait} s, then try again.`);
  const person = await em.findOne(Person, { email, state: 'active' });
  const right = await compare(password, person?.passwordHash ?? NOBODY);
  if (!person || !right) {
    em.create(SignInAttempt, { key: email, at: now });
    await em.flush();
    return fail('wrong', WRONG, 'password');
  }
  return ok({ key: await openSession(em, person, now) });
}

/** Ends a session on the server: the cookie's key opens nothing afterwards. */
export async function endSession(key: string, now = new Date()): Promise<void> {
  const em = await getEntityManager();
  await em.transactional(async (inner) => {
    const session = await inner.findOne(Session, { keyHash: hashSessionKey(key), endedAt: null });
    if (!session) return;
    session.endedAt = now;
    auditSession(inner, { person: session.person.id, action: 'signOut', at: now }, session.id);
  });
}

function openSession(em: EntityManager, person: Person, now: Date): Promise<string> {
  const { key, keyHash } = newSessionKey();
  return em.transactional(async (inner) => {
    const expiresAt = new Date(now.getTime() + SESSION_HOURS * 3_600_000);
    const session = inner.create(Session, {
      keyHash,
      person: person.id,
      createdAt: now,
      expiresAt,
    });
    await inner.flush();
    await inner.nativeDelete(SignInAttempt, { key: person.email });
    auditSession(inner, { person: person.id, action: 'signIn', at: now }, session.id);
    return key;
  });
}

async function secondsToWait(em: EntityManager, email: string, now: Date): Promise<number> {
  const since = new Date(now.getTime() - WINDOW_MS);
  const tries = await em.find(
    SignInAttempt,
    { key: email, at: { $gt: since } },
    { orderBy: { at: 'desc' } },
  );
  const last = tries[0];
  if (!last || tries.length < FREE_TRIES) return 0;
  const pauseMs = Math.min(WINDOW_MS, 2 ** (tries.length - FREE_TRIES + 1) * 1000);
  return Math.ceil((last.at.getTime() + pauseMs - now.getTime()) / 1000);
}

function auditSession(
  em: EntityManager,
  by: { person: number; action: string; at: Date },
  sessionId: number,
) {
  em.create(AuditEvent, {
    at: by.at,
    person: by.person,
    action: by.action,
    entity: 'Session',
    entityId: sessionId,
  });
}
