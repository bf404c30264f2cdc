import 'server-only';
import type { z } from 'zod';
import type { Failure } from '@/lib/domain/result';

/** Everything wrong with an input, each with the dotted path of its field; the first leads. */
export function firstIssue(error: z.ZodError): Failure {
  const [first = { code: 'input', message: 'The input could not be read.' }, ...more] =
    error.issues.map(({ path, message }): Failure => {
      const field = path.map(String).join('.');
      return field === '' ? { code: 'input', message } : { code: 'input', message, field };
    });
  return more.length === 0 ? first : { ...first, more };
}
