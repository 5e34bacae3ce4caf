/** MerV, an invented enzyme of three sites that halide turns on; dissolved, or as a vapour. */
import type { Gap, Ligand, Parameters } from '@/schemas/dataset-1.generated';
import type { DatasetRecipe, SeriesRecipe } from '../recipe';
import { constant, gap, independent, ratioActive, reversedGap, titration, withMore } from '../statements';

const SYSTEM = 'merv-halide';
const HALIDE = titration('halide', 0.1, 120, 18);
/** mmHg */
const VAPOUR = titration('halide', 0.02, 40, 18);

const TURNOVER = {
  readout: 'initial rate over the rate of a locked variant',
  conditions: 'pH 8.0, 50 mM buffer',
};
const LOCKED = { method: 'two-reference', note: '0: heat-killed; 1: locked-on variant' } as const;
const ROOM = { value: 25, unit: 'degC', u: 0.2 } as const;

function halide(unit: Ligand['unit']): Ligand {
  return {
    id: 'halide',
    name: 'halide',
    unit,
    concentration: 'free',
    relativeU: 0.02,
    stockRelativeU: 0.015,
  };
}

const DISSOLVED = {
  inactive: constant(40, 'mM', 0.9, 'inactive'),
  active: constant(1.2, 'mM', 0.025, 'active'),
};
const AS_VAPOUR = {
  inactive: constant(900, 'Pa', 18, 'inactive'),
  active: constant(25, 'Pa', 0.5, 'active'),
};

function enzyme(
  stated: Gap | undefined,
  { gapPerSite, binding = DISSOLVED }: { gapPerSite?: Gap; binding?: typeof DISSOLVED } = {},
): Parameters {
  return independent({
    ...(stated ? { gap: stated } : {}),
    siteClasses: [
      {
        id: 'main',
        sites: { value: 3, u: 0.02, sharedAs: 'sites' },
        ...(gapPerSite ? { gapPerSite } : {}),
        binding: [{ ligand: 'halide', ...binding }],
      },
    ],
  });
}

function series(id: string, parameters: Parameters, more: Partial<SeriesRecipe> = {}): SeriesRecipe {
  return { id, label: id, variant: id, parameters, conditions: HALIDE, readout: { u: 0.017 }, ...more };
}

const COMMON = {
  system: SYSTEM,
  assay: TURNOVER,
  temperature: ROOM,
  ligands: [halide('mM')],
  normalisation: LOCKED,
};

const LID: [string, number][] = [
  ['wild-type', 2.02],
  ['H77A', 1.31],
  ['H77F', 2.65],
  ['C80S', 1.78],
  ['C80A', 0.84],
  ['L84M', 2.31],
  ['L84A', 3.2],
];

export const MERV: DatasetRecipe[] = [
  {
    ...COMMON,
    lab: 'ostrel-enzymology',
    title: 'MerV halide series at 10 to 37 °C',
    about:
      'The wild type at eight temperatures; the gap of each site has an enthalpy and an entropy of its own.',
    published: '2026-09-03',
    series: [10, 14, 18, 22, 26, 30, 34, 37].map((celsius) =>
      series(
        `T${celsius}`,
        enzyme(undefined, { gapPerSite: gap(-2.7 - 0.02 * (celsius - 25), 'kJ/mol', 0.05) }),
        {
          label: `${celsius} °C`,
          variant: 'wild type',
          temperature: { value: celsius, unit: 'degC', u: 0.2 },
        },
      ),
    ),
  },
  {
    ...COMMON,
    lab: 'sunder-lab',
    title: 'MerV under halide vapour',
    about: 'Partial pressures in mmHg, constants in pascal, five loadings of one film.',
    published: '2026-04-30',
    ligands: [halide('mmHg')],
    assay: { readout: 'film conductance over that of a locked variant', conditions: 'humid nitrogen' },
    series: ['1', '2', '3', '4', '5'].map((film, i) =>
      series(`film-${film}`, enzyme(reversedGap(3.1 - 0.35 * i, 'kT', 0.05), { binding: AS_VAPOUR }), {
        label: `film ${film}`,
        variant: 'wild type',
        conditions: VAPOUR,
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'halvorn-biophysics',
    title: 'MerV lid variants',
    about: 'Six substitutions in the lid beside the wild type.',
    published: '2026-07-23',
    revised: '2026-10-02',
    funding: [{ funder: 'Invented Science Fund', award: 'ISF-0502' }],
    series: LID.map(([name, value]) => series(name, enzyme(reversedGap(value, 'kcal/mol', 0.03)))),
  },
  {
    ...COMMON,
    lab: 'norrel-receptor-group',
    title: 'MerV at seven levels of modification',
    about: 'Each modified residue adds the same to the gap; concentrations in mol/L.',
    published: '2026-01-08',
    ligands: [halide('M')],
    modulators: [{ id: 'level', name: 'modified residues', unit: '1' }],
    series: [0, 1, 2, 3, 4, 5, 6].map((level) =>
      series(
        `m${level}`,
        {
          ...enzyme(gap(-4.6, 'kT', 0.05, 'gap')),
          modulation: [{ modulator: 'level', slope: gap(0.42, 'kcal/mol', 0.006, 'step'), reference: 0 }],
        },
        {
          label: `${level} modified`,
          variant: 'wild type',
          conditions: withMore(titration('halide', 1e-4, 0.12, 18), { modulators: { level } }),
        },
      ),
    ),
  },
  {
    ...COMMON,
    lab: 'sunder-lab',
    title: 'MerV substrates compared',
    about: 'Six substrates; parameters come from a fit to other curves, whose correlations were not kept.',
    published: '2026-11-05',
    series: [0.012, 0.03, 0.055, 0.1, 0.019, 0.22].map((ratio, i) =>
      series(
        `substrate-${i + 1}`,
        {
          ...enzyme(ratioActive(ratio, ratio * 0.05)),
          origin: 'fitted-elsewhere',
        },
        { label: `substrate ${i + 1}`, variant: 'wild type' },
      ),
    ),
  },
];
