import 'server-only';
import { STANDING_SENTENCE } from '@/lib/domain/cautions';
import {
  formatDateTime,
  formatDegrees,
  formatQuantity,
  formatSpeed,
  NOT_KNOWN,
} from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { EquipmentDto } from '@/lib/schemas/job-record';
import type { ReportSection } from '@/lib/schemas/report';
import { facts, plain, quiet, strong, table, words } from './blocks';

/** Machine, rotor, reason and how the job ended. */
export function machineSection(job: BalanceJobDto): ReportSection {
  const { machine, rotor, site } = job;
  const mark = { decimalMark: site.decimalMark };
  const closed = job.closedAt ? formatDateTime(job.closedAt, site.timeZone) : 'open';
  return {
    title: 'Machine and reason',
    blocks: [
      facts(
        ['site', site.name],
        ['machine', `${machine.tag} ${machine.name}`],
        ['speed', formatSpeed(machine.nominalSpeedRpm, site.decimalMark)],
        ['rotor', rotor.name],
        [
          'rotor mass',
          rotor.massKg === null ? NOT_KNOWN : formatQuantity(rotor.massKg, 'kg', mark),
        ],
        ['rotor behaviour', rotor.behaviour],
        ['job', `${job.number}, ${job.kind}, ${job.state}`],
        ['opened', `${formatDateTime(job.openedAt, site.timeZone)}, ${job.openedBy}`],
        ['closed', closed],
        ['targets', targetsOf(job)],
        ['starts', startsOf(job)],
      ),
      plain(`Reason: ${job.reason}`),
      ...(job.closingNote === null ? [] : [plain(`Closing note: ${job.closingNote}`)]),
      quiet(STANDING_SENTENCE),
    ],
  };
}

function targetsOf({ targets, unit, rotor, site }: BalanceJobDto): string {
  const said = [
    targets.oneX === null
      ? null
      : `1x below ${formatQuantity(targets.oneX, unit, { decimalMark: site.decimalMark })}`,
    targets.zone === null ? null : `overall in zone ${targets.zone} or better`,
    targets.grade ? `estimate within G ${rotor.grade === null ? NOT_KNOWN : rotor.grade}` : null,
  ].filter((one) => one !== null);
  return said.length === 0 ? 'none set' : said.join('; ');
}

function startsOf({ runs, startsAllowed }: BalanceJobDto): string {
  // A run that corrects another was no start of the machine.
  const used = runs.filter(({ corrects }) => !corrects).length;
  return startsAllowed === null ? `${used} used` : `${used} used of ${startsAllowed}`;
}

/** Mark, tacho, rotation, senses; what it was measured with. */
export function setupSection(job: BalanceJobDto, equipment: EquipmentDto): ReportSection {
  const { setup } = job;
  return {
    title: 'Phase reference, conditions and measuring equipment',
    note: `set-up ${setup.number}`,
    blocks: [
      facts(
        ['mark, angle zero', setup.mark],
        ['tacho', tachoOf(job, equipment)],
        ['rotation, seen from the drive end', setup.rotationFromDriveEnd],
        ['typed as', `phase ${job.phaseSense}, degrees ${job.angleSense} rotation`],
        ['1x read in', job.unit],
        ['speed of the runs', speedsOf(job)],
        ['rotor cleaned before', job.cleaned ? CLEANED[job.cleaned] : null],
        ['readings', readingsFrom(job)],
        ['instrument', 'not recorded with the job'],
        ['support', equipment.supportNote],
      ),
      strong(
        'Angles are kept against rotation and phase as lag, whatever was typed; the senses above say how it was typed.',
      ),
      sensors(job, equipment),
    ],
  };
}

const CLEANED = { yes: 'yes', no: 'no', 'cannot be': 'it cannot be' } as const;

function tachoOf({ setup }: BalanceJobDto, { pulsesPerTurn }: EquipmentDto): string {
  const pulses = pulsesPerTurn === 1 ? 'one pulse a turn' : `${pulsesPerTurn} pulses a turn`;
  return `${formatDegrees(setup.tachoDeg)} from top in the direction of rotation, ${setup.tachoEdge} edge, ${pulses}`;
}

function speedsOf({ runs, site }: BalanceJobDto): string {
  const speeds = runs.filter(({ state }) => state === 'kept').map(({ speedRpm }) => speedRpm);
  if (speeds.length === 0) return 'no run yet';
  const [least, most] = [Math.min(...speeds), Math.max(...speeds)];
  const from = formatSpeed(least, site.decimalMark);
  return least === most ? from : `${from} to ${formatSpeed(most, site.decimalMark)}`;
}

function readingsFrom({ runs }: BalanceJobDto): string {
  const vectors = runs.flatMap((run) => run.vectors);
  const uploaded = vectors.filter(({ recordId }) => recordId !== null).length;
  return `${vectors.length - uploaded} typed, ${uploaded} from uploaded waveforms`;
}

function sensors({ points }: BalanceJobDto, equipment: EquipmentDto) {
  return table(
    'Points read',
    [words('point'), words('bearing'), words('direction'), words('sensor')],
    points.map(({ label, bearing, direction }) => [
      label,
      bearing,
      direction,
      sensorAt(equipment, label),
    ]),
  );
}

function sensorAt({ sensors: all }: EquipmentDto, label: string): string {
  const sensor = all.find(({ pointLabel }) => pointLabel === label);
  if (!sensor) return 'place not recorded';
  return sensor.turnedOver ? `${sensor.place}, turned over` : sensor.place;
}
