import 'server-only';
import {
  formatDateTime,
  formatMass,
  formatNumber,
  formatQuantity,
  formatDegrees,
  formatRotorAngle,
  NOT_KNOWN,
} from '@/lib/format';
import type { BalanceJobDto, PlaneAnswer } from '@/lib/schemas/balance-job';
import type { ReportBlock, ReportSection } from '@/lib/schemas/report';
import { figures, plain, quiet, table, words } from './blocks';

type Accepted = BalanceJobDto['accepted'][number];

/** The answers somebody accepted, with what they were expected to do. */
export function answersSection(job: BalanceJobDto): ReportSection {
  if (job.accepted.length === 0)
    return { title: 'Answers', blocks: [quiet('No answer was accepted in this job.')] };
  return {
    title: 'Answers',
    note: 'what to add to the rotor as it was then',
    blocks: job.accepted.flatMap((answer) => [
      weightsAsked(job, answer),
      plain(
        `Accepted by ${answer.acceptedBy}, ${formatDateTime(answer.acceptedAt, job.site.timeZone)}. Method: ${answer.method}. Condition number ${number(job, answer.condition.number)}, ${answer.condition.verdict}.`,
      ),
      ...answer.warnings.map((warning) => plain(`Mind: ${warning}`)),
    ]),
  };
}

function weightsAsked(job: BalanceJobDto, answer: Accepted): ReportBlock {
  return table(
    `Answer ${answer.number}, ${answer.kind}`,
    [
      words('plane'),
      figures('add'),
      words('at'),
      figures('radius'),
      figures('unbalance, g·mm'),
      figures('force'),
      figures('uncertainty'),
    ],
    answer.planes.map((plane) => [
      plane.planeName,
      formatMass(plane.massG, job.site.decimalMark),
      formatRotorAngle(plane.angleDeg),
      formatQuantity(plane.radiusMm, 'mm', { decimalMark: job.site.decimalMark }),
      number(job, plane.unbalanceGmm),
      formatQuantity(plane.forceN, 'N', { decimalMark: job.site.decimalMark }),
      uncertaintyOf(job, plane),
    ]),
  );
}

function uncertaintyOf({ site }: BalanceJobDto, plane: PlaneAnswer): string {
  const { uncertaintyG, uncertaintyDeg } = plane;
  if (uncertaintyG === null || uncertaintyDeg === null) return NOT_KNOWN;
  return `±${formatMass(uncertaintyG, site.decimalMark)}, ±${formatDegrees(uncertaintyDeg)}`;
}

/** The influence coefficients the last answer stood on. */
export function coefficientsSection(job: BalanceJobDto): ReportSection {
  const answer = job.accepted.at(-1);
  return {
    title: 'Influence coefficients',
    note: answer ? `used for answer ${answer.number}` : undefined,
    blocks: [
      table(
        `How 1 kg·mm at the mark changes the 1x reading`,
        [words('plane'), words('point'), figures(`size, ${job.unit} per kg·mm`), figures('lag')],
        (answer?.coefficients ?? []).map(({ planeId, pointId, sizePerKgMm, deg }) => [
          job.planes.find(({ id }) => id === planeId)?.name ?? '',
          job.points.find(({ id }) => id === pointId)?.label ?? '',
          number(job, sizePerKgMm),
          `${formatDegrees(deg)} lag`,
        ]),
        'None: no answer was accepted.',
      ),
      ...reused(job),
      ...(answer
        ? [
            quiet(
              `V = V₀ + H·U with U = mass·radius at its angle. Misfit of the fit ${number(job, answer.misfit)} ${job.unit} (rms).`,
            ),
          ]
        : []),
    ],
  };
}

/** Whose judgement it was to take coefficients of the book instead of trial runs. */
function reused({ reuse, site }: BalanceJobDto): ReportBlock[] {
  if (!reuse) return [];
  const reason = reuse.reason ? ` Reason: ${reuse.reason}` : '';
  return [
    plain(
      `Taken from the coefficient book (${reuse.grade}) by ${reuse.person}, ${formatDateTime(reuse.at, site.timeZone)}. Confirmed: ${reuse.confirmed.join('; ')}.${reason}`,
    ),
  ];
}

/** Residual unbalance against ISO 21940-11, as an estimate in place. */
export function toleranceSection(job: BalanceJobDto): ReportSection {
  const { tolerance } = job;
  if (!tolerance)
    return {
      title: 'Tolerance, estimated in place',
      blocks: [
        quiet(
          'No estimate: it needs a trial run, the rotor’s mass, its grade and the places of bearings and planes.',
        ),
      ],
    };
  return {
    title: 'Tolerance, estimated in place',
    note: `G ${tolerance.grade}, permissible ${number(job, tolerance.permissibleGmm)} g·mm (ISO 21940-11)`,
    blocks: [
      table(
        'Residual unbalance',
        [
          words('tolerance plane'),
          figures('residual, g·mm'),
          words('at'),
          figures('uncertainty, g·mm'),
          figures('permissible, g·mm'),
          words('verdict'),
        ],
        tolerance.planes.map((plane) => [
          plane.name,
          number(job, plane.residualGmm),
          formatRotorAngle(plane.residualDeg),
          plane.uncertaintyGmm === null ? NOT_KNOWN : number(job, plane.uncertaintyGmm),
          number(job, plane.permissibleGmm),
          plane.verdict,
        ]),
      ),
      quiet(
        'From the coefficients of this job, not from a balancing machine; vibration limits are a separate verdict.',
      ),
    ],
  };
}

function number({ site }: BalanceJobDto, value: number): string {
  return formatNumber(value, { decimalMark: site.decimalMark });
}
