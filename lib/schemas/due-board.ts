import type { DueCard } from '@/lib/domain/due/due-card';

/** Where a machine of the board stands, for its card. */
type DuePlace = {
  machineId: number;
  name: string;
  siteName: string;
  areaName: string;
  timeZone: string;
};

/** A card of the Due board: the reckoning of `dueCard` with what identifies the machine. */
export type DueBoardCard = DueCard &
  DuePlace & {
    /** The point that rules: the one in the worst zone, then of the highest overall. */
    pointId: number;
    pointLabel: string;
    readAt: string;
    /** (1x/overall)² of the latest reading, 0 to 1; null where no 1x is known. */
    oneXShare: number | null;
  };

/** A machine that cannot be ranked, and why. */
export type UnrankedMachine = {
  machineId: number;
  tag: string;
  name: string;
  siteName: string;
  because: string;
};

export type DueBoardDto = {
  /** In the order of the board. */
  cards: DueBoardCard[];
  unranked: UnrankedMachine[];
  /** The instant that "days from today" are counted from. */
  asOf: string;
};
