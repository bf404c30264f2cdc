import { describe, expect, it } from 'vitest';
import { convertOneX } from '@/lib/domain/balance-job/convert-one-x';
import { speedDifferencePct } from '@/lib/domain/balance-job/speed-difference';

const value = (result: ReturnType<typeof convertOneX>) => {
  if (!result.ok) throw new Error(result.failure.message);
  return result.value;
};

describe('convertOneX', () => {
  it('turns peak into rms and inches into millimetres', () => {
    expect(value(convertOneX(0.3, 'in/s pk', 'mm/s rms'))).toBeCloseTo(5.388, 3);
    expect(value(convertOneX(Math.SQRT2, 'mm/s pk', 'mm/s rms'))).toBeCloseTo(1, 12);
    expect(value(convertOneX(2, 'mil p-p', 'µm p-p'))).toBeCloseTo(50.8, 12);
    expect(value(convertOneX(3.87, 'mm/s rms', 'mm/s rms'))).toBe(3.87);
  });

  it('never mixes velocity and displacement inside a job', () => {
    expect(convertOneX(10, 'µm p-p', 'mm/s rms')).toMatchObject({
      ok: false,
      failure: { code: 'unit', field: 'unit' },
    });
  });
});

describe('speedDifferencePct', () => {
  it('compares with the mean of the earlier runs', () => {
    expect(speedDifferencePct([1480, 1481, 1479], 1521)).toBeCloseTo(2.77, 2);
    expect(speedDifferencePct([], 1500)).toBeNull();
  });
});
