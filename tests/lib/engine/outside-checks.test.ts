/** The engine against published values, laws and closed forms; each block names its source. */
import { describe, expect, it } from 'vitest';
import { adjustPValues } from '@/lib/engine/adjust-p-values';
import { concentrationSlope, createSiteState, energyOf, occupySites } from '@/lib/engine/energy';
import type { DatasetInput, SiteClassInput } from '@/lib/engine/inputs';
import { logistic } from '@/lib/engine/logistic';
import { buildSeriesModel } from '@/lib/engine/series-model';
import { chiSquaredUpper, normalTwoSided, studentTwoSided } from '@/lib/engine/tails';
import * as units from '@/lib/engine/units';
import checks from '@/tests/reference/outside-checks.json';
import { expectClose } from '@/tests/support/close-to';
import {
  allostericConstant,
  assessOne,
  bindingOf,
  datasetOf,
  LIGAND,
  pointsAt,
  siteClass,
} from '@/tests/support/small-dataset';

/** The expected figures of one check, as numbers. */
function figures(id: string): Record<string, string> {
  const found = checks.checks.find((check) => check.id === id);
  if (!found) throw new Error(`no check ${id}`);
  return found.expected as unknown as Record<string, string>;
}

/** A two-state protein after the 1965 paper: α = [S]/K_R with K_R = 1 µM, so K_T = 1/c µM. */
function concerted(L: number, c: number, n: number, ...alphas: number[]) {
  return assessOne(
    datasetOf({ gap: allostericConstant(L), siteClasses: [siteClass(n, 1 / c, 1)] }, pointsAt(...alphas)),
  );
}

/** The same protein's model, and what its sites do at α. */
function concertedAt(L: number, c: number, n: number, alpha: number) {
  const dataset = datasetOf(
    { gap: allostericConstant(L), siteClasses: [siteClass(n, 1 / c, 1)] },
    pointsAt(alpha),
  );
  const model = buildSeriesModel(dataset, dataset.series[0]);
  const state = createSiteState(model);
  occupySites(model, Float64Array.of(alpha), 0, state);
  const activity = logistic(energyOf(model, state));
  return {
    /** slope of a Hill plot of the activity, d ln(R̄/(1 − R̄))/d ln α = ∂f/∂ln c */
    hillSlope: concentrationSlope(model, state, 0),
    /** Ȳ, the fraction of sites that are occupied: no activity, but made of the same occupancies */
    saturation: activity * state.occupancyActive[0] + (1 - activity) * state.occupancyInactive[0],
  };
}

const ZERO = 1e-300; // relative tolerance whatever the size

describe('A01 SI constants and kT at 298.15 K (CODATA 2018/2022: exact since the SI of 2019)', () => {
  const wanted = figures('A01');
  it.each([
    ['k_B_J_K', units.BOLTZMANN_JOULE_PER_KELVIN],
    ['N_A', units.AVOGADRO_PER_MOLE],
    ['e_C', units.ELEMENTARY_CHARGE_COULOMB],
    ['R_J_molK', units.GAS_CONSTANT_JOULE_PER_MOLE_KELVIN],
    ['F_C_mol', units.ELEMENTARY_CHARGE_COULOMB * units.AVOGADRO_PER_MOLE],
    ['kT_kJ_mol', units.energyPerKT('kJ/mol', 298.15)],
    ['kT_kcal_mol', units.energyPerKT('kcal/mol', 298.15)],
    ['kT_meV', units.energyPerKT('meV', 298.15)],
    ['kT_J', units.BOLTZMANN_JOULE_PER_KELVIN * 298.15],
  ])('%s', (name, actual) => expectClose(actual, Number(wanted[name]), 1e-14, name, ZERO));
});

