import { describe, expect, it } from 'vitest';
import { tolerance } from '@/lib/server/workbench/tolerance';
import { near } from '@/tests/domain/balancing/near';
import published from '@/tests/reference/data/balancing-published.json';
import scenarios from '@/tests/reference/data/balancing-scenarios.json';
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

  // By the definition of the grade, e_per·Ω = G; computed independently.
  it.each(published['BQ-02'].computed)('gives $rotor at G $G', async (row) => {
    const { G: gradeMmS, m_kg: massKg, n_rpm: speedRpm } = row;
    const result = await tolerance(reader, { gradeMmS, massKg, speedRpm });
    const value = result.ok ? result.value : null;
    near(value?.totalGmm ?? NaN, row.U_per_gmm, 1e-9 * row.U_per_gmm);
    near(value?.specificUm ?? NaN, row.e_per_um, 1e-9 * row.e_per_um);
    expect(value?.bearings).toBeNull();
  });

  // G 6.3, 640 kg, 990 r/min is the 38 891.7 g·mm of the lever checks; the last by the limits of an
  // overhung rotor, 0.3 to 1.3 of the whole.
  it.each([
    ...['lever split, rotor inboard', 'lever split clamp'].map((name) => {
      const check = scenarios.unit_checks.find((one) => one.name.startsWith(name));
      return { apart: 1.9, from: check?.input.LA, want: check?.expected, isOverhung: false };
    }),
    { apart: 1, from: -0.2, want: { A: 1.2 * 38_891.7, B: 0.3 * 38_891.7 }, isOverhung: true },
  ])(
    'shares it out to bearings $apart m apart: $want',
    async ({ apart, from, want, isOverhung }) => {
      const result = await tolerance(reader, {
        gradeMmS: '6,3',
        massKg: '640',
        speedRpm: '990',
        apartM: apart,
        massCentreFromAM: from ?? NaN,
      });
      const value = result.ok ? result.value : null;
      near(value?.bearings?.[0]?.permissibleGmm ?? NaN, Number(want?.A), 1);
      near(value?.bearings?.[1]?.permissibleGmm ?? NaN, Number(want?.B), 1);
      expect(value?.isOverhung).toBe(isOverhung);
    },
  );

  it('meets what is allowed at exactly what is allowed', async () => {
    const given = { gradeMmS: 6.3, massKg: 640, speedRpm: 990, apartM: 2, massCentreFromAM: 1 };
    const allowed = await tolerance(reader, given);
    const share = (allowed.ok ? allowed.value.bearings?.[0]?.permissibleGmm : null) ?? NaN;
    const judged = await tolerance(reader, {
      ...given,
      residualAGmm: share,
      residualBGmm: share * 1.000_001,
    });
    const verdicts = judged.ok ? judged.value.bearings?.map(({ met }) => met) : null;
    expect(verdicts).toEqual([true, false]);
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
