/** A point as a file's name may spell it. */
export type NamedPoint = { readonly id: number; readonly tag: string; readonly label: string };

/**
 * The point whose machine tag and own label both stand in a file's name, case, spaces and marks left
 * out; null where none or more than one does. The longest tag wins, so that `EF-101` is not taken
 * for `EF-10`.
 *
 * Example: `2026-02 PB3_DE_H.csv` names point `DE-H` of `P-B3`.
 */
export function pointInName(fileName: string, points: readonly NamedPoint[]): number | null {
  const name = plain(fileName.replace(/\.[^.]*$/, ''));
  const named = points.filter(({ tag, label }) => {
    const at = name.indexOf(plain(tag));
    if (at === -1 || plain(tag) === '' || plain(label) === '') return false;
    return name.slice(at + plain(tag).length).includes(plain(label));
  });
  const longest = named.reduce((most, { tag, label }) => Math.max(most, length(tag, label)), 0);
  const best = named.filter(({ tag, label }) => length(tag, label) === longest);
  return best.length === 1 ? (best[0]?.id ?? null) : null;
}

function plain(text: string): string {
  return text.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '');
}

function length(tag: string, label: string): number {
  return 1000 * plain(tag).length + plain(label).length;
}