describe('A02 units of pressure and energy (SI Brochure, BIPM; thermochemical calorie)', () => {
  const wanted = figures('A02');
  it('Torr, conventional mmHg and calorie', () => {
    expectClose(units.convertConcentration(1, 'Torr', 'kPa'), Number(wanted.torr_kPa), 1e-12, 'Torr');
    expectClose(
      units.convertConcentration(1, 'mmHg', 'kPa'),
      Number(wanted.mmHg_conventional_kPa),
      1e-12,
      'mmHg',
    );
    const joulePerCalorie = (units.energyPerKT('kJ/mol', 300) / units.energyPerKT('kcal/mol', 300)) as number;
    expectClose(joulePerCalorie, Number(wanted.cal_th_J), 1e-12, 'calorie');
  });
  it('tells mmHg from Torr', () => {
    const ratio = units.baseUnitsPer('mmHg') / units.baseUnitsPer('Torr') - 1;
    expectClose(ratio, Number(wanted.ratio_mmHg_torr_minus_1), 1e-4, 'ratio', ZERO);
  });
});

describe('A03 haemoglobin (Monod, Wyman & Changeux, J Mol Biol 12, 88, 1965: L = 9054, c = 0.014, n = 4; parameters from memory, outputs to 50 digits)', () => {
  const wanted = figures('A03') as unknown as Record<string, string> & {
    R: Record<string, string>;
    F_over_kT: Record<string, string>;
  };
  it.each(Object.keys(wanted.R))('activity and energy at α = %s', (alpha) => {
    const [point] = concerted(9054, 0.014, 4, Number(alpha)).points;
    expectClose(point.expected, Number(wanted.R[alpha]), 1e-12, 'R', ZERO);
    expectClose(point.energy, Number(wanted.F_over_kT[alpha]), 1e-12, 'F');
  });
  it('limits, EC50, half activity and Hill coefficient', () => {
    const [derived] = concerted(9054, 0.014, 4, 1).derived;
    expectClose(derived.leakiness.value, Number(wanted.R0), 1e-12, 'R0', ZERO);
    expectClose(derived.saturation.value, Number(wanted.Rinf), 1e-12, 'Rinf');
    expectClose(derived.halfActivity?.value ?? null, Number(wanted.alpha_half_R), 1e-12, 'half activity');
    expectClose(derived.ec50?.value ?? null, Number(wanted.EC50_over_KR_midpoint), 1e-12, 'EC50');
    expectClose(derived.effectiveHill?.value ?? null, Number(wanted.h_eff_midpoint), 1e-12, 'Hill');
  });
});

describe('A03 to A05: binding and the steepest point (Ȳ and n_H of the same papers, outputs to 50 digits)', () => {
  const a03 = figures('A03') as unknown as Record<string, string> & { Y: Record<string, string> };
  it.each(Object.keys(a03.Y))('A03 occupied fraction of the sites at α = %s', (alpha) => {
    const { saturation } = concertedAt(9054, 0.014, 4, Number(alpha));
    expectClose(saturation, Number(a03.Y[alpha]), 1e-12, 'Y', ZERO);
  });
  it('A03 half of the sites are occupied where the paper has it, not where half are active', () => {
    expectClose(concertedAt(9054, 0.014, 4, Number(a03.alpha_half_Y)).saturation, 0.5, 1e-12);
    expect(concertedAt(9054, 0.014, 4, Number(a03.alpha_half_R)).saturation).toBeGreaterThan(0.51);
  });
  it('A04 Ȳ = 101/121 at α = 10', () => {
    expectClose(concertedAt(1000, 0.01, 4, 10).saturation, 101 / 121, 1e-14);
  });
  it('A05 half of the sites are occupied where half of the protein is active', () => {
    const alpha = Number(figures('A05').alpha_half_R_equals_alpha_half_Y);
    expectClose(concertedAt(4e6, 5e-4, 4, alpha).saturation, 0.5, 1e-12);
  });
  it.each([
    ['A03', 9054, 0.014, Number(a03.nH_R_max)],
    ['A04', 1000, 0.01, 36 / 11],
    ['A05', 4e6, 5e-4, Number(figures('A05').nH_R_max)],
  ])('%s the Hill slope of the activity is steepest at α = 1/√c', (_, L, c, steepest) => {
    const slopeAt = (alpha: number) => concertedAt(L, c, 4, alpha).hillSlope;
    const alpha = 1 / Math.sqrt(c);
    expectClose(slopeAt(alpha), steepest, 1e-12, 'slope', ZERO);
    expect(slopeAt(alpha * 1.01)).toBeLessThan(steepest);
    expect(slopeAt(alpha / 1.01)).toBeLessThan(steepest);
  });
  it('A03 gives that α itself', () => {
    expectClose(1 / Math.sqrt(0.014), Number(a03.alpha_at_nH_R_max), 1e-12, 'α', ZERO);
  });
});

