import 'server-only';
import type { z } from 'zod';
import type { Failure } from '@/lib/domain/result';

/** The first thing wrong with an input, with the dotted path of its field. */
export function firstIssue(error: z.ZodError): Failure {
  const issue = error.issues[0];
  const field = issue?.path.map(String).join('.');
  const message = issue?.message ?? 'The input could not be read.';
  return field ? { code: 'input', message, field } : { code: 'input', message };
}
