import 'server-only';
import {
  balanceLives,
  medianBalanceLife,
  type BalancedJob,
  type BalanceLife,
} from '@/lib/domain/balance-job/balance-life';
import {
  formatDate,
  formatNumber,
  formatPlural,
  formatQuantity,
  formatSpeed,
  NOT_KNOWN,
  NOT_MEASURED,
} from '@/lib/format';
import { routes } from '@/lib/routes';
import type { ReportCell, ReportSection } from '@/lib/schemas/report';
import { facts, figures, quiet, table, words } from './blocks';
import type { HistoryGround } from './history-ground';

type Job = HistoryGround['jobs'][number];

/** The machine, how often it was balanced, and how long a balance lasts. */
export function inShortSection(ground: HistoryGround): ReportSection {
  const { machine, site, stays, jobs } = ground;
  const lives = livesOf(ground);
  const median = medianBalanceLife(lives);
  const running = lives.findLast((life) => life.running);
  const rotor = stays.find(({ toAt }) => !toAt)?.rotor.$;
  return {
    title: 'In short',
    blocks: [
      facts(
        ['site', site.name],
        ['machine', `${machine.tag} ${machine.name}`],
        ['kind', machine.kind],
        ['speed', formatSpeed(machine.nominalSpeedRpm, site.decimalMark)],
        ['rotor now', rotor ? `${rotor.name}, ${rotor.serial}` : NOT_KNOWN],
        [
          'jobs',
          `${jobs.filter(({ state }) => state === 'signed').length} signed of ${jobs.length}`,
        ],
        ['median balance life', median === null ? 'no balance has ended yet' : days(median)],
        ['since the last balance', running ? `at least ${days(running.days)}` : 'none runs'],
      ),
      quiet(
        'Balance life: days from the closing of a signed job to the opening of the next on the same rotor. Jobs that were given up end nothing; the running one is “at least” and not in the median.',
      ),
    ],
  };
}

function livesOf({ jobs, stays, asked }: HistoryGround): BalanceLife[] {
  const left = stays.flatMap(({ rotor, toAt }) =>
    toAt ? [[rotor.id, toAt.getTime()] as const] : [],
  );
  const still = new Set(stays.filter(({ toAt }) => !toAt).map(({ rotor }) => rotor.id));
  const leftAt = new Map(left.filter(([rotorId]) => !still.has(rotorId)));
  return balanceLives(jobs.map(balancedJob), asked.at.getTime(), leftAt);
}

function balancedJob(job: Job): BalancedJob {
  const closed = job.closedAt ?? null;
  return {
    id: job.id,
    rotorId: job.rotor.id,
    openedAt: job.openedAt.getTime(),
    closedAt: closed?.getTime() ?? null,
    state: job.state === 'signed' ? 'signed' : closed === null ? 'open' : 'given up',
  };
}

function days(value: number): string {
  return formatQuantity(Math.floor(value), 'd', { decimals: 0 });
}

/** Every job, oldest first: why, what it did, what it cost, how long it lasted. */
export function jobsSection(ground: HistoryGround): ReportSection {
  const lives = new Map(livesOf(ground).map((life) => [life.jobId, life]));
  return {
    title: 'Balance jobs',
    note: formatPlural(ground.jobs.length, 'job'),
    blocks: [
      table(
        'Jobs, oldest first',
        [
          words('job'),
          words('opened'),
          words('reason'),
          words('kind'),
          words('state'),
          words('1x before → after'),
          figures('runs used'),
          words('days until the next one'),
        ],
        ground.jobs.map((job) => jobCells(ground, job, lives.get(job.id) ?? null)),
        'This machine was never balanced here.',
      ),
    ],
  };
}

function jobCells(ground: HistoryGround, job: Job, life: BalanceLife | null): ReportCell[] {
  const runs = ground.runs.filter((run) => run.job.id === job.id);
  const kept = runs.filter(({ state }) => state === 'kept').length;
  return [
    { text: String(job.number), href: routes.jobRecord(job.id) },
    `${formatDate(job.openedAt, ground.site.timeZone)}, ${job.openedBy.$.name}`,
    job.reason,
    job.kind,
    job.state,
    beforeAfter(ground, job),
    kept === runs.length ? String(kept) : `${kept} of ${runs.length}`,
    lifeWords(job, life),
  ];
}

function lifeWords(job: Job, life: BalanceLife | null): string {
  if (life) return life.running ? `at least ${days(life.days)}` : days(life.days);
  return job.closedAt ? 'no balance' : 'open';
}

/** At each point the first kept base run and the last kept check run. */
function beforeAfter(ground: HistoryGround, job: Job): string {
  const runs = ground.runs.filter((run) => run.job.id === job.id && run.state === 'kept');
  const base = runs.find(({ purpose }) => purpose === 'base');
  const check = runs.findLast(({ purpose }) => purpose === 'check');
  if (!base) return NOT_MEASURED;
  const at = (runId: number | undefined) => ground.vectors.filter(({ run }) => run.id === runId);
  const after = at(check?.id);
  const number = (value: number) => formatNumber(value, { decimalMark: ground.site.decimalMark });
  const points = at(base.id).map(({ point, amplitude }) => {
    const now = after.find((vector) => vector.point.id === point.id);
    return `${point.$.label} ${number(amplitude)} → ${now ? number(now.amplitude) : NOT_MEASURED}`;
  });
  return `${points.join('; ')} ${job.unit}`;
}
