/** The Tessin channel, invented: ocarate opens it through four gate sites and closes it through two rim sites. */
import type { Gap, Parameters, SiteClass } from '@/schemas/dataset-1.generated';
import type { DatasetRecipe, SeriesRecipe } from '../recipe';
import { constant, gap, independent, ratioL, reversedGap, titration, withMore } from '../statements';

const SYSTEM = 'tessin-ocarate';
const OCARATE = titration('ocarate', 6, 4000, 18);

const ligand = (id: 'ocarate' | 'selnate', concentration: 'free' | 'total' = 'free') =>
  ({ id, name: id, unit: 'uM', concentration, relativeU: 0.02, stockRelativeU: 0.01 }) as const;

const VOLTAGE = { id: 'V', name: 'membrane potential', unit: 'mV' };
const SINGLE_CHANNEL = { readout: 'open probability, single channels', conditions: 'pH 7.2, 140 mM KCl' };
const FLUX = { readout: 'flux relative to a locked-open variant', conditions: 'pH 7.0, vesicles' };
const ABSOLUTE = { method: 'absolute' } as const;
const LOCKED_OPEN = { method: 'two-reference', note: '0: no channel; 1: locked-open variant' } as const;
const ROOM = { value: 298.15, unit: 'K', u: 0.3 } as const;

function gate(sites = 4, inactive = 220, active = 14): SiteClass {
  return {
    id: 'gate',
    sites: { value: sites },
    binding: [
      {
        ligand: 'ocarate',
        inactive: constant(inactive, 'uM', inactive * 0.018, `gate-inactive-${inactive}`),
        active: constant(active, 'uM', active * 0.018, `gate-active-${active}`),
      },
    ],
  };
}

/** The rim sites are taken in the closed state only. */
function rim(millimolar = 4): SiteClass {
  const inactive = constant(millimolar, 'mM', millimolar * 0.035, `rim-inactive-${millimolar}`);
  return { id: 'rim', sites: { value: 2 }, binding: [{ ligand: 'ocarate', inactive, active: null }] };
}

/** Selnate competes at the gate, in the closed state only. */
function withSelnate(one: SiteClass): SiteClass {
  const inactive = constant(60, 'uM', 1.5, 'selnate-inactive');
  return { ...one, binding: [...one.binding, { ligand: 'selnate', inactive, active: null }] };
}

function channel(stated: Gap | undefined, siteClasses: SiteClass[] = [gate(), rim()]): Parameters {
  return independent({ ...(stated ? { gap: stated } : {}), siteClasses });
}

function series(id: string, parameters: Parameters, more: Partial<SeriesRecipe> = {}): SeriesRecipe {
  return { id, label: id, variant: id, parameters, conditions: OCARATE, readout: { u: 0.016 }, ...more };
}

const COMMON = {
  system: SYSTEM,
  assay: SINGLE_CHANNEL,
  temperature: ROOM,
  ligands: [ligand('ocarate')],
  normalisation: ABSOLUTE,
};

/** A series at one membrane potential, with the correlations that the laboratory's own fit elsewhere gave. */
function atVoltage(millivolt: number, selnate = 0): SeriesRecipe {
  const blocked = selnate === 0 ? {} : { ligands: { selnate } };
  const base = channel(gap(-7.5, 'kT', 0.06, 'gap'), [selnate === 0 ? gate() : withSelnate(gate()), rim()]);
  const label = `${millivolt} mV`.replace('-', '−');
  return series(
    `V${millivolt}${selnate === 0 ? '' : `-s${selnate}`}`,
    {
      ...base,
      origin: 'fitted-elsewhere',
      modulation: [
        { modulator: 'V', slope: { ...reversedGap(-0.601, 'meV', 0.01), sharedAs: 'slope' }, reference: 0 },
      ],
      correlations: [
        { a: 'gap', b: 'gate/ocarate/active', r: 0.5 },
        { a: 'gap', b: 'gate/ocarate/inactive', r: -0.4 },
        { a: 'gate/ocarate/active', b: 'gate/ocarate/inactive', r: -0.2 },
      ],
    },
    {
      label: selnate === 0 ? label : `${label}, ${selnate} µM selnate`,
      variant: 'wild type',
      conditions: withMore(OCARATE, { ...blocked, modulators: { V: millivolt } }),
    },
  );
}

/** Stated per gate site, by a laboratory that measures total concentrations. */
function perSite(name: string, meV: number, total: number): SeriesRecipe {
  const stated = gap(meV, 'meV', 0.4);
  return series(name, channel(gap(total, 'kT', 0.05), [{ ...gate(), gapPerSite: stated }, rim()]));
}

const GATE: [string, number][] = [
  ['wild type', 1800],
  ['D44A', 420],
  ['D44N', 900],
  ['Y47F', 3500],
  ['Y47L', 240],
  ['Q51A', 6500],
];

