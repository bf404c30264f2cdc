import 'server-only';
import { ledgerSum } from '@/lib/domain/balancing/weights-ledger';
import {
  formatDateTime,
  formatMass,
  formatNumber,
  formatQuantity,
  formatRotorAngle,
} from '@/lib/format';
import type { BalanceJobDto, LedgerWeightDto, PlaneDto } from '@/lib/schemas/balance-job';
import type { ReportBlock, ReportCell, ReportFace, ReportSection } from '@/lib/schemas/report';
import { figures, plain, quiet, strong, table, words } from './blocks';

/** What was hung on in this job and what hung there before it. */
export function weightsSection(job: BalanceJobDto): ReportSection {
  return {
    title: 'Weights fitted and taken off',
    blocks: [
      table(
        'Weights ledger',
        [
          words('plane'),
          figures('mass'),
          words('place'),
          figures('radius'),
          words('what'),
          words('fitted'),
          words('now'),
        ],
        allWeights(job).map((weight) => weightCells(job, weight)),
        'No weight is on this rotor’s ledger.',
      ),
    ],
  };
}

function allWeights(job: BalanceJobDto): LedgerWeightDto[] {
  return [...job.olderWeights, ...job.weights];
}

function weightCells(job: BalanceJobDto, weight: LedgerWeightDto): ReportCell[] {
  const { timeZone, decimalMark } = job.site;
  const label = weight.positionLabel ? `, position ${weight.positionLabel}` : '';
  const typed = weight.enteredSense === 'with' ? ', typed with rotation' : '';
  const weighed = weight.massSource === 'scale' ? 'weighed' : 'nominal';
  return [
    weight.planeName,
    formatMass(weight.massG, decimalMark),
    `${formatRotorAngle(weight.angleDeg)}${label}${typed}`,
    formatQuantity(weight.radiusMm, 'mm', { decimalMark }),
    `${weight.purpose}, ${weighed}, ${fixingOf(weight)}`,
    `${formatDateTime(weight.fittedAt, timeZone)}, ${weight.fittedBy}`,
    nowOf(job, weight),
  ];
}

function fixingOf({ fixing, fixedBy }: LedgerWeightDto): string {
  if (!fixedBy || fixedBy.kind === 'temporary') return fixing;
  const held = fixedBy.secured === null ? '' : fixedBy.secured ? ', secured' : ', not secured';
  return `${fixedBy.kind}, ${fixing}${held}`;
}

function nowOf({ site }: BalanceJobDto, weight: LedgerWeightDto): string {
  if (!weight.endedAt)
    return weight.permanent ? 'on the rotor, permanent' : 'on the rotor, temporary';
  const who = weight.endedBy ? `, ${weight.endedBy}` : '';
  const why = weight.endReason ? `: ${weight.endReason}` : '';
  return `${weight.ending ?? 'ended'} ${formatDateTime(weight.endedAt, site.timeZone)}${who}${why}`;
}

/** What is on the rotor, its vector sum in each plane, and what became of the trial weights. */
export function onRotorSection(job: BalanceJobDto, signed: boolean): ReportSection {
  const mark = { decimalMark: job.site.decimalMark };
  return {
    title: 'On the rotor now',
    note: signed ? 'as signed' : 'as it stands',
    blocks: [
      table(
        'Vector sum in each plane',
        [
          words('plane'),
          words('weights'),
          figures('sum, g·mm'),
          words('at'),
          figures('acts like'),
          figures('at radius'),
        ],
        job.planes.map((plane) => {
          const on = weightsOn(job, plane);
          if (on.length === 0) return [plane.name, 'none', '0', 'no angle', 'nothing', ''];
          const sum = ledgerSum(on, plane.radiusMm);
          return [
            plane.name,
            on.map(({ massG }) => formatMass(massG, mark.decimalMark)).join(' + '),
            formatNumber(sum.unbalanceGmm, mark),
            formatRotorAngle(sum.angleDeg),
            formatMass(sum.equivalentMassG, mark.decimalMark),
            formatQuantity(plane.radiusMm, 'mm', mark),
          ];
        }),
      ),
      ...trialWords(job),
      { kind: 'faces', faces: job.planes.map((plane) => faceOf(job, plane)) },
    ],
  };
}

function weightsOn(job: BalanceJobDto, plane: PlaneDto): LedgerWeightDto[] {
  return allWeights(job).filter(({ planeId, endedAt }) => planeId === plane.id && endedAt === null);
}

function trialWords(job: BalanceJobDto): ReportBlock[] {
  const trials = job.weights.filter(({ purpose }) => purpose === 'trial');
  if (trials.length === 0) return [plain('No trial weight was used in this job.')];
  return trials.map((weight) => {
    const what = `Trial weight ${formatMass(weight.massG, job.site.decimalMark)} in plane ${weight.planeName} at ${formatRotorAngle(weight.angleDeg)}`;
    if (weight.endedAt) return plain(`${what}: ${weight.ending ?? 'ended'}.`);
    return weight.stays === true
      ? strong(`${what} stays on the rotor, knowingly.`)
      : strong(`${what} is on the rotor; nobody has said yet whether it stays.`);
  });
}

function faceOf(job: BalanceJobDto, plane: PlaneDto): ReportFace {
  return {
    plane: {
      name: `Plane ${plane.name}`,
      radiusMm: plane.radiusMm,
      rotationFromDriveEnd: job.setup.rotationFromDriveEnd === 'clockwise' ? 'cw' : 'ccw',
      ...(plane.positions.length > 0 ? { positions: plane.positions } : {}),
      markLabel: job.setup.mark,
      decimalMark: job.site.decimalMark,
    },
    weights: weightsOn(job, plane).map((weight) => ({
      id: weight.id,
      massG: weight.massG,
      angleDeg: weight.angleDeg,
      label: weight.positionLabel ?? weight.purpose,
      state: weight.purpose === 'trial' && weight.stays !== true ? 'trial' : 'on',
    })),
  };
}

/** The photos of the job's weights, or why there is none. */
export function photosSection(job: BalanceJobDto): ReportSection {
  const photos = job.weights.flatMap((weight) =>
    (weight.photos ?? []).map(({ id, widthPx, heightPx, person, at, sha256 }) => ({
      id,
      widthPx,
      heightPx,
      sha256,
      caption: `${placeWords(job, weight)}. ${person}, ${formatDateTime(at, job.site.timeZone)}`,
    })),
  );
  const missing = job.weights.flatMap((weight) => {
    const why = weight.fixedBy?.noPhotoReason;
    return why ? [plain(`No photo of ${placeWords(job, weight)}: ${why}`)] : [];
  });
  const none = photos.length + missing.length === 0 ? [quiet('None was kept.')] : [];
  return {
    title: 'Photos of the weights',
    blocks: [
      ...(photos.length > 0 ? [{ kind: 'photos' as const, photos }] : []),
      ...missing,
      ...none,
    ],
  };
}

function placeWords({ site }: BalanceJobDto, weight: LedgerWeightDto): string {
  const position = weight.positionLabel === null ? '' : `, position ${weight.positionLabel}`;
  return `${formatMass(weight.massG, site.decimalMark)} in plane ${weight.planeName} at ${formatRotorAngle(weight.angleDeg)}${position}`;
}
