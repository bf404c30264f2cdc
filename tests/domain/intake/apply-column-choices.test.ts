import { describe, expect, it } from 'vitest';
import { applyColumnChoices, type LayoutChoices } from '@/lib/domain/intake/apply-column-choices';
import { proposeColumnLayout } from '@/lib/domain/intake/propose-column-layout';

const text = 'time,a,b\n0,0.5,1\n1,0.25,2\n2,0.75,3\n';
const proposal = proposeColumnLayout(new TextEncoder().encode(text), 'x.csv');
if (!proposal.ok) throw new Error(proposal.failure.message);
const { layout } = proposal.value;

const CHOICES: LayoutChoices = {
  decimalMark: 'point',
  sampleRateHz: null,
  columns: [
    { role: 'time', unit: 'ms' },
    { role: 'ignore', unit: null },
    { role: 'signal', unit: 'in/s' },
  ],
};
const fieldOf = (change: Partial<LayoutChoices>) => {
  const applied = applyColumnChoices(layout, { ...CHOICES, ...change });
  return applied.ok ? null : applied.failure.field;
};

describe('choices of a person', () => {
  it('stand in the place of what was proposed, names stay', () => {
    const applied = applyColumnChoices(layout, CHOICES);
    expect(applied).toMatchObject({
      value: {
        decimalMark: 'point',
        columns: [
          { name: 'time', role: 'time', unit: 'ms' },
          { name: 'a', role: 'ignore' },
          { name: 'b', role: 'signal', unit: 'in/s', quantity: 'velocity' },
        ],
      },
    });
  });

  it('are refused at the field that is wrong', () => {
    const [time, left, signal] = CHOICES.columns;
    expect(fieldOf({ columns: [time!, left!, left!] })).toBe('columns.0.role');
    expect(fieldOf({ columns: [time!, signal!, signal!] })).toBe('columns.2.role');
    expect(fieldOf({ columns: [time!, time!, signal!] })).toBe('columns.1.role');
    expect(fieldOf({ columns: [time!, left!, { role: 'signal', unit: 's' }] })).toBe(
      'columns.2.unit',
    );
    expect(fieldOf({ decimalMark: null })).toBe('decimalMark');
    expect(fieldOf({ columns: [left!, left!, signal!] })).toBe('sampleRateHz');
  });
});