const PORE: [string, number, number][] = [
  ['wild type', -18.6, 4],
  ['W90F', -16.9, 4],
  ['W90L', -20.8, 4],
  ['I94A', -15.2, 4],
  ['I94G', -1.9, 0.9],
  ['T97S', -19.5, 4],
];

export const TESSIN: DatasetRecipe[] = [
  {
    ...COMMON,
    lab: 'norrel-receptor-group',
    title: 'Tessin channel, ocarate, five voltages',
    about:
      'Single channels at five membrane potentials; parameters fitted to an earlier, separate set of patches.',
    published: '2026-10-29',
    modulators: [VOLTAGE],
    series: [-80, -40, 0, 40, 80].map((millivolt) => atVoltage(millivolt)),
  },
  {
    ...COMMON,
    lab: 'norrel-receptor-group',
    title: 'Tessin channel gate variants',
    about: 'Five substitutions at the gate; in one of them the ratio was written upside down.',
    published: '2026-06-10',
    assay: FLUX,
    normalisation: LOCKED_OPEN,
    series: GATE.map(([name, value]) =>
      series(name.replace(' ', '-'), channel(ratioL(value, value * 0.06)), {
        label: name,
        variant: name,
        ...(name === 'Y47L' ? { mistake: { kind: 'reversed-gap' } } : {}),
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'ostrel-enzymology',
    title: 'Tessin channel with selnate in competition',
    about: 'Four concentrations of the competitor at two membrane potentials.',
    published: '2026-04-08',
    ligands: [ligand('ocarate'), ligand('selnate')],
    modulators: [VOLTAGE],
    series: [0, 60].flatMap((millivolt) => [0, 20, 60, 180].map((selnate) => atVoltage(millivolt, selnate))),
  },
  {
    ...COMMON,
    lab: 'halvorn-biophysics',
    title: 'Tessin rim mutants in vesicles',
    about: 'Seven mutants whose gap was stated in part for each gate site.',
    published: '2026-02-05',
    assay: { ...FLUX, proteinConcentration: { value: 20, unit: 'nM' } },
    normalisation: LOCKED_OPEN,
    ligands: [ligand('ocarate', 'total')],
    series: [
      perSite('wild-type', -48, 0),
      perSite('R120A', -40, 0.4),
      perSite('R120K', -52, -0.2),
      perSite('E123Q', -36, -0.5),
      perSite('E123A', -44, 0.8),
      perSite('N126D', -50, 0.3),
      perSite('N126A', -46, -0.6),
    ],
  },
  {
    ...COMMON,
    lab: 'sunder-lab',
    title: 'Tessin channel in short-chain lipid, six voltages',
    about: 'The same channel in another lipid, where the gap is smaller.',
    published: '2026-08-06',
    licence: 'CC0-1.0',
    modulators: [VOLTAGE],
    series: [-100, -60, -20, 20, 60, 100].map((millivolt) =>
      series(
        `V${millivolt}`,
        {
          ...channel(gap(-13.4, 'kJ/mol', 0.13, 'gap')),
          modulation: [{ modulator: 'V', slope: gap(0.058, 'kJ/mol', 0.0012, 'slope'), reference: 0 }],
        },
        {
          label: `${millivolt} mV`.replace('-', '−'),
          variant: 'wild type',
          conditions: withMore(OCARATE, { modulators: { V: millivolt } }),
        },
      ),
    ),
  },
  {
    ...COMMON,
    lab: 'halvorn-biophysics',
    title: 'Tessin channel in nanodiscs',
    about: 'Eight preparations, each point read four times.',
    published: '2026-06-25',
    temperature: { value: 22, unit: 'degC', u: 0.5 },
    series: Array.from({ length: 8 }, (_, i) =>
      series(`disc-${i + 1}`, channel(gap(-7.2, 'kT', 0.06, 'gap')), {
        label: `preparation ${i + 1}`,
        variant: 'wild type',
        readout: { replicates: 4, spread: 0.035 },
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'ostrel-enzymology',
    title: 'Tessin channel pore variants',
    about:
      'Every series is stretched to its own smallest and largest value; one variant never closes or opens fully.',
    published: '2026-09-10',
    assay: FLUX,
    normalisation: { method: 'series-min-max' },
    series: PORE.map(([name, value, rimMillimolar]) =>
      series(name.replace(' ', '-'), channel(gap(value, 'kJ/mol', 0.14), pore(name, rimMillimolar)), {
        label: name,
        variant: name,
        ...(name === 'I94G' ? { mistake: { kind: 'own-range' } } : {}),
      }),
    ),
  },
];

/** The leaky variant has fewer gate sites that count. */
function pore(name: string, rimMillimolar: number): SiteClass[] {
  return name === 'I94G' ? [gate(1, 220, 44), rim(40)] : [gate(), rim(rimMillimolar)];
}
