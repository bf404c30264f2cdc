import type { EntityManager } from '@mikro-orm/postgresql';
import type { ModelledWeight } from '@/lib/domain/plant-model/unbalance-at';
import type { LayoutChoicesInput } from '@/lib/schemas/upload-input';
import type { Result } from '@/lib/domain/result';
import { atTime } from '@/lib/server/clock';
import { confirmUpload } from '@/lib/server/commands/confirm-upload';
import { receiveUpload } from '@/lib/server/commands/receive-upload';
import { DEMO_DAYS } from './demo-calendar';
import { ledgerOf, weightsOn } from './demo-ledger';
import type { DemoMachine } from './demo-machine';
import { machineOf, type DemoPlant } from './demo-plant';
import { sample, type Sampled } from './demo-waveforms';

const ONE_COLUMN: LayoutChoicesInput = {
  delimiter: 'none',
  decimalMark: 'point',
  sampleRateHz: 2560,
  columns: [{ role: 'signal', unit: 'm/s2' }],
};

/** One file held because it was declared at the wrong machine, and two waiting to be looked at. */
export async function seedUploads(em: EntityManager, plant: DemoPlant): Promise<void> {
  await holdWrongPoint(plant);
  const fan = machineOf(plant, 'EF-101');
  const now = weightsOn(await ledgerOf(em, fan), plant.calendar.at(DEMO_DAYS));
  const withTacho = csv(sampled(fan, 3, now), { mark: '.', delimiter: ',', tacho: true });
  await receive(plant, fan, { fileName: 'EF-101_B-H_with_tacho.csv', text: withTacho, index: 3 });
  const mill = machineOf(plant, 'FD-1');
  const comma = csv(sampled(mill, 0), { mark: ',', delimiter: ';', tacho: true });
  await receive(plant, mill, { fileName: 'FD-1 A-H.csv', text: comma, index: null });
}

/** The pump's vibration, uploaded as the motor's beside it. */
async function holdWrongPoint(plant: DemoPlant): Promise<void> {
  const motor = machineOf(plant, 'M-204');
  const pump = machineOf(plant, 'P-205');
  const text = csv(sampled(pump, 0), { mark: '.', delimiter: ',', tacho: false });
  const file = { fileName: 'M-204_A-H.csv', text, index: 0 };
  const { uploadId } = await receive(plant, motor, file);
  const confirmed = await atTime(plant.calendar.at(DEMO_DAYS - 1, 15, 20), () =>
    confirmUpload(motor.by, {
      uploadId,
      layout: ONE_COLUMN,
      layoutName: 'One column in m/s²',
      pointId: motor.pointIds[0] ?? 0,
      takenAt: plant.calendar.at(DEMO_DAYS - 1, 9, 40).toISOString(),
      speedRpm: '',
    }),
  );
  if (valueOf(confirmed).state !== 'held') throw new Error('The wrong point was not noticed');
}

async function receive(
  { calendar }: DemoPlant,
  { by, siteId, pointIds }: DemoMachine,
  file: { fileName: string; text: string; index: number | null },
) {
  const received = await atTime(calendar.at(DEMO_DAYS - 1, 15, 5), () =>
    receiveUpload(by, {
      fileName: file.fileName,
      bytes: new TextEncoder().encode(file.text),
      siteId,
      pointId: file.index === null ? null : (pointIds[file.index] ?? null),
    }),
  );
  return valueOf(received);
}

function sampled(
  machine: DemoMachine,
  pointIndex: number,
  weights: readonly ModelledWeight[] = [],
): Sampled {
  const { speedRpm } = machine.spec;
  return sample({ machine, pointIndex }, { day: DEMO_DAYS - 0.6, speedRpm }, weights);
}

function csv(
  { samplesMS2, tacho, sampleRateHz }: Sampled,
  as: { mark: '.' | ','; delimiter: ',' | ';'; tacho: boolean },
): string {
  const head = as.tacho ? `acceleration_m_s2${as.delimiter}tacho` : 'acceleration_m_s2';
  const lines = Array.from(samplesMS2, (value, i) => {
    const typed = value.toFixed(5).replace('.', as.mark);
    return as.tacho ? `${typed}${as.delimiter}${tacho[i] ?? 0}` : typed;
  });
  return `# sample_rate_hz=${sampleRateHz}\n${head}\n${lines.join('\n')}\n`;
}

function valueOf<Value>(result: Result<Value>): Value {
  if (result.ok) return result.value;
  throw new Error(`${result.failure.code}: ${result.failure.message}`);
}
