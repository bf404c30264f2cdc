import 'server-only';
import {
  formatDateTime,
  formatMass,
  formatNumber,
  formatPlural,
  formatQuantity,
  formatRotorAngle,
} from '@/lib/format';
import { routes } from '@/lib/routes';
import type { ReportCell, ReportSection } from '@/lib/schemas/report';
import { figures, table, words } from './blocks';
import type { HistoryGround } from './history-ground';

type Weight = HistoryGround['weights'][number];
type Line = { at: Date; cells: ReportCell[] };

/** What hung on and came off, in the order it happened, on every rotor that ran here. */
export function ledgerSection(ground: HistoryGround): ReportSection {
  const { weights, stays } = ground;
  const lines = weights
    .flatMap((weight) => linesOf(ground, weight))
    .sort((a, b) => a.at.getTime() - b.at.getTime());
  const several = new Set(stays.map(({ rotor }) => rotor.id)).size > 1;
  return {
    title: 'Weights ledger over time',
    note: several ? 'every rotor that ran here' : formatPlural(weights.length, 'weight'),
    blocks: [
      table(
        'Fitted and ended, oldest first',
        [
          words('time'),
          words('what'),
          words('rotor, plane'),
          figures('mass'),
          words('place'),
          figures('radius'),
          words('by'),
          words('job'),
        ],
        lines.map(({ cells }) => cells),
        'No weight is on the ledger.',
      ),
    ],
  };
}

function linesOf(ground: HistoryGround, weight: Weight): Line[] {
  const fitted = lineOf(ground, weight, {
    at: weight.fittedAt,
    what: `${weight.purpose} fitted, ${weight.fixing}`,
    by: weight.fittedBy.$.name,
  });
  if (!weight.endedAt) return [fitted];
  const why = weight.endReason ? `: ${weight.endReason}` : '';
  const what = `${weight.purpose} ${weight.ending ?? 'ended'}${why}`;
  const by = weight.endedBy?.$.name ?? 'not known';
  return [fitted, lineOf(ground, weight, { at: weight.endedAt, what, by })];
}

function lineOf(
  { site }: HistoryGround,
  weight: Weight,
  happened: { at: Date; what: string; by: string },
): Line {
  const job = weight.job?.$;
  const position = weight.position ? `, position ${weight.position.$.label}` : '';
  return {
    at: happened.at,
    cells: [
      formatDateTime(happened.at, site.timeZone),
      happened.what,
      `${weight.rotor.$.name}, ${weight.plane.$.name}`,
      formatMass(weight.massG, site.decimalMark),
      `${formatRotorAngle(weight.angleDeg)}${position}`,
      formatQuantity(weight.radiusMm, 'mm', { decimalMark: site.decimalMark }),
      happened.by,
      job ? { text: String(job.number), href: routes.jobRecord(job.id) } : 'before the jobs',
    ],
  };
}

/** Vector sum in each plane of the rotor that runs now. */
export function onNowSection({ planes, site }: HistoryGround): ReportSection {
  const mark = { decimalMark: site.decimalMark };
  return {
    title: 'On the rotor now',
    blocks: [
      table(
        'Vector sum in each plane',
        [
          words('plane'),
          figures('weights'),
          figures('sum, g·mm'),
          words('at'),
          figures('acts like'),
        ],
        planes.map(({ name, weights, sum }) =>
          sum === null
            ? [name, '0', '0', 'no angle', 'nothing']
            : [
                name,
                String(weights.length),
                formatNumber(sum.unbalanceGmm, mark),
                formatRotorAngle(sum.angleDeg),
                formatMass(sum.equivalentMassG, site.decimalMark),
              ],
        ),
        'No correction plane is recorded.',
      ),
    ],
  };
}