describe('A04 an exact point (analytic, the figure parameters of the 1965 paper: L = 1000, c = 0.01, n = 4)', () => {
  it('R = 10/11 and F = ln 10 at α = 10', () => {
    const [point] = concerted(1000, 0.01, 4, 10).points;
    expectClose(point.expected, 10 / 11, 1e-14, 'R');
    expectClose(point.energy, Math.LN10, 1e-14, 'F');
  });
  it('half activity and EC50', () => {
    const [derived] = concerted(1000, 0.01, 4, 10).derived;
    expectClose(
      derived.halfActivity?.value ?? null,
      Number(figures('A04').alpha_half_R),
      1e-14,
      'half activity',
    );
    expectClose(derived.ec50?.value ?? null, Number(figures('A04').EC50_over_KR), 1e-14, 'EC50');
  });
});

describe('A05 phosphofructokinase, the symmetric case L c² = 1 (Blangy, Buc & Monod, J Mol Biol 31, 13, 1968; parameters from memory, outputs to 50 digits)', () => {
  const wanted = figures('A05') as unknown as Record<string, string> & {
    R: Record<string, string>;
    F_over_kT: Record<string, string>;
  };
  it.each(Object.keys(wanted.R))('activity and energy at α = %s', (alpha) => {
    const [point] = concerted(4e6, 5e-4, 4, Number(alpha)).points;
    expectClose(point.expected, Number(wanted.R[alpha]), 1e-12, 'R', ZERO);
    expectClose(point.energy, Number(wanted.F_over_kT[alpha]), 1e-12, 'F');
  });
  it('half activity and Hill coefficient', () => {
    const [derived] = concerted(4e6, 5e-4, 4, 1).derived;
    expectClose(
      derived.halfActivity?.value ?? null,
      Number(wanted.alpha_half_R_equals_alpha_half_Y),
      1e-12,
      'half',
    );
    expectClose(derived.effectiveHill?.value ?? null, Number(wanted.h_eff_midpoint), 1e-12, 'Hill');
  });
});

describe('A06 closed forms and bounds (analytic; the Hill slope after Wyman, Adv Protein Chem 19, 223, 1964)', () => {
  const cases = [1, 2, 3.7, 12].flatMap((n) => [0.01, 0.3, 30].map((c) => [n, c] as const));
  it.each(cases)('n = %s, c = %s', (n, c) => {
    const L = 50;
    const [derived] = concerted(L, c, n, 1).derived;
    const [a, b] = [L, L * c ** n];
    const r = ((a + b + 2 * a * b) / ((2 + a + b) * a)) ** (1 / n);
    const x = (1 - r) / (r - c);
    const [p0, full] = [1 / (1 + a), 1 / (1 + b)];
    const p = (p0 + full) / 2;
    const hill = (4 * p * (1 - p) * n * Math.abs(x / (1 + x) - x / (1 / c + x))) / Math.abs(full - p0);
    expectClose(derived.leakiness.value, p0, 1e-12, 'p0');
    expectClose(derived.saturation.value, full, 1e-12, 'pinf', ZERO);
    expectClose(derived.ec50?.value ?? null, x, 1e-10, 'EC50', ZERO);
    expectClose(derived.effectiveHill?.value ?? null, hill, 1e-10, 'Hill');
    expect(derived.effectiveHill?.value).toBeGreaterThanOrEqual(1 - 1e-9);
    expect(derived.effectiveHill?.value).toBeLessThanOrEqual(n + 1e-9);
    const half = (L ** (1 / n) - 1) / (1 - c * L ** (1 / n));
    if (half > 0) expectClose(derived.halfActivity?.value ?? null, half, 1e-10, 'half', ZERO);
    else expect(derived.halfActivity).toBeNull();
  });
});

