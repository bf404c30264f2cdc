import 'server-only';
import { z } from 'zod';
import { fail, ok, type Result } from '@/lib/domain/result';

/** Far more than a record of hundreds of runs needs. */
export const LARGEST_FILE_CHARS = 5_000_000;

const addendum = z.looseObject({ number: z.number(), hash: z.string() });

const recordFile = z.looseObject({
  kind: z.literal('Evenrun job record'),
  version: z.literal(1),
  contentHash: z.string().regex(/^[0-9a-f]{64}$/),
  content: z.looseObject({ id: z.number().int().positive().max(2_147_483_647) }),
  signedAt: z.string(),
  signedBy: z.string(),
  role: z.string(),
  statement: z.string(),
  addenda: z.array(addendum).default([]),
});

/** A job record that somebody kept as a file. */
export type KeptRecord = z.output<typeof recordFile>;

/** Reads a kept file; the failure says what of it is not as a job record is. */
export function readRecordFile(text: string): Result<KeptRecord> {
  if (text.length > LARGEST_FILE_CHARS)
    return fail(
      'too-long',
      `This file has ${text.length} characters; a job record has at most ${LARGEST_FILE_CHARS}.`,
    );
  const json = parsed(text);
  if (!json.ok) return json;
  const read = recordFile.safeParse(json.value);
  if (read.success) return ok(read.data);
  const [issue] = read.error.issues;
  const where = issue?.path.join('.') ?? '';
  return fail(
    'not-a-record',
    `This is no job record as this register writes them: ${where === '' ? 'it is no object' : `“${where}” is missing or not as expected`}. Take the file that “As JSON” gave.`,
  );
}

function parsed(text: string): Result<unknown> {
  try {
    const value: unknown = JSON.parse(text);
    return ok(value);
  } catch (error) {
    const why = error instanceof Error ? error.message : '';
    return fail('not-json', `This file is no JSON (${why}). Take the file that “As JSON” gave.`);
  }
}
