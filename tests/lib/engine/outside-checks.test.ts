/** The engine against published values, laws and closed forms; each block names its source. */
import { describe, expect, it } from 'vitest';
import { adjustPValues } from '@/lib/engine/adjust-p-values';
import type { SiteClassInput } from '@/lib/engine/inputs';
import { logistic } from '@/lib/engine/logistic';
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
    const [point] = assessOne(dataset).points;
    expectClose(point.expected, Number(figures('A07').R), 1e-12, 'R');
    expectClose(point.energy, Number(figures('A07').F_over_kT), 1e-12, 'F');
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
