/** Whole documents for tests of what stands around the engine: an invented laboratory, protein and ligand. */

interface Overrides {
  series?: number;
  pointsPerSeries?: number;
  seed?: number;
}

/** A valid document; by default one series of two points. The same seed gives the same document. */
export function exampleDocument({ series = 1, pointsPerSeries = 2, seed = 1 }: Overrides = {}) {
  const random = seededRandom(seed);
  return {
    format: 'curvekeep-dataset/1',
    title: 'Velline response of AlrQ',
    abstract: 'Invented example.',
    licence: 'CC0-1.0',
    system: 'alrq-velline',
    contributors: [{ name: 'R. Example', roles: ['Investigation'] }],
    assay: { readout: 'FRET pair ratio', conditions: 'pH 7.4, 150 mM KCl' },
    temperature: { value: 25, unit: 'degC', u: 0.5 },
    ligands: [
      {
        id: 'velline',
        name: 'velline',
        unit: 'uM',
        concentration: 'free',
        relativeU: 0.03,
        stockRelativeU: 0.02,
      },
    ],
    normalisation: { method: 'two-reference', note: '0: full inhibitor; 1: constitutive variant' },
    series: Array.from({ length: series }, (_, i) => exampleSeries(i, pointsPerSeries, random)),
  };
}

function exampleSeries(index: number, points: number, random: () => number) {
  return {
    id: `s${index}`,
    label: `variant ${index}`,
    variant: `variant ${index}`,
    parameters: {
      origin: 'independent',
      gap: { value: 1 + 2 * random(), unit: 'kT', orientation: 'inactive-minus-active', u: 0.1 },
      siteClasses: [
        {
          id: 'main',
          sites: { value: 6, u: 0.2 },
          binding: [
            {
              ligand: 'velline',
              inactive: { value: 10 + 10 * random(), unit: 'uM', u: 1.2 },
              active: { value: 0.5 + random(), unit: 'mM', u: 0.08 },
            },
          ],
        },
      ],
      correlations: [{ a: 'gap', b: 'main/velline/inactive', r: -0.3 }],
    },
    points: Array.from({ length: points }, (_, i) => ({
      ligands: { velline: (i * 200 * random()) / points },
      activity: Math.round(1000 * random()) / 1000,
      u: 0.02,
    })),
  };
}

/** mulberry32: small, fast, the same everywhere. */
function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
}
