import type { DecimalMark } from '@/lib/format';
import type { PointDto } from '@/lib/schemas/balance-job';
import type { PlacePlane, PlaceSetup } from './place-in-words';

/** What an answer is read against: a balance job, or runs typed on the workbench. */
export type AnswerGround = {
  readonly unit: string;
  readonly site: { readonly decimalMark: DecimalMark };
  readonly planes: readonly (PlacePlane & { readonly id: number })[];
  readonly points: readonly Pick<PointDto, 'id' | 'label'>[];
  readonly setup: PlaceSetup;
  /** How the people at the machine count degrees; what is stored counts against rotation. */
  readonly angleSense: 'against' | 'with';
};
