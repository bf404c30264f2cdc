import 'server-only';
import { hash } from 'bcryptjs';

/** Work factor of bcrypt, as the demo people's. */
const ROUNDS = 10;

/** What the database keeps of a password. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, ROUNDS);
}
