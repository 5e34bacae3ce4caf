/** AlrQ, an invented regulator of six sites that velline turns off. */
import type { Gap, Parameters, Series } from '@/schemas/dataset-1.generated';
import type { DatasetRecipe, SeriesRecipe } from '../recipe';
import {
  constant,
  gap,
  independent,
  oneLigandClass,
  ratioActive,
  ratioL,
  reversedGap,
  titration,
} from '../statements';

const SYSTEM = 'alrq-velline';
const VELLINE = titration('velline', 1, 160, 24);
/** One laboratory takes coarser steps. */
const COARSE = titration('velline', 1, 160, 12);
/** Steady difference of one laboratory's energies from everybody else's, kT. */
const QUILLAN_OFFSET = -1.15;

const velline = (unit: 'uM' | 'mM' | 'nM' | 'M', relativeU = 0.02, stockRelativeU = 0.015) =>
  ({ id: 'velline', name: 'velline', unit, concentration: 'free', relativeU, stockRelativeU }) as const;

const FRET = { readout: 'FRET pair ratio', conditions: 'pH 7.4, 150 mM KCl' };
const TWO_REFERENCE = {
  method: 'two-reference',
  note: '0: with the full inhibitor; 1: the constitutive variant',
} as const;
const ROOM = { value: 25, unit: 'degC', u: 0.3 } as const;

/** Six sites, constants shared by all series of the dataset. */
function sixSites(stated: Gap, inactive = 18, u = 0.35): Parameters {
  return independent({
    gap: stated,
    siteClasses: [
      oneLigandClass(
        { value: 6 },
        'velline',
        constant(inactive, 'uM', u, `velline-inactive-${inactive}`),
        constant(0.9, 'mM', 0.02, 'velline-active'),
      ),
    ],
  });
}

function variant(name: string, parameters: Parameters, more: Partial<SeriesRecipe> = {}): SeriesRecipe {
  const id = name.replace(/[^A-Za-z0-9]+/g, '-');
  return { id, label: name, variant: name, parameters, conditions: VELLINE, readout: { u: 0.018 }, ...more };
}

const COMMON = {
  system: SYSTEM,
  assay: FRET,
  temperature: ROOM,
  ligands: [velline('uM')],
  normalisation: TWO_REFERENCE,
};

const BY_KILOJOULE: [string, number, number][] = [
  ['wild type', 5.9, 18],
  ['G58A', 8.4, 18],
  ['G58V', 11.2, 18],
  ['P60A', 3.1, 18],
  ['S61N', 14.1, 26],
  ['T63A', 6.6, 26],
  ['T63S', 1.4, 18],
  ['K66E', 16.9, 26],
];

const R41: [string, number, Record<number, number>][] = [
  ['R41A', -2.1, { 5: 0.21 }],
  ['R41K', -1.4, {}],
  ['R41E', -3.6, { 8: -0.24, 11: 0.2 }],
  ['R41Q', -0.9, {}],
  ['R41W', -2.8, { 3: -0.23 }],
  ['R41S', -1.9, { 9: 0.26 }],
];

const INTERFACE: [string, number][] = [
  ['wild type', 0.09],
  ['L12M', 0.02],
  ['L12F', 0.4],
];

const TAILS: [string, number][] = [
  ['wild type', 62],
  ['Δ3', 88],
  ['Δ6', 121],
  ['Δ9', 35],
  ['Δ12', 150],
  ['Δ15', 74],
];

const CORE: [string, number][] = [
  ['V27A', 6.2],
  ['V27I', 19],
  ['I30V', 2.4],
  ['F33L', 55],
  ['M35L', 9.7],
];

function atTemperature(celsius: number): SeriesRecipe {
  const temperature: Series['temperature'] = { value: celsius, unit: 'degC', u: 0.3 };
  const parameters = sixSites(gap(6.3 + 0.05 * (celsius - 25), 'kJ/mol', 0.12));
  return variant(`${celsius} °C`, parameters, {
    variant: 'wild type',
    id: `T${celsius}`,
    temperature,
    conditions: COARSE,
  });
}

