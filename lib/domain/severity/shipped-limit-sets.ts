import { ISO_10816_1 } from './iso-10816-1';
import { ISO_10816_7 } from './iso-10816-7';
import { ISO_14694 } from './iso-14694';
import { ISO_20816_3 } from './iso-20816-3';
import type { LimitSetData } from './limit-set-data';

/** The limit sets shipped with the product; a site adds its own, and a maker's limits win. */
export const SHIPPED_LIMIT_SETS: readonly LimitSetData[] = [
  ...ISO_20816_3,
  ...ISO_10816_1,
  ...ISO_10816_7,
  ...ISO_14694,
];
