/** FarX, an invented receptor that adenol turns on and cessate, at the same sites, turns off. */
import type { Gap, Ligand, Parameters, SiteClass } from '@/schemas/dataset-1.generated';
import type { DatasetRecipe, SeriesRecipe } from '../recipe';
import { constant, gap, independent, ratioL, titration, withMore } from '../statements';

const SYSTEM = 'farx-adenol-cessate';

function ligand(id: 'adenol' | 'cessate', unit: Ligand['unit']): Ligand {
  return { id, name: id, unit, concentration: 'free', relativeU: 0.025, stockRelativeU: 0.015 };
}

const REPORTER = { readout: 'reporter fluorescence', conditions: 'membranes, pH 7.4, 10 mM MgCl₂' };
const TWO_REFERENCE = {
  method: 'two-reference',
  note: '0: saturating cessate; 1: saturating adenol in a locked variant',
} as const;
const BODY = { value: 37, unit: 'degC', u: 0.3 } as const;
const COMMON = { system: SYSTEM, assay: REPORTER, temperature: BODY, normalisation: TWO_REFERENCE };

/** Three sites: both ligands bind there, and only one at a time. */
function threeSites(picomolar = false): SiteClass {
  const adenol = picomolar
    ? {
        inactive: constant(900, 'pM', 18, 'adenol-inactive'),
        active: constant(45, 'pM', 0.9, 'adenol-active'),
      }
    : {
        inactive: constant(60, 'nM', 1.2, 'adenol-inactive'),
        active: constant(4, 'nM', 0.08, 'adenol-active'),
      };
  return { id: 'ring', sites: { value: 3 }, binding: [{ ligand: 'adenol', ...adenol }] };
}

function withCessate(one: SiteClass): SiteClass {
  const inactive = constant(0.2, 'uM', 0.005, 'cessate-inactive');
  const active = constant(6, 'uM', 0.2, 'cessate-active');
  return { ...one, binding: [...one.binding, { ligand: 'cessate', inactive, active }] };
}

function receptor(stated: Gap, siteClass: SiteClass): Parameters {
  return independent({ gap: stated, siteClasses: [siteClass] });
}

const ADENOL = titration('adenol', 0.2, 1500, 18);

const RING: [string, number][] = [
  ['wild type', 55],
  ['N33D', 140],
  ['N33A', 20],
  ['H36Q', 8],
  ['H36A', 320],
  ['S40T', 75],
  ['S40G', 33],
  ['K43R', 60],
];

function titrated(id: string, parameters: Parameters, more: Partial<SeriesRecipe>): SeriesRecipe {
  return {
    ...{ id, label: id, variant: 'wild type', parameters },
    ...{ conditions: ADENOL, readout: { u: 0.018 }, ...more },
  };
}

export const FARX: DatasetRecipe[] = [
  {
    ...COMMON,
    lab: 'sunder-lab',
    title: 'FarX with adenol and cessate in competition',
    about: 'Adenol at eight concentrations of cessate.',
    published: '2026-08-27',
    ligands: [ligand('adenol', 'nM'), ligand('cessate', 'uM')],
    series: [0, 0.05, 0.1, 0.2, 0.4, 0.8, 1.6, 3.2].map((cessate) =>
      titrated(`c${cessate}`, receptor(gap(-4.1, 'kT', 0.05, 'gap'), withCessate(threeSites())), {
        label: `${cessate} µM cessate`,
        conditions: withMore(ADENOL, { ligands: { cessate } }),
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'ostrel-enzymology',
    title: 'FarX ring variants at picomolar adenol',
    about: 'Eight variants of a form that binds adenol tightly, each point read three times.',
    published: '2026-05-28',
    ligands: [ligand('adenol', 'pM')],
    series: RING.map(([name, value]) =>
      titrated(name.replace(' ', '-'), receptor(ratioL(value, value * 0.05), threeSites(true)), {
        ...{ label: name, variant: name },
        conditions: titration('adenol', 2, 12000, 18),
        readout: { replicates: 3, spread: 0.028 },
      }),
    ),
  },
  {
    ...COMMON,
    lab: 'halvorn-biophysics',
    title: 'FarX adenol response, archive of 2019',
    about:
      'Eight old series of which the uncertainties of the readings were not kept, so that no p-value is given.',
    published: '2026-03-05',
    ligands: [ligand('adenol', 'nM')],
    series: [-9.2, -10.1, -8.3, -11.4, -9.8, -7.6, -10.8, -12.2].map((value, i) =>
      titrated(`plate-${i + 1}`, receptor(gap(value, 'kJ/mol', 0.13), threeSites()), {
        label: `plate ${i + 1}`,
        readout: { unstated: true, spread: 0.019 },
      }),
    ),
  },
];
