import 'server-only';
import { z } from 'zod';

const schema = z.object({
  DATABASE_URL: z.string().min(1, 'DATABASE_URL must name the PostgreSQL server'),
  SESSION_SECRET: z.string().min(32, 'SESSION_SECRET must have at least 32 characters'),
  EVENRUN_DATA_DIR: z.string().default('.data/files'),
  EVENRUN_SECURE_COOKIES: z.enum(['yes', 'no']).default('no'),
});

let parsed: z.infer<typeof schema> | undefined;

/** The environment, checked once when first needed, so that a build needs none of it. */
export function env(): z.infer<typeof schema> {
  parsed ??= schema.parse(process.env);
  return parsed;
}
