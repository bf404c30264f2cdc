import { expect, it } from 'vitest';
import { worstStanding } from '@/lib/domain/severity/worst-standing';

const point = (label: string, zone: 'A' | 'B' | 'C' | 'D' | null, overall: number | null) => ({
  id: label.length,
  label,
  zone,
  overall,
});

it('takes the worst zone first, then the largest value, and leaves out what was not measured', () => {
  const points = [
    point('A-H', 'C', 3),
    point('B-H', 'B', 4),
    point('A-V', null, 9),
    point('B-V', 'C', 3.2),
  ];
  expect(worstStanding(points)).toMatchObject({ label: 'B-V', zone: 'C', overall: 3.2 });
  expect(worstStanding([point('A-H', null, null)])).toBeNull();
  expect(worstStanding([point('A-H', null, 1), point('B-H', 'A', 0.5)])?.label).toBe('B-H');
});
