import 'server-only';
import { zoneOf } from '@/lib/domain/severity/zone';
import {
  formatDateTime,
  formatLag,
  formatMass,
  formatNumber,
  formatQuantity,
  formatRotorAngle,
  formatZone,
  NOT_MEASURED,
} from '@/lib/format';
import type { BalanceJobDto, RunDto, RunVectorDto } from '@/lib/schemas/balance-job';
import type {
  ReportBlock,
  ReportRow,
  ReportSection,
  ReportStep,
  ReportWalk,
} from '@/lib/schemas/report';
import { figures, quiet, table, words } from './blocks';

/** Before and after at every point, and the check run against its prediction. */
export function beforeAfterSection(job: BalanceJobDto): ReportSection {
  const base = job.runs.find(({ purpose, state }) => purpose === 'base' && state === 'kept');
  const last = job.runs.find(({ id }) => id === job.check?.runId);
  const blocks = [
    ...(base ? [beforeAfter(job, base, last ?? null)] : [quiet('No base run yet.')]),
    ...(job.check ? [againstPrediction(job)] : []),
    limitsNote(job),
  ];
  return { title: 'Before and after', blocks };
}

function beforeAfter(job: BalanceJobDto, base: RunDto, last: RunDto | null): ReportBlock {
  return table(
    `Base run ${base.number}${last ? ` and check run ${last.number}` : ', no check run yet'}`,
    [
      words('point'),
      figures('before: overall, mm/s rms'),
      words('zone'),
      figures(`before: 1x, ${job.unit}`),
      figures('lag'),
      figures('after: overall, mm/s rms'),
      words('zone'),
      figures(`after: 1x, ${job.unit}`),
      figures('lag'),
      figures('1x reduced by'),
    ],
    job.points.map(({ id, label }) => {
      const before = at(base, id);
      const after = last ? at(last, id) : undefined;
      return [label, ...side(job, before), ...side(job, after), reduction(job, before, after)];
    }),
  );
}

function at(run: RunDto, pointId: number): RunVectorDto | undefined {
  return run.vectors.find((vector) => vector.pointId === pointId);
}

function side(job: BalanceJobDto, vector: RunVectorDto | undefined): string[] {
  if (!vector) return [NOT_MEASURED, '', NOT_MEASURED, ''];
  const { overall } = vector;
  return [
    overall === null ? NOT_MEASURED : number(job, overall),
    zoneWords(job, overall),
    number(job, vector.amplitude),
    formatLag(vector.lagDeg),
  ];
}

function zoneWords({ limits }: BalanceJobDto, overall: number | null): string {
  if (!limits || overall === null || (limits.unit ?? 'mm/s rms') !== 'mm/s rms')
    return formatZone(null);
  return formatZone(zoneOf(overall, { ab: limits.bAb, bc: limits.bBc, cd: limits.bCd }));
}

function reduction(job: BalanceJobDto, before?: RunVectorDto, after?: RunVectorDto): string {
  if (!before || !after || before.amplitude === 0) return 'not known';
  const share = 100 * (1 - after.amplitude / before.amplitude);
  const options = { decimals: 1, decimalMark: job.site.decimalMark };
  return share < 0
    ? `worse by ${formatQuantity(-share, '%', options)}`
    : formatQuantity(share, '%', options);
}

function againstPrediction(job: BalanceJobDto): ReportBlock {
  return table(
    'Check run against its prediction',
    [
      words('point'),
      figures(`read, ${job.unit}`),
      figures(`predicted, ${job.unit}`),
      figures(`miss, ${job.unit}`),
      figures(`band, ${job.unit}`),
      words('verdict'),
    ],
    (job.check?.points ?? []).map((point) => [
      point.label,
      `${number(job, point.now)} at ${formatLag(point.lagDeg)}`,
      point.predicted
        ? `${number(job, point.predicted.amplitude)} at ${formatLag(point.predicted.lagDeg)}`
        : 'none',
      point.miss === null ? 'none' : number(job, point.miss),
      point.band === null ? 'not known' : number(job, point.band),
      verdictOf(point),
    ]),
  );
}

