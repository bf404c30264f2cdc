import 'server-only';
import { createHash, randomUUID } from 'node:crypto';
import { access, mkdir, open, readFile, rename, rm } from 'node:fs/promises';
import { join, resolve } from 'node:path';
import { env } from '../env';

export type StoredFile = { sha256: string; sizeBytes: number };

/**
 * Stores bytes under their own SHA-256. Written to a temporary name, flushed to disk, then renamed,
 * so that a file under its final name is always whole. The same bytes twice are one file.
 */
export async function putFile(source: Uint8Array | AsyncIterable<Uint8Array>): Promise<StoredFile> {
  const incoming = join(root(), 'incoming');
  await mkdir(incoming, { recursive: true });
  const temporary = join(incoming, randomUUID());
  try {
    const stored = await writeHashed(temporary, source);
    await settle(temporary, placeOf(stored.sha256));
    return stored;
  } catch (error) {
    await rm(temporary, { force: true });
    throw error;
  }
}

/** The bytes stored under a SHA-256; throws where there are none. */
export function readStoredFile(sha256: string): Promise<Buffer> {
  return readFile(placeOf(sha256));
}

/** SHA-256 of bytes, in hex: the name they are stored under. */
export function sha256Of(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}

async function writeHashed(
  path: string,
  source: Uint8Array | AsyncIterable<Uint8Array>,
): Promise<StoredFile> {
  const hash = createHash('sha256');
  const file = await open(path, 'wx');
  let sizeBytes = 0;
  try {
    for await (const piece of source instanceof Uint8Array ? [source] : source) {
      hash.update(piece);
      sizeBytes += piece.byteLength;
      await file.writeFile(piece);
    }
    await file.sync();
  } finally {
    await file.close();
  }
  return { sha256: hash.digest('hex'), sizeBytes };
}

async function settle(temporary: string, place: string): Promise<void> {
  await mkdir(join(place, '..'), { recursive: true });
  const there = await access(place).then(
    () => true,
    () => false,
  );
  await (there ? rm(temporary) : rename(temporary, place));
}

function root(): string {
  return resolve(env().EVENRUN_DATA_DIR);
}

function placeOf(sha256: string): string {
  if (!/^[0-9a-f]{64}$/.test(sha256)) throw new Error('A stored file is named by a SHA-256 in hex');
  return join(root(), sha256.slice(0, 2), sha256);
}
