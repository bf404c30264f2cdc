import 'server-only';
import { formatDateTime } from '@/lib/format';
import type { Report } from '@/lib/schemas/report';
import { CONVENTION } from './blocks';
import { coefficientBookSection } from './history-coefficients';
import type { HistoryGround } from './history-ground';
import { inShortSection, jobsSection } from './history-jobs';
import { ledgerSection, onNowSection } from './history-ledger';

/** A machine's balance history as a report. */
export function historyReport(ground: HistoryGround): Report {
  const { machine, site, asked } = ground;
  const at = formatDateTime(asked.at, site.timeZone);
  return {
    title: `Balance history: ${machine.tag} ${machine.name}`,
    about: `${machine.tag} · balance history`,
    revision: `as of ${at}`,
    isDraft: false,
    contentHash: null,
    convention: CONVENTION,
    made: `made ${at} for ${asked.by}`,
    decimalMark: site.decimalMark,
    sections: [
      inShortSection(ground),
      jobsSection(ground),
      onNowSection(ground),
      ledgerSection(ground),
      coefficientBookSection(ground),
    ],
  };
}
