import 'server-only';
import { CAUTIONS } from '@/lib/domain/cautions';
import { formatDateTime, formatMass } from '@/lib/format';
import type { BalanceJobDto } from '@/lib/schemas/balance-job';
import type { AddendumDto, CautionLine, SignedState } from '@/lib/schemas/job-record';
import type { ReportSection } from '@/lib/schemas/report';
import { plain, quiet, strong, table, words } from './blocks';

/** Which cautions were ticked, at which step, by whom, and their words. */
export function cautionsSection(
  job: BalanceJobDto,
  cautions: readonly CautionLine[],
): ReportSection {
  const shown = [...new Set(cautions.map(({ cautionId }) => cautionId))].sort();
  return {
    title: 'Cautions confirmed',
    blocks: [
      table(
        'Cautions by step',
        [
          words('step'),
          words('cautions'),
          words('named at the machine'),
          words('ticked by'),
          words('time'),
        ],
        byStep(cautions).map((line) => [
          stepWords(job, line.step),
          line.cautionIds.join(', '),
          line.namedPerson ?? 'not asked',
          line.person,
          formatDateTime(line.at, job.site.timeZone),
        ]),
        'No caution was confirmed yet.',
      ),
      table('Their words', [words('caution'), words('text')], shown.flatMap(wordsOf)),
    ],
  };
}

/** A step of a weight names it by mass and plane: nobody knows its number in the ledger. */
function stepWords({ weights, site }: BalanceJobDto, step: string): string {
  return step.replace(/weight (\d+)$/, (said, id: string) => {
    const weight = weights.find((candidate) => candidate.id === Number(id));
    return weight ? `${formatMass(weight.massG, site.decimalMark)} in ${weight.planeName}` : said;
  });
}

const WORDS: Readonly<Record<string, { text: string }>> = CAUTIONS;

/** The standing sentence is no caution of the list; it stands at the top of the record. */
function wordsOf(cautionId: string): string[][] {
  const caution = WORDS[cautionId];
  return caution ? [[cautionId, caution.text]] : [];
}

type StepLine = Omit<CautionLine, 'cautionId'> & { cautionIds: string[] };

/** Cautions ticked together stand in one line. */
function byStep(cautions: readonly CautionLine[]): StepLine[] {
  const lines: StepLine[] = [];
  for (const { cautionId, ...rest } of cautions) {
    const last = lines.at(-1);
    if (last?.step === rest.step && last.at === rest.at) last.cautionIds.push(cautionId);
    else lines.push({ ...rest, cautionIds: [cautionId] });
  }
  return lines;
}

/** Who signed, in which role, when, with which words, over which content. */
export function signOffSection(job: BalanceJobDto, signed: SignedState | null): ReportSection {
  if (!signed)
    return {
      title: 'Sign-off strip',
      blocks: [strong('Not signed – draft. This record still follows the job.')],
    };
  return {
    title: 'Sign-off strip',
    blocks: [
      table(
        'Signatures',
        [words('name'), words('role'), words('time'), words('statement')],
        job.signOffs.map((sign) => [
          sign.personName,
          sign.role,
          formatDateTime(sign.at, job.site.timeZone),
          sign.statement,
        ]),
      ),
      plain(`Handed back to ${signed.areaOwner}.`),
      plain(`Content hash (SHA-256): ${signed.contentHash}`),
      ...(signed.intact
        ? []
        : [strong('The stored record no longer gives the hash that was signed.')]),
    ],
  };
}

/** Remarks made after signing; outside the signed content, each chained to what stood before it. */
export function addendaSection(
  { site }: BalanceJobDto,
  addenda: readonly AddendumDto[],
): ReportSection {
  return {
    title: 'Addenda',
    note: 'remarks after signing; they change nothing that was signed',
    blocks:
      addenda.length === 0
        ? [quiet('None.')]
        : addenda.flatMap((addendum) => [
            strong(
              `Addendum ${addendum.number}, ${addendum.personName}, ${addendum.role}, ${formatDateTime(addendum.at, site.timeZone)}`,
            ),
            plain(addendum.text),
            quiet(`Reason: ${addendum.reason}`),
            quiet(`Hash ${addendum.hash}, after ${addendum.previousHash}`),
          ]),
  };
}