export const ALRQ: DatasetRecipe[] = [
  {
    ...COMMON,
    lab: 'halvorn-biophysics',
    title: 'AlrQ wild type, ring trial, first round',
    about:
      'Ten preparations of the wild type, measured on ten days; the first round of a comparison between laboratories.',
    published: '2025-12-11',
    series: Array.from({ length: 10 }, (_, i) =>
      variant(`day ${i + 1}`, sixSites(gap(2.4, 'kT', 0.05, 'gap')), {
        variant: 'wild type',
        readout: { replicates: 3, spread: 0.03 },
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'quillan-institute',
    title: 'AlrQ wild type, ring trial, second round',
    about: 'Three preparations of the wild type; the second round of the comparison between laboratories.',
    published: '2026-09-24',
    offsetKT: QUILLAN_OFFSET,
    series: Array.from({ length: 3 }, (_, i) =>
      variant(`preparation ${i + 1}`, sixSites(gap(2.4, 'kT', 0.05, 'gap')), {
        ...{ variant: 'wild type', conditions: COARSE },
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'halvorn-biophysics',
    title: 'Hinge variants of AlrQ under velline',
    about:
      'Eight hinge variants; gaps from unfolding, constants from calorimetry, so that nothing was fitted to these curves.',
    published: '2026-11-19',
    funding: [{ funder: 'Invented Science Fund', award: 'ISF-0417' }],
    series: BY_KILOJOULE.map(([name, value, inactive]) =>
      variant(name, sixSites(gap(value, 'kJ/mol', 0.13), inactive)),
    ),
  },
  {
    ...COMMON,
    lab: 'norrel-receptor-group',
    title: 'AlrQ R41 substitutions',
    about: 'Six substitutions of one residue; single wells of one plate were read through condensation.',
    published: '2026-07-02',
    series: R41.map(([name, value, shifts]) =>
      variant(name, sixSites(reversedGap(value, 'kcal/mol', 0.03)), {
        mistake: { kind: 'bad-points', shifts },
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'quillan-institute',
    title: 'AlrQ at 15, 25 and 35 °C',
    about: 'The wild type at three temperatures.',
    published: '2026-05-13',
    offsetKT: QUILLAN_OFFSET,
    series: [15, 25, 35].map(atTemperature),
  },
  {
    ...COMMON,
    lab: 'quillan-institute',
    title: 'AlrQ dimer interface, three variants',
    about: 'Two substitutions at the interface beside the wild type.',
    published: '2026-02-26',
    offsetKT: QUILLAN_OFFSET,
    series: INTERFACE.map(([name, value]) =>
      variant(name, sixSites(ratioL(value, value * 0.05)), { conditions: COARSE }),
    ),
  },
  {
    ...COMMON,
    lab: 'ostrel-enzymology',
    title: 'Velline response of AlrQ in cell extract',
    about: 'Five batches of extract; the dilutions of one batch were noted in millimolar.',
    published: '2026-03-19',
    ligands: [{ ...velline('uM'), concentration: 'total' }],
    assay: { ...FRET, conditions: 'cell extract, pH 7.2', proteinConcentration: { value: 4, unit: 'nM' } },
    series: ['A', 'B', 'C', 'D', 'E'].map((batch) =>
      variant(`batch ${batch}`, sixSites(gap(1.6, 'kcal/mol', 0.03, 'gap')), {
        variant: 'wild type',
        ...(batch === 'D' ? { mistake: { kind: 'concentration-slip', factor: 1e-3 } } : {}),
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'sunder-lab',
    title: 'AlrQ tail deletions',
    about: 'Five deletions beside the wild type; for one of them the detector had reached its limit.',
    published: '2026-08-20',
    licence: 'CC0-1.0',
    temperature: { value: 298.15, unit: 'K', u: 0.3 },
    series: TAILS.map(([name, value]) =>
      variant(name, sixSites(gap(value, 'meV', 1.2)), {
        ...(name === 'Δ12' ? { mistake: { kind: 'ceiling', factor: 0.83 } } : {}),
        ...(name.startsWith('Δ') ? { id: `delta${name.slice(1)}` } : {}),
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'norrel-receptor-group',
    title: 'AlrQ core packing variants',
    about:
      'Five substitutions in the core; the parameters were fitted to the curves shown here, so this is no test of collapse.',
    published: '2026-01-22',
    series: CORE.map(([name, value]) =>
      variant(name, {
        ...sixSites(ratioActive(value, value * 0.05)),
        origin: 'fitted-here',
        fittedCount: 1,
      }),
    ),
  },
];