function verdictOf({ miss, band }: { miss: number | null; band: number | null }): string {
  if (miss === null) return 'no prediction';
  if (band === null) return 'band not known';
  return miss <= band ? 'as predicted' : 'not as predicted';
}

function limitsNote({ limits, site }: BalanceJobDto): ReportBlock {
  if (!limits) return quiet('No limits were in use for this machine: no zone is given.');
  const unit = limits.unit ?? 'mm/s rms';
  const [ab, bc, cd] = [limits.bAb, limits.bBc, limits.bCd].map((bound) =>
    formatNumber(bound, { decimalMark: site.decimalMark }),
  );
  return quiet(
    `Zones of the overall value by ${limits.title}, ${limits.edition}: A/B ${ab}, B/C ${bc}, C/D ${cd} ${unit}. A value on a boundary belongs to the better zone.`,
  );
}

/** The 1x vector at each point from the first base run to the last run. */
export function vectorsSection(job: BalanceJobDto): ReportSection {
  const counts = job.setup.rotationFromDriveEnd === 'clockwise' ? 'ccw' : 'cw';
  const walks = job.points
    .map(({ id, label, bearing, direction }): ReportWalk => ({
      title: `1x at ${label}, bearing ${bearing} ${direction}`,
      unit: job.unit,
      counts,
      decimalMark: job.site.decimalMark,
      steps: stepsAt(job, id),
    }))
    .filter(({ steps }) => steps.length > 0);
  return {
    title: 'Vector plots',
    note: 'the 1x vector from the first base run to the last run',
    blocks: walks.length > 0 ? [{ kind: 'walks', walks }] : [quiet('No run yet.')],
  };
}

function stepsAt(job: BalanceJobDto, pointId: number): ReportStep[] {
  return job.runs
    .filter(({ state }) => state === 'kept')
    .flatMap((run) => {
      const vector = at(run, pointId);
      if (!vector) return [];
      return {
        id: run.id,
        label: `${run.purpose} ${run.number}`,
        purpose: run.purpose,
        amplitude: vector.amplitude,
        lagDeg: vector.lagDeg,
      };
    });
}

/** Every run with its readings and what hung on the rotor; lined-through ones stay, struck. */
export function runsSection(job: BalanceJobDto): ReportSection {
  const runs = table(
    `Runs, 1x in ${job.unit}`,
    [
      words('run'),
      words('time'),
      figures('r/min'),
      ...job.points.map(({ label }) => figures(label)),
      words('on the rotor since the job began'),
      words('by'),
    ],
    job.runs.map((run) => runRow(job, run)),
    'No run yet.',
  );
  return { title: 'Runs', blocks: [runs] };
}

function runRow(job: BalanceJobDto, run: RunDto): ReportRow {
  const readings = job.points.map(({ id }) => {
    const vector = at(run, id);
    return vector ? `${number(job, vector.amplitude)} at ${formatLag(vector.lagDeg)}` : '';
  });
  const why = run.stateReason ? `. ${run.state}: ${run.stateReason}` : '';
  const corrects = run.corrects ? `, corrects run ${run.corrects}` : '';
  return {
    cells: [
      `${run.number} ${run.purpose}${corrects}${run.state === 'kept' ? '' : `, ${run.state}`}`,
      formatDateTime(run.takenAt, job.site.timeZone),
      number(job, run.speedRpm),
      ...readings,
      hungIn(job, run) + why,
      run.person,
    ],
    struck: run.state === 'lined through',
  };
}

function hungIn(job: BalanceJobDto, run: RunDto): string {
  const on = job.weights.filter(({ id }) => run.weightIds.includes(id));
  if (on.length === 0) return 'nothing';
  return on
    .map(
      (w) =>
        `${w.planeName}: ${formatMass(w.massG, job.site.decimalMark)} at ${formatRotorAngle(w.angleDeg)}`,
    )
    .join('; ');
}

function number({ site }: BalanceJobDto, value: number): string {
  return formatNumber(value, { decimalMark: site.decimalMark });
}
