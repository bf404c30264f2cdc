import 'server-only';
import type { EntityManager } from '@mikro-orm/postgresql';
import { ColumnLayout } from '@/entities/upload';
import { layoutForFile } from '@/lib/domain/intake/column-layout';
import { layoutQuestions } from '@/lib/domain/intake/layout-questions';
import { proposeColumnLayout } from '@/lib/domain/intake/propose-column-layout';
import { readWaveformCsv } from '@/lib/domain/intake/read-waveform-csv';
import { ok, type Result } from '@/lib/domain/result';
import { keyOfShape, readColumnLayout, type UploadLayout } from './upload-layout';

export type ProposedLayout = UploadLayout & { saved: ColumnLayout | null };

/**
 * How a file is read: by the newest saved layout of the site for files of its shape, else as found
 * out. Reads the whole file once, so that a fault far down is named before anybody confirms.
 */
export async function proposeLayout(
  em: EntityManager,
  siteId: number,
  file: { bytes: Uint8Array; fileName: string },
): Promise<Result<ProposedLayout>> {
  const proposal = proposeColumnLayout(file.bytes, file.fileName);
  if (!proposal.ok) return proposal;
  const shapeKey = keyOfShape(proposal.value);
  const saved = await em.findOne(
    ColumnLayout,
    { site: siteId, shapeKey },
    { orderBy: { id: 'desc' } },
  );
  const kept = saved ? readColumnLayout(saved.layout) : null;
  const layout = kept ? layoutForFile(kept, proposal.value.layout) : proposal.value.layout;
  const questions = kept
    ? layoutQuestions(layout, { delimiter: layout.delimiter, comma: 'settled' })
    : [...proposal.value.questions];
  const open = questions.some(({ blocking }) => blocking);
  const read = open ? null : readWaveformCsv(file.bytes, layout, file.fileName);
  const problem = read?.ok === false ? read.failure.message : null;
  return ok({ layout, shapeKey, questions, problem, saved: kept ? saved : null });
}