describe('A07 effectors that bind one state alone shift L (Monod, Wyman & Changeux 1965; formula from memory)', () => {
  it('an inhibitor of the inactive and an activator of the active state', () => {
    const ligands = [LIGAND, 'inhibitor', 'activator'].map((id) => ({
      id,
      unit: 'uM' as const,
      concentration: 'free' as const,
    }));
    const effector = (id: string, inactive: number | null, active: number | null): SiteClassInput => ({
      id,
      sites: { value: 4 },
      binding: [bindingOf(id, inactive, active)],
    });
    const dataset = datasetOf(
      {
        gap: allostericConstant(9054),
        siteClasses: [
          siteClass(4, 1 / 0.014, 1),
          effector('inhibitor', 1, null),
          effector('activator', null, 1),
        ],
      },
      [{ ligands: { [LIGAND]: 10, inhibitor: 2, activator: 3 }, activity: 0.5, u: 0.02 }],
      { ligands },
    );
    dataset.series[0].points.push({
      ...dataset.series[0].points[0],
      ligands: { inhibitor: 2, activator: 3 },
    });
    const [point, without] = assessOne(dataset).points;
    expectClose(point.expected, Number(figures('A07').R), 1e-12, 'R');
    expectClose(point.energy, Number(figures('A07').F_over_kT), 1e-12, 'F');
    expectClose(without.energy, -Math.log(Number(figures('A07').Lprime)), 1e-12, 'ln L′');
  });
});

describe('A08 linear propagation (analytic, Wyman 1964; JCGM 100, equation 10)', () => {
  const wanted = figures('A08');
  const uncertain = (relative: { gap?: number; inactive?: number; active?: number; dispensing?: number }) => {
    const ligands = [
      { id: LIGAND, unit: 'uM' as const, concentration: 'free' as const, relativeU: relative.dispensing },
    ];
    const parameters = {
      gap: allostericConstant(9054, 9054 * (relative.gap ?? 0)),
      siteClasses: [siteClass(4, 1 / 0.014, 1, relative)],
    };
    return assessOne(datasetOf(parameters, pointsAt(10), { ligands })).points[0];
  };
  it('u_f and u_p of all contributions together', () => {
    const point = uncertain({ gap: 0.3, inactive: 0.2, active: 0.1, dispensing: 0.05 });
    expectClose(point.energyU, Number(wanted.u_F_over_kT), 1e-12, 'u_F');
    expectClose(point.expectedU, Number(wanted.u_p), 1e-12, 'u_p');
  });
  it('each derivative by itself', () => {
    expectClose(
      uncertain({ dispensing: 1 }).energyU,
      Math.abs(Number(wanted.dF_dlnconc_over_kT)),
      1e-12,
      'ln c',
    );
    expectClose(uncertain({ active: 1 }).energyU, Math.abs(Number(wanted.dF_dlnKA_over_kT)), 1e-12, 'ln K_A');
    expectClose(
      uncertain({ inactive: 1 }).energyU,
      Math.abs(Number(wanted.dF_dlnKI_over_kT)),
      1e-12,
      'ln K_I',
    );
    expectClose(uncertain({ dispensing: 1 }).expectedU, Number(wanted.dp_dlnconc), 1e-12, 'dp/dln c');
  });
});

describe('A09 the master curve at extreme energies (analytic)', () => {
  const wanted = figures('A09');
  it.each([
    ['p(-40kT)', logistic(-40)],
    ['p(-5kT)', logistic(-5)],
    ['p(0.1kT)', logistic(0.1)],
    ['p(5kT)', logistic(5)],
    ['1-p(40kT)', logistic(-40)],
  ])('%s', (name, actual) => expectClose(actual, Number(wanted[name]), 1e-14, name, ZERO));
  it('never overflows', () => {
    expect(logistic(-1e6)).toBe(0);
    expect(logistic(1e6)).toBe(1);
  });
});

