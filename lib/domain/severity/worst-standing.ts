type Standing = {
  readonly id: number;
  readonly label: string;
  readonly zone: 'A' | 'B' | 'C' | 'D' | null;
  readonly overall: number | null;
};

/**
 * The point that rules a machine by zones already judged: the worst zone first, then the largest
 * value. Points that were not measured do not count; null where none was.
 *
 * Example: of A-H in C at 3.0 and B-H in B at 4.0 mm/s, A-H rules.
 */
export function worstStanding(points: readonly Standing[]): {
  pointId: number;
  label: string;
  zone: Standing['zone'];
  overall: number;
} | null {
  let worst: { point: Standing; overall: number } | null = null;
  for (const point of points) {
    const { overall } = point;
    if (overall === null) continue;
    if (worst === null || isWorse(point, overall, worst)) worst = { point, overall };
  }
  if (worst === null) return null;
  const { id, label, zone } = worst.point;
  return { pointId: id, label, zone, overall: worst.overall };
}

function isWorse(
  point: Standing,
  overall: number,
  than: { point: Standing; overall: number },
): boolean {
  const order = rank(point) - rank(than.point);
  return order === 0 ? overall > than.overall : order > 0;
}

function rank({ zone }: Standing): number {
  return zone === null ? 0 : 'ABCD'.indexOf(zone) + 1;
}
