import 'server-only';
import { fail, ok, type Result } from '@/lib/domain/result';

/** Sizes of paper by the name in an address, as pdfkit calls them. */
const PAPERS = { a4: 'A4', letter: 'LETTER' } as const;

export type Paper = (typeof PAPERS)[keyof typeof PAPERS];

/** The paper an address asks for: A4 where it asks for none. */
export function paperOf(search: URLSearchParams): Result<Paper> {
  const asked = search.get('paper') ?? 'a4';
  if (asked === 'a4' || asked === 'letter') return ok(PAPERS[asked]);
  return fail('paper', `There is no paper “${asked}” here: write paper=a4 or paper=letter.`);
}