describe('A10 a binding curve deposited as activity (Severinghaus, J Appl Physiol 46, 599, 1979: equation 1 from its abstract, Table 1 from a published copy)', () => {
  const check = checks.checks.find(({ id }) => id === 'A10');
  const table = check?.inputs as unknown as { table_pO2_Torr: number[]; table_S_percent: number[] };
  const wanted = figures('A10') as unknown as Record<string, string> & { S: Record<string, string> };
  // L = 9054, c = 0.014, n = 4 of the 1965 paper (from memory), and K_R so that half of its sites are occupied at
  // the measured P50.
  const active = Number(wanted.P50_Torr) / Number(figures('A03').alpha_half_Y);
  const inTorr = (value: number) => ({ value, unit: 'Torr' as const, u: 0.05 * value });
  const dataset: DatasetInput = {
    ...datasetOf(
      {
        gap: allostericConstant(9054, 905),
        siteClasses: [
          {
            id: 'haem',
            sites: { value: 4 },
            binding: [{ ligand: 'oxygen', inactive: inTorr(active / 0.014), active: inTorr(active) }],
          },
        ],
      },
      table.table_pO2_Torr.map((pressure, i) => ({
        ligands: { oxygen: pressure },
        activity: table.table_S_percent[i] / 100,
        u: 0.005,
      })),
      { ligands: [{ id: 'oxygen', unit: 'Torr', concentration: 'free' }] },
    ),
  };
  const measured = (pressure: number) => 1 / (1 + 23400 / (pressure ** 3 + 150 * pressure));

  it('the equation gives the figures of the paper', () => {
    for (const [pressure, S] of Object.entries(wanted.S))
      expectClose(measured(Number(pressure)), Number(S), 1e-12, pressure, ZERO);
    expectClose(
      units.convertConcentration(Number(wanted.P50_Torr), 'Torr', 'kPa'),
      Number(wanted.P50_kPa),
      1e-12,
    );
  });
  it('is told that it misses: rejected, with points off the curve where few haems are occupied', () => {
    const series = assessOne(dataset);
    expect(series.pValue).toBeLessThan(1e-6);
    const off = series.points.filter(({ flag }) => flag === 'off-curve');
    expect(off.length).toBeGreaterThan(0);
    // Sites of the inactive state bind too: more is bound than active, at the foot of the curve.
    for (const point of off) expect(point.residual).toBeGreaterThan(0);
  });
  it('while the same statements predict the binding itself to within 0.05', () => {
    const model = buildSeriesModel(dataset, dataset.series[0]);
    const state = createSiteState(model);
    for (const pressure of [10, 20, 27, 40, 60, 100]) {
      occupySites(model, Float64Array.of(pressure), 0, state);
      const p = logistic(energyOf(model, state));
      const bound = p * state.occupancyActive[0] + (1 - p) * state.occupancyInactive[0];
      expect(Math.abs(bound - measured(pressure))).toBeLessThan(0.05);
    }
  });
});

describe('A11 two unlike sites: acetylcholine receptor (Nayak et al., J Gen Physiol 2019, PMC6445574, Table 1; outputs computed)', () => {
  const wanted = figures('A11') as unknown as Record<string, string> & {
    p: Record<string, string>;
    F_over_kT: Record<string, string>;
  };
  const E0 = 6.6e-7;
  const receptor = (...concentrations: number[]) =>
    assessOne(
      datasetOf(
        {
          gap: { value: E0, unit: 'ratio', orientation: 'active-over-inactive' },
          siteClasses: [
            siteClass(1, 70.8, (70.8 * E0) / 0.0082, {}, 'alpha-epsilon'),
            siteClass(1, 130, (130 * E0) / 0.0046, {}, 'alpha-delta'),
          ],
        },
        pointsAt(...concentrations),
      ),
    );
  it.each(Object.keys(wanted.p))('activity and energy at %s µM', (concentration) => {
    const [point] = receptor(Number(concentration)).points;
    expectClose(point.expected, Number(wanted.p[concentration]), 1e-10, 'p', ZERO);
    expectClose(point.energy, Number(wanted.F_over_kT[concentration]), 1e-10, 'F');
  });
  it('limits, EC50 and Hill coefficient by bracketing', () => {
    const [derived] = receptor(1).derived;
    expectClose(derived.leakiness.value, Number(wanted.p_0), 1e-10, 'p0', ZERO);
    expectClose(derived.saturation.value, Number(wanted.p_max), 1e-10, 'p max');
    expectClose(derived.ec50?.value ?? null, Number(wanted.EC50_uM), 1e-10, 'EC50');
    expectClose(derived.effectiveHill?.value ?? null, Number(wanted.h_eff), 1e-10, 'Hill');
  });
  it('the unliganded gap in kcal/mol, as published (8.4) and to more digits', () => {
    const kcal = -units.energyFromKT(receptor(0).gapKT, 'kcal/mol', 298.15);
    expectClose(kcal, Number(wanted['dG0_kcal_298.15']), 1e-10, 'gap');
    expectClose(kcal, Number(wanted.dG0_published), 0.05 / 8.4, 'gap as published');
  });
});

