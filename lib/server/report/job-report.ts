import 'server-only';
import { formatDateTime } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { CautionLine, EquipmentDto, SignedState } from '@/lib/schemas/job-record';
import type { Report } from '@/lib/schemas/report';
import { CONVENTION } from './blocks';
import { answersSection, coefficientsSection, toleranceSection } from './job-answers';
import { machineSection, setupSection } from './job-head';
import { beforeAfterSection, runsSection, vectorsSection } from './job-runs';
import { addendaSection, cautionsSection, signOffSection } from './job-signing';
import { onRotorSection, photosSection, weightsSection } from './job-weights';

export type JobReportGround = {
  job: BalanceJobDto;
  equipment: EquipmentDto;
  cautions: readonly CautionLine[];
  signed: SignedState | null;
  /** Who asks for the report, and when. */
  asked: { by: string; at: Date };
};

/** The job record as a report: one model for screen, print and PDF. */
export function jobReport({ job, equipment, cautions, signed, asked }: JobReportGround): Report {
  return {
    title: `Job record ${job.number}: ${job.machine.tag} ${job.machine.name}`,
    about: `${job.machine.tag} · job ${job.number}`,
    revision: revisionOf(job, signed),
    isDraft: signed === null,
    contentHash: signed?.contentHash ?? null,
    convention: CONVENTION,
    made: `made ${formatDateTime(asked.at, job.site.timeZone)} for ${asked.by}`,
    decimalMark: job.site.decimalMark,
    sections: [
      machineSection(job),
      setupSection(job, equipment),
      beforeAfterSection(job),
      vectorsSection(job),
      runsSection(job),
      weightsSection(job),
      onRotorSection(job, signed !== null),
      photosSection(job),
      answersSection(job),
      coefficientsSection(job),
      toleranceSection(job),
      cautionsSection(job, cautions),
      signOffSection(job, signed),
      ...(signed ? [addendaSection(job, signed.addenda)] : []),
    ],
  };
}

/** 1 as first signed; one more for each further signature and each addendum. */
function revisionOf(job: BalanceJobDto, signed: SignedState | null): string {
  if (!signed) return 'not signed – draft';
  return `revision ${job.signOffs.length + signed.addenda.length}`;
}
