import { hash } from 'bcryptjs';
import type { EntityManager } from '@mikro-orm/postgresql';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AuditEvent } from '@/entities/audit-event';
import { Person, Session } from '@/entities/person';
import { actorOfKey } from '@/lib/server/actor';
import { hashSessionKey } from '@/lib/server/session';
import { endSession, signIn } from '@/lib/server/sign-in';
import { openPlant } from '@/tests/support/open-plant';

let em: EntityManager;
let close: () => Promise<void>;

const PASSWORD = 'three plain words';
const START = new Date('2026-11-02T06:00:00Z');
const after = (seconds: number) => new Date(START.getTime() + seconds * 1000);

beforeAll(async () => {
  ({ em, close } = await openPlant());
});

afterAll(() => close());

async function person(email: string, state: 'active' | 'closed' = 'active'): Promise<number> {
  const made = em.create(Person, {
    name: email,
    email,
    passwordHash: await hash(PASSWORD, 4),
    role: 'reader',
    state,
    createdAt: START,
  });
  await em.flush();
  return made.id;
}

async function fail(email: string, times: number, at: Date): Promise<void> {
  for (let done = 0; done < times; done++)
    expect(await signIn(email, 'wrong', at)).toMatchObject({ failure: { code: 'wrong' } });
}

describe('signing in', () => {
  it('opens a session of which the database keeps only the hash of the key', async () => {
    const personId = await person('right@example.test');
    const result = await signIn('right@example.test', PASSWORD, START);
    const key = result.ok ? result.value.key : '';
    expect(key).toMatch(/^[0-9a-f]{64}$/);
    const session = await em.fork().findOneOrFail(Session, { person: personId });
    expect(session.keyHash).toBe(hashSessionKey(key));
    expect(session.keyHash).not.toBe(key);
    expect(session.expiresAt).toEqual(after(12 * 3600));
    expect(await em.fork().count(AuditEvent, { action: 'signIn', person: personId })).toBe(1);
  });

  it('says the same of a wrong password, an unknown address and a closed account', async () => {
    await person('known@example.test');
    await person('closed@example.test', 'closed');
    const said = await Promise.all([
      signIn('known@example.test', 'wrong', START),
      signIn('nobody@example.test', PASSWORD, START),
      signIn('closed@example.test', PASSWORD, START),
    ]);
    const [first] = said;
    expect(first).toMatchObject({ ok: false });
    for (const one of said) expect(one).toEqual(first);
  });
});

describe('guessing', () => {
  it('waits 2, 4, 8 seconds after the fifth failure, also with the right password', async () => {
    await person('guessed@example.test');
    await fail('guessed@example.test', 5, START);
    const tooSoon = await signIn('guessed@example.test', PASSWORD, after(1));
    expect(tooSoon).toMatchObject({ failure: { code: 'slow-down' } });
    expect(tooSoon.ok ? '' : tooSoon.failure.message).toContain('Wait 1 s');
    await fail('guessed@example.test', 1, after(2));
    expect(await signIn('guessed@example.test', PASSWORD, after(5))).toMatchObject({ ok: false });
    await fail('guessed@example.test', 1, after(6));
    expect(await signIn('guessed@example.test', PASSWORD, after(13))).toMatchObject({
      failure: { code: 'slow-down' },
    });
    expect(await signIn('guessed@example.test', PASSWORD, after(14))).toMatchObject({ ok: true });
  });

  it('is forgotten after a sign-in and after a quarter of an hour', async () => {
    await person('forgiven@example.test');
    await fail('forgiven@example.test', 4, START);
    expect(await signIn('forgiven@example.test', PASSWORD, after(1))).toMatchObject({ ok: true });
    await fail('forgiven@example.test', 4, after(2));
    await person('later@example.test');
    await fail('later@example.test', 5, START);
    await fail('later@example.test', 1, after(15 * 60 + 1));
  });

  it('slows nobody else', async () => {
    await person('other@example.test');
    await fail('victim@example.test', 5, START);
    expect(await signIn('other@example.test', PASSWORD, after(1))).toMatchObject({ ok: true });
  });
});

async function openKey(email: string): Promise<string> {
  const result = await signIn(email, PASSWORD, START);
  if (!result.ok) throw new Error(result.failure.message);
  return result.value.key;
}

describe('a session’s key', () => {
  it('opens the register for its person, for twelve hours', async () => {
    const personId = await person('keyed@example.test');
    const key = await openKey('keyed@example.test');
    expect(await actorOfKey(key, after(1))).toMatchObject({ personId, role: 'reader' });
    expect(await actorOfKey(key, after(12 * 3600 - 1))).toMatchObject({ personId });
    expect(await actorOfKey(key, after(12 * 3600))).toBeNull();
  });

  it('opens nothing after signing out, while another session of the person stays', async () => {
    const personId = await person('twice@example.test');
    const [here, there] = [
      await openKey('twice@example.test'),
      await openKey('twice@example.test'),
    ];
    await endSession(here, after(60));
    expect(await actorOfKey(here, after(61))).toBeNull();
    expect(await actorOfKey(there, after(61))).toMatchObject({ personId });
  });

  it('opens nothing for a closed account, though its session never ended', async () => {
    const personId = await person('shut@example.test');
    const key = await openKey('shut@example.test');
    await em.nativeUpdate(Person, { id: personId }, { state: 'closed' });
    expect(await actorOfKey(key, after(1))).toBeNull();
  });

  it('is neither its hash nor a made-up key', async () => {
    await person('hashed@example.test');
    const key = await openKey('hashed@example.test');
    expect(await actorOfKey(hashSessionKey(key), after(1))).toBeNull();
    expect(await actorOfKey('0'.repeat(64), after(1))).toBeNull();
  });
});

describe('signing out', () => {
  it('ends the session on the server, once', async () => {
    const personId = await person('leaves@example.test');
    const result = await signIn('leaves@example.test', PASSWORD, START);
    const key = result.ok ? result.value.key : '';
    await endSession(key, after(60));
    const session = await em.fork().findOneOrFail(Session, { person: personId });
    expect(session.endedAt).toEqual(after(60));
    await endSession(key, after(120));
    const again = await em.fork().findOneOrFail(Session, { person: personId });
    expect(again.endedAt).toEqual(after(60));
    expect(await em.fork().count(AuditEvent, { action: 'signOut', person: personId })).toBe(1);
  });
});
