import { describe, expect, it } from 'vitest';
import { tolerance } from '@/lib/server/workbench/tolerance';
import { near } from '@/tests/domain/balancing/near';
import published from '@/tests/reference/data/balancing-published.json';
import { reader } from './runs-as-typed';

describe('tolerance', () => {
  // ISO 1940-1:2003 annex example, carried into ISO 21940-11:2016; from memory.
  it('gives the standard’s turbine rotor, as a whole and at its bearings', async () => {
    const { inputs, published: given } = published['BQ-01'];
    const result = await tolerance(reader, {
      gradeMmS: inputs.G,
      massKg: inputs.m_kg,
      speedRpm: inputs.n_rpm,
      apartM: inputs.L_mm / 1000,
      massCentreFromAM: inputs.L_A_mm / 1000,
      residualAGmm: '10000',
      residualBGmm: '18000',
    });
    const value = result.ok ? result.value : null;
    near(value?.totalGmm ?? NaN, given['U_per g.mm'], 100);
    near(value?.specificUm ?? NaN, given['e_per g.mm/kg'], 0.01);
    const [a, b] = value?.bearings ?? [];
    near(a?.permissibleGmm ?? NaN, given.U_per_A, 100);
    near(b?.permissibleGmm ?? NaN, given.U_per_B, 100);
    expect([a?.met, b?.met]).toEqual([true, false]);
  });

  it.each([
    [{ massKg: '0' }, 'massKg'],
    [{ speedRpm: '' }, 'speedRpm'],
    [{ apartM: '2' }, 'massCentreFromAM'],
    [{ massCentreFromAM: '2' }, 'apartM'],
    [{ residualAGmm: '2' }, 'apartM'],
  ])('asks for what is missing: %o', async (over, field) => {
    const given = { gradeMmS: '6,3', massKg: '210', speedRpm: '1480', ...over };
    expect(await tolerance(reader, given)).toMatchObject({ failure: { field } });
  });
});
