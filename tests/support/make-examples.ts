/**
 * Writes the invented example documents of `lib/documents/examples`. Run:
 * `npx tsx tests/support/make-examples.ts`, then format. A test holds the committed files against fresh ones.
 */
import { writeFile } from 'node:fs/promises';
import { pathToFileURL } from 'node:url';
import type { DatasetDocument, Point, Series } from '@/schemas/dataset-1.generated';
import { dilution, expectedActivity, seededNormal, type TrueSeries } from './example-model';

const DIRECTORY = new URL('../../lib/documents/examples/', import.meta.url);
const INVENTED = 'Invented example: protein, ligands, laboratory and every number are made up.';

/** Standard uncertainty of each measured activity, and the scatter that the model itself is granted. */
const READOUT_U = 0.015;
const MODEL_SCATTER = 0.01;

function measure(
  truth: TrueSeries,
  conditions: Pick<Point, 'ligands' | 'modulators'>[],
  seed: number,
): Point[] {
  const normal = seededNormal(seed);
  const scatter = Math.hypot(READOUT_U, MODEL_SCATTER);
  return conditions.map((condition) => {
    const expected = expectedActivity(truth, condition.ligands, condition.modulators);
    return { ...condition, activity: Number((expected + scatter * normal()).toFixed(3)), u: READOUT_U };
  });
}

const VELLINE = [0, ...dilution(1, 1000, 13)].map((velline) => ({ ligands: { velline } }));

type Stated = Pick<Series['parameters'], 'gap'>['gap'];

interface Variant {
  id: string;
  label: string;
  gapKT: number;
  /** the same gap as the laboratory writes it */
  gap: Stated;
  inactiveMicromolar: number;
  seed: number;
}

/**
 * At 25 °C one kT is 2.4790 kJ/mol, 0.59249 kcal/mol and 25.693 meV. The seeds are the one of seven sets tried
 * that shows about as many warnings as chance gives; none of the seven put a point of this example off the curve.
 */
const COLLAPSING: Variant[] = [
  {
    id: 'wt',
    label: 'wild type',
    gapKT: 2.4,
    gap: { value: 2.4, unit: 'kT', orientation: 'inactive-minus-active', u: 0.06 },
    inactiveMicromolar: 18,
    seed: 61,
  },
  {
    id: 'T61A',
    label: 'T61A',
    gapKT: 3.308,
    gap: { value: -8.2, unit: 'kJ/mol', orientation: 'active-minus-inactive', u: 0.15 },
    inactiveMicromolar: 18,
    seed: 62,
  },
  {
    id: 'S88N',
    label: 'S88N',
    gapKT: 0.916,
    gap: { value: 0.4, unit: 'ratio', orientation: 'inactive-over-active', u: 0.02 },
    inactiveMicromolar: 18,
    seed: 63,
  },
  {
    id: 'G143C',
    label: 'G143C',
    gapKT: 2.532,
    gap: { value: 1.5, unit: 'kcal/mol', orientation: 'inactive-minus-active', u: 0.04 },
    inactiveMicromolar: 45,
    seed: 64,
  },
];

function alrqSeries({ id, label, gapKT, gap, inactiveMicromolar, seed }: Variant): Series {
  const constants = { velline: { inactive: inactiveMicromolar, active: 900 } };
  const inactive =
    id === 'G143C'
      ? { value: inactiveMicromolar / 1000, unit: 'mM' as const, u: 0.001 }
      : { value: inactiveMicromolar, unit: 'uM' as const, u: 0.4, sharedAs: 'velline-inactive' };
  const active = { value: 0.9, unit: 'mM' as const, u: 0.02, sharedAs: 'velline-active' };
  return {
    id,
    label,
    variant: label,
    parameters: {
      origin: 'independent',
      gap,
      siteClasses: [{ id: 'main', sites: { value: 6 }, binding: [{ ligand: 'velline', inactive, active }] }],
    },
    points: measure({ gapKT, classes: [{ sites: 6, constants }] }, VELLINE, seed),
  };
}

function alrqDocument(title: string, abstract: string, series: Series[]): DatasetDocument {
  return {
    format: 'curvekeep-dataset/1',
    title,
    abstract: `${INVENTED} ${abstract}`,
    licence: 'CC0-1.0',
    system: 'alrq-velline',
    contributors: [{ name: 'R. Example (invented)', roles: ['Investigation', 'Formal analysis'] }],
    assay: { readout: 'FRET pair ratio', conditions: 'pH 7.4, 150 mM KCl (invented)' },
    temperature: { value: 25, unit: 'degC', u: 0.3 },
    ligands: [
      {
        id: 'velline',
        name: 'velline',
        unit: 'uM',
        concentration: 'free',
        relativeU: 0.02,
        stockRelativeU: 0.01,
      },
    ],
    normalisation: { method: 'two-reference', note: '0: full inhibitor; 1: constitutive variant' },
    series,
  };
}

/** Four variants, each stated in another convention, on one curve. */
function collapse(): DatasetDocument {
  return alrqDocument(
    'Invented: velline response of AlrQ, wild type and three variants',
    'Four variants whose gaps are stated in four conventions; all of them fall on one curve.',
    COLLAPSING.map(alrqSeries),
  );
}

/** The concentrations of the last series are numbers in mM under a heading in µM. */
function thousandFold(): DatasetDocument {
  const series = COLLAPSING.map((variant) => alrqSeries({ ...variant, seed: variant.seed + 70 }));
  const slipped = series.at(-1);
  for (const point of slipped?.points ?? [])
    point.ligands = { velline: Number(((point.ligands.velline ?? 0) / 1000).toPrecision(3)) };
  return alrqDocument(
    'Invented: velline response of AlrQ with one slipped unit',
    'As the first example, but the concentrations of G143C were typed in mM under a heading in µM.',
    series,
  );
}