describe('A27 fifteen p-values (Benjamini & Hochberg, J R Statist Soc B 57, 289, 1995; p-values as reprinted in scipy’s documentation)', () => {
  const check = checks.checks.find(({ id }) => id === 'A27');
  const inputs = check?.inputs as unknown as { p: number[]; q: number };
  const adjusted = adjustPValues(Float64Array.from(inputs.p));
  it('adjusted values', () => {
    (figures('A27').adjusted as unknown as string[]).forEach((value, i) => {
      expectClose(adjusted[i], Number(value), 1e-12, `q of p ${i}`, ZERO);
    });
  });
  it('four of them are rejected at 0.05', () => {
    expect(adjusted.filter((q) => q <= inputs.q)).toHaveLength(Number(figures('A27').rejected_BH));
  });
});

describe('A28 tails behind the flags (standard normal, χ², Student; R and mpmath)', () => {
  const wanted = figures('A28');
  it.each([
    ['P_abs_z_gt_2', normalTwoSided(2)],
    ['P_abs_z_gt_3', normalTwoSided(-3)],
    ['chi2_sf_152.23300808237_df12', chiSquaredUpper(152.23300808237, 12)],
  ])('%s', (name, actual) => expectClose(actual, Number(wanted[name]), 1e-12, name, ZERO));
  it('quantiles give back their probabilities', () => {
    expectClose(chiSquaredUpper(Number(wanted.chi2_95_df5), 5), 0.05, 1e-12, 'χ² 5', ZERO);
    expectClose(chiSquaredUpper(Number(wanted.chi2_95_df10), 10), 0.05, 1e-12, 'χ² 10', ZERO);
    expectClose(studentTwoSided(Number(wanted.t975_df4), 4), 0.05, 1e-12, 't 4', ZERO);
    expectClose(studentTwoSided(-Number(wanted.t995_df16), 16), 0.01, 1e-12, 't 16', ZERO);
  });
});

describe('half activity of a complex that ligand inhibits (common practice: about K_I (e^(g/n) − 1) for K_I ≪ K_A)', () => {
  const derivedAt = (gap: number, n: number, ratio = 1000) => {
    const energy = { value: gap, unit: 'kT', orientation: 'inactive-minus-active' } as const;
    const [derived] = assessOne(
      datasetOf({ gap: energy, siteClasses: [siteClass(n, 1, ratio)] }, pointsAt(1)),
    ).derived;
    return { half: derived.halfActivity?.value ?? Number.NaN, ec50: derived.ec50?.value ?? Number.NaN };
  };
  const cases = [4, 6, 12, 18].flatMap((n) => [0.5, 1, 2, 4, 6].map((gap) => [n, gap] as const));

  it.each(cases)('within 1 %% at a ratio of 1000: n = %s, g = %s', (n, gap) => {
    expectClose(derivedAt(gap, n).half, Math.expm1(gap / n), 0.01, 'half activity', ZERO);
  });
  it('not at a ratio of 10, and not for one site', () => {
    expect(derivedAt(6, 4, 10).half / Math.expm1(1.5)).toBeGreaterThan(1.1);
    expect(derivedAt(6, 1).half / Math.expm1(6)).toBeGreaterThan(1.1);
  });
  it('EC50 departs from it at a small gap, where activity without ligand is well below 1', () => {
    const departure = (gap: number) => derivedAt(gap, 6).ec50 / derivedAt(gap, 6).half - 1;
    expect(departure(0.5)).toBeGreaterThan(0.5);
    expect(departure(2)).toBeGreaterThan(0.05);
    expect(departure(6)).toBeLessThan(0.01);
  });
  it('shifting the gap moves both', () => {
    for (const gap of [1, 2, 4]) {
      const [low, high] = [derivedAt(gap, 6), derivedAt(gap + 0.5, 6)];
      expect(high.half / low.half).toBeGreaterThan(1.05);
      expect(high.ec50 / low.ec50).toBeGreaterThan(1.05);
    }
  });
});
