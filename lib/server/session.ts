import 'server-only';
import { createHash, randomBytes } from 'node:crypto';
import { getIronSession } from 'iron-session';
import { cookies } from 'next/headers';
import { env } from './env';

export const SESSION_HOURS = 12;

type SessionCookie = { key?: string };

/** The sealed cookie: it carries a random key and nothing else. */
export async function sessionCookie() {
  return getIronSession<SessionCookie>(await cookies(), {
    password: env().SESSION_SECRET,
    cookieName: 'evenrun',
    ttl: SESSION_HOURS * 3600,
    cookieOptions: {
      httpOnly: true,
      sameSite: 'lax',
      secure: env().EVENRUN_SECURE_COOKIES === 'yes',
      path: '/',
    },
  });
}

/** A fresh session key and what the database keeps of it. */
export function newSessionKey(): { key: string; keyHash: string } {
  const key = randomBytes(32).toString('hex');
  return { key, keyHash: hashSessionKey(key) };
}

/** SHA-256 of a session key: a stolen table opens no session. */
export function hashSessionKey(key: string): string {
  return createHash('sha256').update(key).digest('hex');
}