const VOLTAGES = [-80, -40, 0, 40, 80];
const OCARATE = [0, ...dilution(2, 5000, 11)];

const TESSIN: TrueSeries = {
  gapKT: -7.5,
  classes: [
    {
      sites: 4,
      constants: { ocarate: { inactive: 220, active: 14 }, selnate: { inactive: 60, active: null } },
    },
    { sites: 2, constants: { ocarate: { inactive: 4000, active: null } } },
  ],
  slopesKT: { V: 0.0234 },
};

/** Every series of the channel states the same quantities, which `sharedAs` says. */
function tessinParameters(): Series['parameters'] {
  return {
    origin: 'fitted-elsewhere',
    gap: { value: -7.5, unit: 'kT', orientation: 'inactive-minus-active', u: 0.06, sharedAs: 'gap' },
    siteClasses: [
      {
        id: 'gate',
        sites: { value: 4 },
        binding: [
          {
            ligand: 'ocarate',
            inactive: { value: 220, unit: 'uM', u: 4, sharedAs: 'gate-inactive' },
            active: { value: 14, unit: 'uM', u: 0.25, sharedAs: 'gate-active' },
          },
          {
            ligand: 'selnate',
            inactive: { value: 60, unit: 'uM', u: 2, sharedAs: 'selnate' },
            active: null,
          },
        ],
      },
      {
        id: 'rim',
        sites: { value: 2 },
        binding: [
          {
            ligand: 'ocarate',
            inactive: { value: 4, unit: 'mM', u: 0.15, sharedAs: 'rim-inactive' },
            active: null,
          },
        ],
      },
    ],
    modulation: [
      {
        modulator: 'V',
        slope: {
          value: -0.601,
          unit: 'meV',
          orientation: 'active-minus-inactive',
          u: 0.01,
          sharedAs: 'slope',
        },
        reference: 0,
      },
    ],
    correlations: [
      { a: 'gap', b: 'gate/ocarate/active', r: 0.55 },
      { a: 'gap', b: 'gate/ocarate/inactive', r: -0.35 },
    ],
  };
}

function tessinSeries(voltage: number, selnate: number, seed: number): Series {
  const blocked: Record<string, number> = selnate === 0 ? {} : { selnate };
  const conditions = OCARATE.map((ocarate) => ({
    ligands: { ocarate, ...blocked },
    modulators: { V: voltage },
  }));
  const label = `${voltage} mV`.replace('-', '−');
  return {
    id: selnate === 0 ? `V${voltage}` : `V${voltage}-selnate`,
    label: selnate === 0 ? label : `${label}, ${selnate} µM selnate`,
    variant: 'wild type',
    parameters: tessinParameters(),
    points: measure(TESSIN, conditions, seed),
  };
}

/** A channel with two classes of sites, a competing ligand, and a voltage. */
function mixedClasses(): DatasetDocument {
  return {
    format: 'curvekeep-dataset/1',
    title: 'Invented: ocarate response of the Tessin channel at five voltages',
    abstract: `${INVENTED} Two classes of sites: ocarate opens the channel through the gate sites and, at high concentration, closes it through the rim sites; selnate competes at the gate.`,
    licence: 'CC-BY-4.0',
    system: 'tessin-ocarate',
    contributors: [{ name: 'T. Example (invented)', roles: ['Investigation', 'Methodology'] }],
    assay: { readout: 'open probability, single channels', conditions: 'pH 7.2, 140 mM KCl (invented)' },
    temperature: { value: 298.15, unit: 'K', u: 0.3 },
    ligands: [
      {
        id: 'ocarate',
        name: 'ocarate',
        unit: 'uM',
        concentration: 'free',
        relativeU: 0.02,
        stockRelativeU: 0.01,
      },
      {
        id: 'selnate',
        name: 'selnate',
        unit: 'uM',
        concentration: 'free',
        relativeU: 0.02,
        stockRelativeU: 0.01,
      },
    ],
    modulators: [{ id: 'V', name: 'membrane potential', unit: 'mV' }],
    normalisation: { method: 'absolute' },
    series: [
      ...VOLTAGES.map((voltage, index) => tessinSeries(voltage, 0, 31 + index)),
      tessinSeries(40, 50, 41),
    ],
  };
}

/** The points of a document of one ligand as a table, one row a point. */
function csvOf({ series }: DatasetDocument): string {
  const rows = series.flatMap(({ label, points }) =>
    points.map(({ ligands, activity, u }) => [label, ligands.velline, activity, u].join(',')),
  );
  return `${['series,velline (µM),activity,u', ...rows].join('\n')}\n`;
}

/** The examples by the names of their files. */
export function makeExamples(): Record<string, DatasetDocument> {
  return { collapse: collapse(), 'thousand-fold': thousandFold(), 'mixed-classes': mixedClasses() };
}

/** The table that stands in `velline-points.ts`. */
export function makeExampleTable(): string {
  return csvOf(collapse());
}

async function writeExamples(): Promise<void> {
  for (const [name, document] of Object.entries(makeExamples()))
    await writeFile(new URL(`${name}.json`, DIRECTORY), `${JSON.stringify(document, null, 2)}\n`);
  const source = `/** The invented points of the first example as a table; made by tests/support/make-examples.ts. */\nexport const VELLINE_POINTS_CSV = \`${makeExampleTable()}\`;\n`;
  await writeFile(new URL('velline-points.ts', DIRECTORY), source);
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) await writeExamples();
