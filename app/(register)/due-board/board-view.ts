import type { DecimalMark } from '@/lib/format';

/** What every card of the board is shown with. */
export type BoardView = {
  /** The instant that days are counted from. */
  asOf: string;
  decimalMark: DecimalMark;
  mayOpenJob: boolean;
};
