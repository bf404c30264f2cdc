import 'server-only';
import type { Actor } from '@/lib/schemas/actor';
import type { Report } from '@/lib/schemas/report';
import { problem } from '../route-handler';
import { paperOf } from './paper';
import { picturesOf } from './pictures-of';
import { reportPdf } from './report-pdf';

/** A report as a PDF on the paper that the address asks for. */
export async function pdfResponse(
  actor: Actor,
  report: Report,
  asked: { request: Request; name: string },
): Promise<Response> {
  const paper = paperOf(new URL(asked.request.url).searchParams);
  if (!paper.ok) return problem(400, 'No such paper', paper.failure.message);
  const bytes = await reportPdf(report, paper.value, await picturesOf(actor, report));
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': 'application/pdf',
      'content-disposition': `inline; filename="${encodeURIComponent(asked.name)}"`,
      'cache-control': 'private, no-store',
    },
  });
}
