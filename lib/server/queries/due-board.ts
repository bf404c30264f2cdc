import 'server-only';
import { dueCard } from '@/lib/domain/due/due-card';
import { rankDue } from '@/lib/domain/due/rank-due';
import type { DueBoardCard, DueBoardDto, UnrankedMachine } from '@/lib/schemas/due-board';
import { dueMachineOf, type RankedRow } from '../due-board/due-machine-of';
import { dueRows, type DueRows, type RulingRow } from '../due-board/due-rows';
import { iso } from '../rows';
import { query } from '../query';

/** Active machines ranked by how soon something should happen; what cannot be ranked, with why. */
export const dueBoard = query(
  'dueBoard:read',
  async ({ em, siteIds, now }, _args: undefined): Promise<DueBoardDto> => {
    const rows = await dueRows(em, siteIds, now);
    const cards: DueBoardCard[] = [];
    const unranked: UnrankedMachine[] = [];
    for (const row of rows.ruling) {
      const made = isRankable(row) ? cardOf(row, rows, now) : whyNot(row);
      if (typeof made === 'string') unranked.push(unrankedOf(row, made));
      else cards.push(made);
    }
    unranked.sort((one, other) => one.tag.localeCompare(other.tag));
    return { cards: rankDue(cards), unranked, asOf: now.toISOString() };
  },
);

function isRankable(row: RulingRow): row is RankedRow {
  const { ab, bc, cd, pointId, pointLabel, bearingId } = row;
  return ![ab, bc, cd, pointId, pointLabel, bearingId].includes(null);
}

function whyNot({ ab, pointId }: RulingRow): string {
  if (pointId === null) return 'No overall velocity is measured yet: take a reading first.';
  return ab === null
    ? 'No limit set of velocity judges it: choose one on the machine page.'
    : 'Its points are not complete: check them on the machine page.';
}

/** The card, or the sentence that says why there is none. */
function cardOf(row: RankedRow, rows: DueRows, now: Date): DueBoardCard | string {
  const card = dueCard(dueMachineOf(row, rows, now));
  if (!card.ok) return card.failure.message;
  const { latest } = card.value.standing;
  const newest = rows.series.get(row.pointId)?.at(-1);
  return {
    ...card.value,
    machineId: row.machineId,
    name: row.name,
    siteName: row.siteName,
    areaName: row.areaName,
    timeZone: row.timeZone,
    pointId: row.pointId,
    pointLabel: row.pointLabel,
    readAt: iso(newest?.at ?? now),
    oneXShare:
      latest.oneX === null || latest.value <= 0
        ? null
        : Math.min(1, latest.oneX / latest.value) ** 2,
  };
}

function unrankedOf({ machineId, tag, name, siteName }: RulingRow, because: string) {
  return { machineId, tag, name, siteName, because };
}
