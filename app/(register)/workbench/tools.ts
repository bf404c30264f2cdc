export const TOOLS = [
  { key: 'one-plane', label: 'One plane' },
  { key: 'two-planes', label: 'Two planes' },
  { key: 'tolerance', label: 'Tolerance' },
  { key: 'split', label: 'Split' },
  { key: 'trial-weight', label: 'Trial weight' },
  { key: 'without-phase', label: 'Without phase' },
  { key: 'pieces', label: 'Pieces' },
  { key: 'combine', label: 'Combine' },
  { key: 'six-places', label: 'Six places' },
] as const;
export type Tool = (typeof TOOLS)[number]['key'];

/** The tool that an address asks for; one plane where it names none. */
export function toolFrom(asked: string | string[] | undefined): Tool {
  return TOOLS.find(({ key }) => key === asked)?.key ?? 'one-plane';
}
