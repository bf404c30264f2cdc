import { readFileSync } from 'node:fs';
import type { EntityManager } from '@mikro-orm/postgresql';
import { Bearing, Point } from '@/entities/bearing';
import { Machine } from '@/entities/machine';
import { LimitSet } from '@/entities/limit-set';
import { Site } from '@/entities/site';
import type { Result } from '@/lib/domain/result';
import type { Actor } from '@/lib/schemas/actor';
import type { LayoutChoicesInput } from '@/lib/schemas/upload-input';
import { confirmUpload } from '@/lib/server/commands/confirm-upload';
import { receiveUpload } from '@/lib/server/commands/receive-upload';
import { seedMachine, type SeededMachine } from '@/tests/support/plant';

/** Bytes of a text, as a file of it would hold. */
export const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

/** A scenario's file. */
export const scenarioFile = (name: string): Uint8Array =>
  new Uint8Array(readFileSync(new URL(`../../reference/data/${name}`, import.meta.url)));

/** The value of a success; throws the sentence of a failure. */
export function valueOf<Value>(result: Result<Value>): Value {
  if (!result.ok) throw new Error(`${result.failure.code}: ${result.failure.message}`);
  return result.value;
}

/** The failure of a result that had to fail. */
export function failureOf<Value>(result: Result<Value>) {
  if (result.ok) throw new Error('succeeded, where it had to fail');
  return result.failure;
}

/** A record of `seconds` at 2560 Hz in g: 1x of `rms` g at `hz`, with a little of its second order. */
export function sineCsv(options: {
  hz: number;
  rms: number;
  seconds?: number;
  tag?: string;
  /** Another seed makes another file of the same vibration. */
  seed?: number;
}): string {
  const { hz, rms, seconds = 2, tag = '', seed = 1 } = options;
  const lines = [`# sample_rate_hz=2560${tag}`, 'acceleration_g'];
  let state = seed;
  for (let i = 0; i < 2560 * seconds; i++) {
    state = (state * 1_103_515_245 + 12_345) % 2_147_483_648;
    const t = i / 2560;
    const tone = Math.SQRT2 * rms * Math.sin(2 * Math.PI * hz * t);
    const second = 0.2 * rms * Math.sin(4 * Math.PI * hz * t + 1);
    const noise = 0.1 * rms * (state / 1_073_741_824 - 1);
    lines.push((tone + second + noise).toFixed(6));
  }
  return `${lines.join('\n')}\n`;
}

/** Choices that confirm a one-column file of acceleration in g as proposed. */
export const ONE_COLUMN_G: LayoutChoicesInput = {
  delimiter: 'none',
  decimalMark: 'point',
  sampleRateHz: 2560,
  columns: [{ role: 'signal', unit: 'g' }],
};

type Upload = {
  name: string;
  bytes: Uint8Array;
  pointId: number;
  takenAt: string;
  layout: LayoutChoicesInput;
  speedRpm?: string;
  layoutName?: string;
};

/** Receives a file and confirms it, as a person would in two steps. */
export async function uploadAndConfirm(actor: Actor, upload: Upload) {
  const { name, bytes, pointId, takenAt, layout, speedRpm = '', layoutName = '' } = upload;
  const received = valueOf(
    await receiveUpload(actor, { fileName: name, bytes, siteId: null, pointId }),
  );
  const { uploadId } = received;
  const input = { uploadId, pointId, takenAt, layout, speedRpm, layoutName };
  return { received, ...valueOf(await confirmUpload(actor, input)) };
}

/** A further machine of the site with its own speeds. */
export async function machineWith(
  em: EntityManager,
  place: { siteId: number; limitSetId: number },
  machine: { tag: string; speeds: [number, number, number]; labels?: [string, string] },
): Promise<SeededMachine> {
  const site = await em.findOneOrFail(Site, { id: place.siteId });
  const limits = await em.findOneOrFail(LimitSet, { id: place.limitSetId });
  const seeded = await seedMachine(em, site, limits, machine.tag);
  const [speedMinRpm, nominalSpeedRpm, speedMaxRpm] = machine.speeds;
  await em.nativeUpdate(
    Machine,
    { id: seeded.machineId },
    { speedMinRpm, nominalSpeedRpm, speedMaxRpm },
  );
  for (const [i, label] of (machine.labels ?? []).entries())
    await em.nativeUpdate(Point, { id: seeded.pointIds[i === 0 ? 0 : 1] }, { label });
  return seeded;
}

/** Gives a bearing the geometry its defect frequencies are calculated from. */
export async function withBallBearing(em: EntityManager, bearingId: number): Promise<void> {
  const geometry = { ballCount: 9, ballDiameterMm: 22.2, pitchDiameterMm: 103, contactDeg: 0 };
  await em.nativeUpdate(Bearing, { id: bearingId }, geometry);
}
