import 'server-only';
import { Point } from '@/entities/bearing';
import { Person } from '@/entities/person';
import { Site } from '@/entities/site';
import { Upload } from '@/entities/upload';
import { fail, ok, type Result } from '@/lib/domain/result';
import { formatBytes } from '@/lib/format';
import { routes } from '@/lib/routes';
import { receiveUploadInput, UPLOAD_BYTES_MAX } from '@/lib/schemas/upload-input';
import { command, type CommandContext } from '../command';
import { proposeLayout } from '../intake/propose-layout';
import { notFound, visiblePoint } from '../scope';
import { putFile, sha256Of } from '../store/files';

export type ReceivedUpload = {
  uploadId: number;
  /** What a person must still say before it can be read. */
  questions: string[];
  /** Why it cannot be read as proposed, naming line, column and value. */
  problem: string | null;
  /** The saved column layout it is read by. */
  layoutName: string | null;
};

type Target = { siteId: number; pointId: number | null };

/**
 * Takes one file in: refused in words where it is empty, too large, no text, or here already;
 * otherwise its bytes are stored as they are and it waits for a person to confirm how it is read.
 */
export const receiveUpload = command(
  { name: 'receiveUpload', permission: 'measurement:upload', input: receiveUploadInput },
  async (context, { fileName, bytes, siteId, pointId }): Promise<Result<ReceivedUpload>> => {
    const { em, actor, audit, now } = context;
    const target = await targetOf(context, siteId, pointId);
    if (!target.ok) return target;
    if (bytes.byteLength > UPLOAD_BYTES_MAX) return tooLarge(fileName, bytes.byteLength);
    const sha256 = sha256Of(bytes);
    const same = await em.findOne(Upload, { site: target.value.siteId, sha256 });
    if (same) return duplicate(fileName, same);
    const proposed = await proposeLayout(em, target.value.siteId, { bytes, fileName });
    if (!proposed.ok) return { ok: false, failure: { ...proposed.failure, field: 'file' } };
    const { saved, ...layout } = proposed.value;
    const stored = await putFile(bytes);
    const upload = em.create(Upload, {
      site: em.getReference(Site, target.value.siteId, { wrapped: true }),
      fileName,
      ...stored,
      person: em.getReference(Person, actor.personId, { wrapped: true }),
      at: now,
      state: 'waiting',
      point: target.value.pointId
        ? em.getReference(Point, target.value.pointId, { wrapped: true })
        : null,
      columnLayout: saved,
      layout,
    });
    await em.flush();
    const { siteId: auditedSite } = target.value;
    const after = { fileName, ...stored, pointId: target.value.pointId };
    audit({ siteId: auditedSite, entity: 'Upload', entityId: upload.id, after });
    return ok({
      uploadId: upload.id,
      questions: layout.questions.map(({ message }) => message),
      problem: layout.problem,
      layoutName: saved?.name ?? null,
    });
  },
);

async function targetOf(
  context: CommandContext,
  siteId: number | null,
  pointId: number | null,
): Promise<Result<Target>> {
  if (pointId !== null) {
    const point = await visiblePoint(context, pointId);
    if (!point) return notFound('point');
    return ok({ siteId: point.machine.$.site.id, pointId });
  }
  const { siteIds } = context;
  const chosen = siteId ?? (siteIds.length === 1 ? siteIds[0] : undefined);
  if (chosen === undefined)
    return fail(
      'site',
      'You work at several sites: choose the one these files belong to.',
      'siteId',
    );
  return siteIds.includes(chosen) ? ok({ siteId: chosen, pointId: null }) : notFound('site');
}

function tooLarge(fileName: string, bytes: number) {
  return fail(
    'too-large',
    `${fileName} has ${formatBytes(bytes)} and one file may have ${formatBytes(UPLOAD_BYTES_MAX)}: export a shorter record.`,
    'file',
  );
}

function duplicate(fileName: string, same: Upload) {
  const { ok: no, failure } = fail(
    'duplicate',
    `${fileName} is in the register already, as ${same.fileName} (${same.state}): open that one instead.`,
    'file',
  );
  return { ok: no, failure: { ...failure, link: routes.upload(same.id) } };
}
