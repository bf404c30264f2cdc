import 'server-only';
import { summariseCoefficient, type BookEntry } from '@/lib/domain/balancing/coefficient-book';
import { angleDeg, size } from '@/lib/domain/complex';
import { formatDegrees, formatNumber, formatQuantity } from '@/lib/format';
import { routes } from '@/lib/routes';
import type { ReportCell, ReportSection } from '@/lib/schemas/report';
import { figures, quiet, table, words } from './blocks';
import type { HistoryGround } from './history-ground';

type Estimate = HistoryGround['coefficients'][number];
type Group = { estimates: Estimate[]; entry: BookEntry };

const BEST_FIRST = ['fit over all runs', 'trial', 'fitted weight'] as const;

/** How the rotor answered a weight, job by job, with spread and grade. */
export function coefficientBookSection(ground: HistoryGround): ReportSection {
  const groups = groupsOf(ground.coefficients);
  return {
    title: 'Coefficient book over the jobs',
    note: 'one estimate a job: the fit over all its runs, or else its trial',
    blocks: [
      table(
        'By plane and point',
        [
          words('plane'),
          words('point'),
          figures('set-up'),
          figures('jobs'),
          words('mean size per kg·mm'),
          figures('mean lag'),
          figures('spread'),
          words('grade'),
        ],
        groups.map((group) => summaryCells(ground, group)),
        'No coefficient was learned yet.',
      ),
      table(
        'Estimates',
        [
          words('plane, point'),
          words('job'),
          words('from'),
          figures('r/min'),
          words('size per kg·mm'),
          figures('lag'),
          words('against the mean'),
        ],
        groups.flatMap((group) => estimateRows(ground, group)),
        'None.',
      ),
      quiet(
        'Spread: rms distance of the estimates from their mean, n − 1, as a share of the mean. Up to 10 % good, up to 20 % with care, above that not for reuse; a single estimate is with care.',
      ),
    ],
  };
}

/** Estimates of one plane, point, set-up and unit, one for each job. */
function groupsOf(all: readonly Estimate[]): Group[] {
  const groups = new Map<string, Map<number, Estimate>>();
  for (const estimate of all) {
    const { plane, point, setup, unit, job } = estimate;
    const key = [plane.$.order, point.$.order, point.id, setup.$.number, unit].join(' ');
    const byJob = groups.get(key) ?? new Map<number, Estimate>();
    groups.set(key, byJob.set(job.id, better(byJob.get(job.id), estimate)));
  }
  return [...groups.entries()]
    .sort(([a], [b]) => a.localeCompare(b, 'en', { numeric: true }))
    .flatMap(([, byJob]) => {
      const estimates = [...byJob.values()];
      const entry = summariseCoefficient(
        estimates.map(({ rePerGmm, imPerGmm }) => ({ re: rePerGmm, im: imPerGmm })),
      );
      return entry ? [{ estimates, entry }] : [];
    });
}

function better(known: Estimate | undefined, estimate: Estimate): Estimate {
  if (!known) return estimate;
  return BEST_FIRST.indexOf(estimate.source) <= BEST_FIRST.indexOf(known.source) ? estimate : known;
}

function summaryCells(ground: HistoryGround, { estimates, entry }: Group): ReportCell[] {
  const [first] = estimates;
  const mean = { re: entry.rePerGmm, im: entry.imPerGmm };
  return [
    first?.plane.$.name ?? '',
    first?.point.$.label ?? '',
    String(first?.setup.$.number ?? ''),
    String(entry.count),
    formatQuantity(1000 * size(mean), first?.unit ?? '', markOf(ground)),
    formatDegrees(angleDeg(mean)),
    entry.spreadPct === null
      ? 'one job only'
      : formatQuantity(entry.spreadPct, '%', { decimals: 1, ...markOf(ground) }),
    entry.grade,
  ];
}

function estimateRows(ground: HistoryGround, { estimates, entry }: Group): ReportCell[][] {
  return estimates.map((estimate, i) => {
    const { plane, point, job, source, speedRpm, unit, rePerGmm, imPerGmm } = estimate;
    const vector = { re: rePerGmm, im: imPerGmm };
    return [
      `${plane.$.name}, ${point.$.label}`,
      { text: String(job.$.number), href: routes.jobRecord(job.id) },
      source,
      formatNumber(speedRpm, markOf(ground)),
      formatQuantity(1000 * size(vector), unit, markOf(ground)),
      formatDegrees(angleDeg(vector)),
      againstMean(ground, entry.count > 1 ? entry.estimates[i] : undefined),
    ];
  });
}

function againstMean(ground: HistoryGround, against: BookEntry['estimates'][number] | undefined) {
  if (!against) return 'is the mean';
  const ratio = formatNumber(against.ratio, markOf(ground));
  const turn = formatNumber(against.turnDeg, { decimals: 1, ...markOf(ground) });
  return `× ${ratio}, turned by ${turn}°`;
}

function markOf({ site }: HistoryGround) {
  return { decimalMark: site.decimalMark };
}
