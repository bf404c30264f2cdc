/** Where a bearing sits in the train. */
export type TrainPart = 'driver' | 'gear' | 'driven';

/** A column of the side view: a bearing, or a body that has no bearing of its own to stand between. */
export type TrainColumn<Bearing> =
  | { readonly kind: 'bearing'; readonly bearing: Bearing }
  | { readonly kind: 'body'; readonly part: TrainPart };

/** From which column to which a body reaches, both included. */
export type TrainBody = { readonly part: TrainPart; readonly from: number; readonly to: number };

const ORDER: readonly TrainPart[] = ['driver', 'gear', 'driven'];

/**
 * The side view of a machine train as equal columns from the driver to the driven end. A driver or
 * driven body without bearings gets a column of its own, and so does an overhung rotor, past its last
 * bearing.
 *
 * Example: two driver and two driven bearings give four columns; overhung, five.
 */
export function trainColumns<Bearing extends { readonly part: TrainPart }>(
  bearings: readonly Bearing[],
  overhung: boolean,
): TrainColumn<Bearing>[] {
  return ORDER.flatMap((part): TrainColumn<Bearing>[] => {
    const own = bearings.filter((bearing) => bearing.part === part);
    const columns = own.map((bearing) => ({ kind: 'bearing' as const, bearing }));
    const needsBody = part !== 'gear' && (own.length === 0 || (part === 'driven' && overhung));
    return needsBody ? [...columns, { kind: 'body' as const, part }] : columns;
  });
}

/** The bodies that those columns carry, in order; an overhung rotor reaches over its own column only. */
export function trainBodies<Bearing extends { readonly part: TrainPart }>(
  columns: readonly TrainColumn<Bearing>[],
): TrainBody[] {
  return ORDER.flatMap((part): TrainBody[] => {
    const own = columns.flatMap((column, index) => (partOf(column) === part ? [index] : []));
    const free = own.find((index) => columns[index]?.kind === 'body');
    const from = free ?? own[0];
    const to = free ?? own.at(-1);
    return from === undefined || to === undefined ? [] : [{ part, from, to }];
  });
}

/** The part of the train that a column belongs to. */
export function partOf<Bearing extends { readonly part: TrainPart }>(
  column: TrainColumn<Bearing>,
): TrainPart {
  return column.kind === 'body' ? column.part : column.bearing.part;
}
